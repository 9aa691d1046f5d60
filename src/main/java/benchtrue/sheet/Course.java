package benchtrue.sheet;

/** How a quantity goes over the seconds of a rehearsal, in the unit of the channel or unknown that takes it. */
public sealed interface Course {
    record Constant(double value) implements Course {}

    /**
     * Holds each value from its time on; before the first time the first value.
     *
     * @param times rising, one for each value
     */
    record Steps(double[] times, double[] values) implements Course {
        public Steps {
            check(times, values);
        }
    }

    /**
     * Goes straight from value to value; level before the first time and after the last.
     *
     * @param times rising, one for each value
     */
    record Ramps(double[] times, double[] values) implements Course {
        public Ramps {
            check(times, values);
        }
    }

    /** Dwells at each value for the same time, over and over. */
    record Stairs(double[] values, double dwellSeconds) implements Course {
        public Stairs {
            if (values.length == 0 || !(dwellSeconds > 0)) {
                throw new IllegalArgumentException("stairs need values and a dwell above 0");
            }
        }
    }

    /** mean + amplitude·sin(2π·t/period). */
    record Sine(double mean, double amplitude, double periodSeconds) implements Course {
        public Sine {
            if (!(periodSeconds > 0)) {
                throw new IllegalArgumentException("a period is above 0");
            }
        }
    }

    /** To and fro between low and high at constant speed, beginning at low. */
    record Triangle(double low, double high, double periodSeconds) implements Course {
        public Triangle {
            if (!(periodSeconds > 0)) {
                throw new IllegalArgumentException("a period is above 0");
            }
        }
    }

    /**
     * offset + gain·(another channel).
     *
     * @param channel its index; its own course follows no channel
     * @param gain in the unit of this channel for each unit of the other
     */
    record Following(int channel, double gain, double offset) implements Course {}

    private static void check(double[] times, double[] values) {
        if (times.length != values.length || times.length == 0) {
            throw new IllegalArgumentException("a course needs one time for each of its values");
        }
        for (int i = 1; i < times.length; i++) {
            if (!(times[i] > times[i - 1])) {
                throw new IllegalArgumentException("times of a course rise");
            }
        }
    }
}
