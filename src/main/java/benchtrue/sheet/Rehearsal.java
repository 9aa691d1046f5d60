package benchtrue.sheet;

import java.math.BigDecimal;
import java.time.Instant;
import java.util.List;
import java.util.Map;
import org.jspecify.annotations.Nullable;

/**
 * What the simulated rig does: truth, noise, schedule and faults.
 *
 * @param seed of the noise where none is given with the command
 * @param ratePerSecond readings in a second, above 0
 * @param durationSeconds above 0; readings come at 0, 1/rate, … below it
 * @param start of the run by the device's clock; null: times are plain seconds
 * @param truth of every unknown of the sheet, by its name, in its unit
 * @param channels one for each channel of the sheet
 */
public record Rehearsal(
        long seed,
        double ratePerSecond,
        double durationSeconds,
        @Nullable Instant start,
        Map<String, Course> truth,
        List<Instrument> channels,
        List<Fault> faults) {
    public Rehearsal {
        if (!(ratePerSecond > 0) || !(durationSeconds > 0)) {
            throw new IllegalArgumentException("rate and duration are above 0");
        }
        truth = Map.copyOf(truth);
        channels = List.copyOf(channels);
        faults = List.copyOf(faults);
    }

    /** How many readings it makes, those that faults keep back included. */
    public long readings() {
        return (long) Math.ceil(durationSeconds * ratePerSecond - 1e-9);
    }

    /**
     * How a channel comes to its indications.
     *
     * @param course what it measures; null: the relation whose response it is says so
     * @param lagSeconds time constant with which it goes after its course; 0: none
     * @param noise standard deviation of one reading
     * @param correlation of the noise of one reading with that of the reading before, 0 ≤ ρ &lt; 1
     * @param step indications are whole multiples of it
     */
    public record Instrument(
            @Nullable Course course, double lagSeconds, double noise, double correlation, BigDecimal step) {
        public Instrument {
            if (!(lagSeconds >= 0 && noise >= 0 && correlation >= 0 && correlation < 1 && step.signum() > 0)) {
                throw new IllegalArgumentException("lag, noise and correlation are not negative, the step is above 0");
            }
        }
    }
}
