package benchtrue.alarm;

import java.util.Arrays;

/** The median of the last 31 positive intervals, computed again after every eight. Allocates only at construction. */
final class MedianInterval {
    private static final int KEPT = 31;
    private static final int REFRESH = 8;

    private final double[] ring = new double[KEPT];
    private final double[] sorted = new double[KEPT];
    private long count;
    private double median = Double.NaN;

    void add(double interval) {
        if (!(interval > 0)) {
            return;
        }
        ring[(int) (count++ % KEPT)] = interval;
        if (count < REFRESH || count % REFRESH == 0) {
            int filled = (int) Math.min(count, KEPT);
            System.arraycopy(ring, 0, sorted, 0, filled);
            Arrays.sort(sorted, 0, filled);
            median = sorted[filled / 2];
        }
    }

    /** In s; NaN before the first. */
    double median() {
        return median;
    }

    /** Whether enough were seen to call a longer one a gap. */
    boolean known() {
        return count >= REFRESH;
    }
}
