package benchtrue.alarm;

import java.util.Arrays;

/**
 * The usual interval between readings: of the last 31 the median or the mean, whichever is longer, since lines that are handed
 * over in batches leave a median of next to nothing. Computed again after every eight. Allocates only at construction.
 */
final class UsualInterval {
    private static final int KEPT = 31;
    private static final int REFRESH = 8;

    private final double[] ring = new double[KEPT];
    private final double[] sorted = new double[KEPT];
    private long count;
    private double usual = Double.NaN;

    void add(double interval) {
        if (!(interval > 0)) {
            return;
        }
        ring[(int) (count++ % KEPT)] = interval;
        if (count < REFRESH || count % REFRESH == 0) {
            int filled = (int) Math.min(count, KEPT);
            System.arraycopy(ring, 0, sorted, 0, filled);
            Arrays.sort(sorted, 0, filled);
            double sum = 0;
            for (int i = 0; i < filled; i++) {
                sum += sorted[i];
            }
            usual = Math.max(sorted[filled / 2], sum / filled);
        }
    }

    /** In s; NaN before the first. */
    double seconds() {
        return usual;
    }

    /** Whether enough were seen to call a longer one a gap. */
    boolean known() {
        return count >= REFRESH;
    }
}
