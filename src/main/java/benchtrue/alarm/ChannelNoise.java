package benchtrue.alarm;

import java.util.Arrays;

/**
 * Learns over the first 256 values how noisy a channel is while it dwells: second differences, which ignore a ramp, over
 * windows of sixteen values, of which the lower quartile counts, which ignores the windows in which the operating point moved.
 */
final class ChannelNoise {
    private static final int WINDOW = 16;
    private static final int WINDOWS = 16;
    /** Variance of a second difference of independent values. */
    private static final double SECOND_DIFFERENCE = 6;
    /** Below this noise in resolution steps a value may repeat for as long as it likes. */
    private static final double TELLING = 0.3;

    private final double declaredNoise;
    private final double declaredStep;
    private final double[] variances = new double[WINDOWS];
    private int windows;
    private int inWindow;
    private double sum;
    private double last = Double.NaN;
    private double beforeLast = Double.NaN;
    private double smallestStep = Double.POSITIVE_INFINITY;
    private int run = 1;
    private int longestRun = 1;
    private double noise;

    /** @param step resolution; both NaN where not declared */
    ChannelNoise(double noise, double step) {
        declaredNoise = noise;
        declaredStep = step;
        this.noise = noise;
    }

    void add(double value) {
        if (windows == WINDOWS) {
            return;
        }
        double difference = Math.abs(value - last);
        if (difference > 0) {
            smallestStep = Math.min(smallestStep, difference);
        }
        run = difference == 0 ? run + 1 : 1;
        longestRun = Math.max(longestRun, run);
        double second = value - 2 * last + beforeLast;
        if (!Double.isNaN(second)) {
            addSecond(second);
        }
        beforeLast = last;
        last = value;
    }

    private void addSecond(double second) {
        sum += second * second;
        if (++inWindow == WINDOW) {
            variances[windows++] = sum / (WINDOW * SECOND_DIFFERENCE);
            inWindow = 0;
            sum = 0;
            if (windows == WINDOWS && Double.isNaN(declaredNoise)) {
                noise = lowerQuartile();
            }
        }
    }

    private double lowerQuartile() {
        Arrays.sort(variances);
        return variances[0] == 0 ? 0 : Math.sqrt(variances[WINDOWS / 4]);
    }

    /** Standard deviation of one value; NaN while not known; 0 for a set point that stands still. */
    double noise() {
        return noise;
    }

    /** Smallest step of the indication, as declared or as seen. */
    double step() {
        return declaredStep > 0 ? declaredStep : smallestStep;
    }

    /** Whether its noise is known and large enough that identical values mean something. */
    boolean telling() {
        return windows == WINDOWS && noise >= TELLING * step();
    }

    /**
     * Chance that a value repeats the one before, at worst: with the true value in the middle of a step, P(|noise| &lt;
     * step/2).
     */
    double repeats() {
        return Normal.within(step() / (2 * noise));
    }

    /** Longest run of identical values while it learnt: an indicator that is polled too fast repeats each value. */
    int longestRun() {
        return longestRun;
    }

    /** Whether the indication is coarser than its noise, though it moves: then averaging helps little. */
    boolean coarse() {
        return windows == WINDOWS && noise < TELLING * step() && smallestStep < Double.POSITIVE_INFINITY;
    }
}
