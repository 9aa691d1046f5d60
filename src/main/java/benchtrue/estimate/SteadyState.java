package benchtrue.estimate;

/**
 * Whether a signal is steady (Cao and Rhinehart 1995, Journal of Process Control 5, 363): the variance about a filtered mean
 * over the variance from successive differences, with filters 0.2, 0.1, 0.1. On white noise the ratio is about 1, and
 * above 1.73 in 1 % of readings (simulated).
 */
public final class SteadyState {
    private static final double MEAN_FILTER = 0.2;
    private static final double VARIANCE_FILTER = 0.1;
    private static final double CRITICAL_99 = 1.73;
    /** The filters have forgotten their start. */
    private static final int ENOUGH = 30;

    private double mean;
    private double variance;
    private double differences;
    private double last;
    private long count;

    public void restart() {
        mean = 0;
        variance = 0;
        differences = 0;
        count = 0;
    }

    public void add(double value) {
        if (count++ == 0) {
            mean = value;
            last = value;
            return;
        }
        double fromMean = value - mean;
        double step = value - last;
        double share = Math.max(VARIANCE_FILTER, 1.0 / count);
        variance += share * (fromMean * fromMean - variance);
        differences += share * (step * step - differences);
        mean += MEAN_FILTER * fromMean;
        last = value;
    }

    /** About 1 while steady; NaN while nothing varies. */
    public double ratio() {
        return (2 - MEAN_FILTER) * variance / differences;
    }

    /** Whether enough was seen and the ratio is below its 99 % point; what does not vary at all is steady. */
    public boolean isSteady() {
        return count >= ENOUGH && !(ratio() > CRITICAL_99);
    }
}
