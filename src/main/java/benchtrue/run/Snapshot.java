package benchtrue.run;

import benchtrue.alarm.Alarm;
import benchtrue.model.Interval;
import java.util.List;
import org.jspecify.annotations.Nullable;

/**
 * All that the screen shows, frozen at one instant. The engine makes a new one at most 20 times a second; arrays are copies
 * and never written again. NaN is not known.
 *
 * @param live false for a replay
 * @param time seconds since the first reading
 * @param progress how much of a replay is read, 0…1; NaN where that is not known (live)
 * @param pace times real time; infinite: as fast as it goes
 * @param readingAge seconds of the wall clock since the last reading came (live only)
 * @param held whether the operator holds the estimates
 * @param advice what to vary next; null: nothing is left to wish for
 * @param next why the run should go on, a phrase for each reason; empty: it has enough
 * @param notices one line each, what the operator should know now: held, waiting for the reference, …
 * @param points the planned operating points
 * @param setUp what was recorded of the set-up so far, a line each
 * @param spell what the channels did since it was asked for; null: nobody asks
 * @param closing the closing summary once the run ended or when it was asked for
 */
public record Snapshot(
        boolean live,
        String title,
        String item,
        String source,
        Phase phase,
        long reading,
        double time,
        double progress,
        double pace,
        double readingAge,
        boolean held,
        Counts counts,
        List<ChannelView> channels,
        List<RelationView> relations,
        List<Alarm> alarms,
        @Nullable AdviceView advice,
        List<String> notices,
        List<String> next,
        List<PointView> points,
        List<String> setUp,
        @Nullable SpellView spell,
        @Nullable Closing closing) {

    public record PointView(String text, boolean visited) {}

    /** @param rate of readings in 1/s; NaN: not known */
    public record SpellView(double seconds, double rate, List<ChannelSpell> channels) {}

    /**
     * @param u of the mean, widened for autocorrelation
     * @param sd of a reading
     * @param step smallest change between two readings; NaN: it never changed
     * @param autocorrelation at lag 1
     * @param change from the first to the last reading
     */
    public record ChannelSpell(
            String name,
            String unit,
            long count,
            double mean,
            double u,
            double sd,
            double step,
            double autocorrelation,
            double change) {}

    /** Where the run stands. */
    public enum Phase {
        WAITING,
        RUNNING,
        PAUSED,
        ENDED,
        LOST
    }

    /** @param lost lines that the reader could not keep (overrun) */
    public record Counts(
            long seen,
            long used,
            long heldOut,
            long excluded,
            long malformed,
            long missing,
            long gaps,
            long lost,
            int queued) {}

    /**
     * @param value corrected, in {@code unit}
     * @param age seconds since its last value
     * @param status good, doubtful, stuck, saturated, outside, silent
     * @param trend the last values, oldest first, evenly thinned
     */
    public record ChannelView(String name, String unit, double value, double age, String status, double[] trend) {}

    /**
     * @param strip the last standardised innovations, oldest first
     * @param heldOut for each entry of {@code strip} whether that reading was held out
     * @param bound the present bound of the standardised innovation
     * @param tested whether innovations are tested now; if not, {@code untestedWhy} says why
     * @param live CUSUM arms of the live model as fractions of their limit; NaN while there are none
     * @param reference CUSUM arms against the reference model as fractions of their limit; NaN while there are none
     */
    public record RelationView(
            String equation,
            String label,
            String unit,
            String memory,
            double residualStandardDeviation,
            double degreesOfFreedom,
            double effectiveReadings,
            double conditionIndex,
            List<List<String>> inseparable,
            List<UnknownView> unknowns,
            double[] strip,
            boolean[] heldOut,
            double bound,
            boolean tested,
            String untestedWhy,
            Arms live,
            Arms reference) {}

    public record Arms(double up, double down) {}

    /**
     * @param state not determined, weak, settling, settled
     * @param secondsToWanted forecast at the present operating point; infinite: never; NaN: not known
     * @param neverWhy why the wanted uncertainty will never be reached, or empty
     * @param reference value of the reference model; NaN: none
     * @param referenceDifference (estimate − reference) in units of its standard uncertainty
     * @param pathTime times of the path of the estimate, oldest first, evenly thinned over the segment
     * @param path estimate at those times
     * @param pathU expanded uncertainty at those times
     */
    public record UnknownView(
            String name,
            String unit,
            double estimate,
            double standardUncertainty,
            double expandedUncertainty,
            double coverageFactor,
            double degreesOfFreedom,
            String state,
            double wanted,
            double secondsToWanted,
            String neverWhy,
            @Nullable Interval limits,
            String rule,
            @Nullable String verdict,
            @Nullable String verdictWithheld,
            double reference,
            double referenceDifference,
            double[] pathTime,
            double[] path,
            double[] pathU) {}

    /**
     * @param refusal why there is no advice now; empty where there is
     * @param words the advice in words
     */
    public record AdviceView(String unknown, String refusal, List<String> words, double expectedU, double seconds) {}
}
