package benchtrue.run;

import benchtrue.alarm.Alarm;
import benchtrue.model.Forgetting;
import benchtrue.model.Interval;
import java.time.Instant;
import java.util.List;
import org.jspecify.annotations.Nullable;

/** The closing summary: all that summary.json and summary.txt say. NaN is not known; times in s since the first reading. */
public record Closing(
        String sheetTitle,
        String item,
        String sheetSha256,
        List<String> cautions,
        List<Instrument> instruments,
        String sourceKind,
        String sourceName,
        @Nullable String sourceSha256,
        @Nullable Instant startedUtc,
        Readings readings,
        List<Held> held,
        List<Relation> relations,
        List<Result> results,
        List<Alarm> alarms,
        List<String> marks,
        List<String> careful,
        int status,
        String statusText) {

    /** @param dueNote empty, or that it was overdue at the recorded start, or that the start is not recorded */
    public record Instrument(
            String channel,
            String unit,
            @Nullable String due,
            String dueNote,
            @Nullable String correction) {}

    public record Readings(
            long seen,
            long used,
            long heldOut,
            long excluded,
            long malformed,
            long missing,
            long gaps,
            double first,
            double last,
            double seconds) {}

    /** How many readings were left out for one reason. */
    public record Held(String reason, long count) {}

    /**
     * @param unknowns of the whole run at λ = 1, of the live memory otherwise
     * @param floorRows pseudo-rows that the floor added
     * @param residualStandardDeviation of a reading of weight 1
     * @param weight of every reading; NaN where it varies
     * @param residualTests a sentence each
     */
    public record Relation(
            String equation,
            String response,
            String unit,
            Forgetting forgetting,
            String memory,
            long floorRows,
            List<Unknown> unknowns,
            double residualStandardDeviation,
            double weight,
            double degreesOfFreedom,
            double conditionIndex,
            List<List<String>> inseparable,
            double autocorrelation,
            double durbinWatson,
            double effectiveReadings,
            @Nullable Batch batch,
            @Nullable Constancy constancy,
            List<String> residualTests,
            List<Segment> segments) {}

    /** @param budget contributions to the standard uncertainty, each in {@code unit} */
    public record Unknown(
            String name,
            String unit,
            double estimate,
            double standardUncertainty,
            double expandedUncertainty,
            double coverageFactor,
            double degreesOfFreedom,
            boolean determined,
            boolean settled,
            double wanted,
            @Nullable Interval limits,
            String rule,
            @Nullable String verdict,
            @Nullable String verdictWithheld,
            double conformityProbability,
            List<Contribution> budget) {}

    public record Contribution(String name, double standardUncertainty, double degreesOfFreedom) {}

    /** The batch fit over the recorded rows beside the recursive one, in the order of the relation's unknowns. */
    public record Batch(List<Fitted> unknowns, double largestDifferenceInU, boolean agrees, String judgement) {}

    /** @param differenceInU (recursive − batch) in units of the standard uncertainty */
    public record Fitted(String name, double estimate, double standardUncertainty, double differenceInU) {}

    public record Constancy(double statistic, double degreesOfFreedom, double pValue) {}

    public record Segment(double from, double to, String reason, List<Unknown> unknowns) {}

    public record Result(
            String name,
            String unit,
            double value,
            double standardUncertainty,
            double expandedUncertainty,
            double coverageFactor,
            double degreesOfFreedom,
            @Nullable Interval limits,
            String rule,
            @Nullable String verdict,
            @Nullable String verdictWithheld,
            double conformityProbability) {}
}
