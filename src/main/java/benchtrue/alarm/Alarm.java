package benchtrue.alarm;

import org.jspecify.annotations.Nullable;

/**
 * One alarm as it stands: immutable; the alarm book replaces it as it changes. Times are seconds since the first reading;
 * NaN is not known.
 *
 * @param id counts from 1 over the run
 * @param relation label of the relation, or null where it concerns a channel or the clock
 * @param channel name of the channel, or null
 * @param unknown the unknown that is shown to have moved, once it is no longer provisional, or null
 * @param onset when it began, between onsetFrom and onsetTo
 * @param onsetReading number of the reading at the onset; 0: not known
 * @param size of the change in {@code unit}, with expanded uncertainty {@code sizeU}
 * @param cause name of an unknown, "offset", "not separable", or null
 * @param provisional whether the cause is only a lead so far
 * @param acknowledged whether somebody has looked at it; one that returned to normal may still wait for that
 * @param count how often the same cause has spoken
 * @param text in plain words with its numbers
 */
public record Alarm(
        int id,
        Kind kind,
        @Nullable String relation,
        @Nullable String channel,
        @Nullable String unknown,
        double onset,
        double onsetFrom,
        double onsetTo,
        long onsetReading,
        double raised,
        long raisedReading,
        double size,
        double sizeU,
        String unit,
        @Nullable String cause,
        boolean provisional,
        State state,
        boolean acknowledged,
        int count,
        Priority priority,
        String text,
        String comment) {

    /** What happened. */
    public enum Kind {
        STEP("step"),
        DRIFT("drift"),
        NOISE("noise"),
        INTERMITTENT("intermittent"),
        STUCK("stuck"),
        SATURATED("saturated"),
        INTERVAL("interval"),
        SILENT("silent"),
        GAP("gap"),
        CLOCK("clock"),
        RESTART("restart"),
        GARBLED("garbled"),
        UNIT("unit"),
        SIGN("sign"),
        SKEW("skew"),
        ALIAS("alias"),
        WARM_UP("warm-up"),
        HYSTERESIS("hysteresis");

        private final String word;

        Kind(String word) {
            this.word = word;
        }

        /** As files and screens write it. */
        public String word() {
            return word;
        }

        /** Whether it says that the rig or a sensor moved against the reference: a verdict is withheld while it stands. */
        public boolean isDrift() {
            return this == STEP || this == DRIFT || this == NOISE;
        }

        /** Whether it says that a channel cannot be trusted. */
        public boolean isChannelFault() {
            return switch (this) {
                case INTERMITTENT, STUCK, SATURATED, INTERVAL, SILENT, GARBLED, UNIT, SIGN, SKEW -> true;
                default -> false;
            };
        }
    }

    /** Where it stands (after IEC 62682). */
    public enum State {
        RAISED("raised"),
        ACKNOWLEDGED("acknowledged"),
        RETURNED("returned"),
        SHELVED("shelved");

        private final String word;

        State(String word) {
            this.word = word;
        }

        public String word() {
            return word;
        }
    }

    /** How soon somebody must look. */
    public enum Priority {
        ACT_NOW("act now"),
        NEXT_STOP("next stop");

        private final String word;

        Priority(String word) {
            this.word = word;
        }

        public String word() {
            return word;
        }
    }
}
