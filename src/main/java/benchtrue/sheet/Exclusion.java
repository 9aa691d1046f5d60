package benchtrue.sheet;

import java.time.Instant;
import org.jspecify.annotations.Nullable;

/**
 * Readings with from ≤ time ≤ to are not used, for the reason given.
 *
 * @param from in seconds since the first reading or, where {@code dated}, since 1970-01-01T00:00Z
 * @param to as {@code from}, above it
 */
public record Exclusion(double from, double to, boolean dated, String reason) {
    /**
     * The same in seconds since the first reading.
     *
     * @param start when the first reading was; null: not recorded, then a dated exclusion stays as it is
     */
    public Exclusion since(@Nullable Instant start) {
        if (!dated || start == null) {
            return this;
        }
        double shift = start.getEpochSecond() + start.getNano() * 1e-9;
        return new Exclusion(from - shift, to - shift, false, reason);
    }
}
