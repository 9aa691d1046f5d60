package benchtrue.alarm;

/**
 * The evidence for one cause at its most likely onset. Filled again at each evaluation.
 *
 * <p>An unknown moved (or the response got an offset) by a step δ, or by a ramp of slope δ per second; with noise δ is the
 * factor of its standard deviation.
 */
final class Evidence {
    /** Twice the logarithm of the likelihood ratio, 0 where there is nothing for it. */
    double ratio;

    boolean ramp;
    /** When it began, in s, with which reading, and how many readings were summed since. */
    double onset;

    long onsetReading;
    long readings;
    /** Score g and information M, both for δ in units of s; of noise: the mean square and the number of readings. */
    double score;

    double information;

    void clear() {
        ratio = 0;
        ramp = false;
        onset = Double.NaN;
        onsetReading = 0;
        readings = 0;
        score = 0;
        information = 0;
    }

    void offer(double newRatio, boolean asRamp, Sums since, double g, double m) {
        if (newRatio > ratio) {
            ratio = newRatio;
            ramp = asRamp;
            onset = since.start;
            onsetReading = since.firstReading;
            readings = since.count;
            score = g;
            information = m;
        }
    }
}
