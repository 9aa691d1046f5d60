package benchtrue.alarm;

/**
 * The budget of false alarms of the whole program, shared equally by the detectors that run. A bound of so many σ says
 * nothing to whoever must live with the alarms; "one per shift" does.
 */
public final class Budget {
    private static final double RAREST = 1e-12;
    private static final double MOST_FREQUENT = 0.01;

    private final double ratePerDetector;
    private double perReading = Double.NaN;

    /**
     * @param falseAlarmsPerSecond of the whole program, above 0
     * @param detectors how many share it, at least 1
     */
    public Budget(double falseAlarmsPerSecond, int detectors) {
        if (!(falseAlarmsPerSecond > 0) || detectors < 1) {
            throw new IllegalArgumentException("budget of " + falseAlarmsPerSecond + " false alarms per second over "
                    + detectors + " detectors: both must be above 0");
        }
        ratePerDetector = falseAlarmsPerSecond / detectors;
    }

    /** @param interval seconds from one reading to the next, as learnt from the time stamps; NaN leaves it as it is */
    void learn(double interval) {
        if (interval > 0) {
            perReading = Math.min(MOST_FREQUENT, Math.max(RAREST, ratePerDetector * interval));
        }
    }

    /** False alarms that one detector may raise per reading; NaN before the interval of readings is known. */
    public double perReading() {
        return perReading;
    }
}
