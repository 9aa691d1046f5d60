package benchtrue.alarm;

import java.util.Arrays;

/**
 * Autocorrelation of a standardised sequence of mean 0 at a ladder of lags, and from it by how much it must be thinned: a
 * lag-1 autocorrelation of 0.3 cuts the run length of a CUSUM from 465 to 99. About 20 ns a reading.
 */
final class Autocorrelation {
    /** A sequence that needs more than the last of these is not fit for tests that suppose independence. */
    private static final int[] LAGS = {
        1, 2, 3, 4, 5, 6, 8, 10, 12, 16, 20, 24, 32, 40, 48, 64, 80, 96, 128, 160, 192, 256
    };

    private static final double INDEPENDENT = 0.1;

    private final double[] ring = new double[256];
    private final double[] products = new double[LAGS.length];
    private double squares;
    private long count;

    void add(double z) {
        int at = (int) (count & 255);
        for (int i = 0; i < LAGS.length && LAGS[i] <= count; i++) {
            products[i] += z * ring[(at - LAGS[i]) & 255];
        }
        ring[at] = z;
        squares += z * z;
        count++;
    }

    void clear() {
        Arrays.fill(products, 0);
        squares = 0;
        count = 0;
    }

    long count() {
        return count;
    }

    /** At lag 1; NaN before there is any. */
    double first() {
        return at(0);
    }

    private double at(int i) {
        return products[i] / (count - LAGS[i]) / (squares / count);
    }

    /**
     * The smallest lag at which the autocorrelation is below 0.1 with one standard error to spare; 0 where no lag is, or
     * where fewer than ten times as many readings were seen as the lag spans.
     */
    int thinning() {
        double standardError = 1 / Math.sqrt((double) count);
        for (int i = 0; i < LAGS.length && 10L * LAGS[i] <= count; i++) {
            if (Math.abs(at(i)) + standardError < Math.max(INDEPENDENT, 2 * standardError)) {
                return LAGS[i];
            }
        }
        return 0;
    }

    /** The thinning that a first-order autocorrelation in (−1, 1) asks for. */
    static int thinning(double first) {
        double size = Math.abs(first);
        return size < INDEPENDENT ? 1 : (int) Math.min(256, Math.ceil(Math.log(INDEPENDENT) / Math.log(size)));
    }

    /** Factor by which a mean over many readings varies more than if they were independent: 1 + 2Σρ up to the thinning lag. */
    double varianceFactor() {
        double sum = 0;
        int reach = thinning();
        for (int i = 0; i < LAGS.length && LAGS[i] < reach; i++) {
            sum += at(i) * (LAGS[i + 1] - LAGS[i]);
        }
        return Math.max(1, 1 + 2 * sum);
    }

    /** The same, but for a sequence that no thinning makes independent the longest thinning there is. */
    double wholeVarianceFactor() {
        return thinning() == 0 ? LAGS[LAGS.length - 1] : varianceFactor();
    }
}
