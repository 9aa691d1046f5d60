package benchtrue.model;

/** How far back the live estimate remembers. */
public sealed interface Memory {
    /** Nothing is forgotten: every factor is 1. */
    record All() implements Memory {}

    /** Forgetting by readings: the factor of each reading is 1 − 1/count, count &gt; 1. */
    record Readings(double count) implements Memory {
        public Readings {
            if (!(count > 1) || Double.isInfinite(count)) {
                throw new IllegalArgumentException("memory of " + count + " readings: must be finite and above 1");
            }
        }

        public static Readings ofFactor(double factor) {
            return new Readings(1 / (1 - factor));
        }
    }

    /** Forgetting by the time that really passed: the factor over Δt is exp(−Δt/seconds), seconds &gt; 0. */
    record Seconds(double seconds) implements Memory {
        public Seconds {
            if (!(seconds > 0) || Double.isInfinite(seconds)) {
                throw new IllegalArgumentException("memory of " + seconds + " s: must be finite and above 0");
            }
        }
    }

    /**
     * The factor by which earlier information shrinks.
     *
     * @param elapsed seconds since the reading before, not negative
     * @param counts whether the reading that brings the forgetting is used (a held-out one forgets by time only)
     */
    default double factor(double elapsed, boolean counts) {
        if (this instanceof Readings readings) {
            return counts ? 1 - 1 / readings.count : 1;
        }
        if (this instanceof Seconds time) {
            return Math.exp(-elapsed / time.seconds);
        }
        return 1;
    }
}
