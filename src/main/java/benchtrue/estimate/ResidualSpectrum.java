package benchtrue.estimate;

import java.util.Arrays;
import org.jspecify.annotations.Nullable;

/**
 * A period that dominates the residuals, which may be the alias of a fast disturbance. The spectrum is averaged over segments
 * that overlap by half, under Hann's window (Welch 1967, IEEE Transactions on Audio and Electroacoustics 15, 70); memory is
 * bounded. Residuals are taken to be evenly spaced.
 */
public final class ResidualSpectrum {
    private static final int SEGMENT = 4096;
    /** A run, or its first part, is cut into so many segments' lengths: averaged, the spectrum of noise is smooth. */
    private static final int LENGTHS = 4;

    private static final int FEWEST = 64;
    /** Hann's window spreads a line over so many bins to each side. */
    private static final int LINE = 2;
    /** Longer ones cannot be told from a slow drift: at least so many periods must fit in a segment. */
    private static final int FEWEST_PERIODS = 3;
    /** A line dominates when it holds this share of the variance (common practice, no source). */
    private static final double SHARE = 0.5;
    /** And it must stand out from its neighbourhood: 10 dB (common practice, no source). */
    private static final double OUTSTANDING = 10;

    private final double[] kept = new double[LENGTHS * SEGMENT];
    private final double[] power = new double[SEGMENT / 2];
    private boolean full;
    private int filled;

    public void add(double residual) {
        kept[filled++] = residual;
        if (filled == (full ? SEGMENT : kept.length)) {
            addSegments(kept, filled, SEGMENT, power);
            full = true;
            System.arraycopy(kept, filled - SEGMENT / 2, kept, 0, SEGMENT / 2);
            filled = SEGMENT / 2;
        }
    }

    private static void addSegments(double[] values, int count, int length, double[] power) {
        for (int from = 0; from + length <= count; from += length / 2) {
            addPower(Arrays.copyOfRange(values, from, from + length), power);
        }
    }

    /**
     * @param readings length of the period
     * @param share of the residuals' variance
     */
    public record Period(double readings, double share) {}

    /** Null where none dominates, or there are fewer than 256 residuals. */
    public @Nullable Period dominant() {
        if (full) {
            return dominant(power, SEGMENT);
        }
        int length = Integer.highestOneBit(filled / LENGTHS);
        if (length < FEWEST) {
            return null;
        }
        double[] averaged = new double[length / 2];
        addSegments(kept, filled, length, averaged);
        return dominant(averaged, length);
    }

    private static @Nullable Period dominant(double[] power, int length) {
        double total = Arrays.stream(power).sum();
        int peak = FEWEST_PERIODS;
        for (int k = FEWEST_PERIODS; k < power.length; k++) {
            peak = power[k] > power[peak] ? k : peak;
        }
        double line = 0;
        double moment = 0;
        for (int k = Math.max(1, peak - LINE); k <= Math.min(power.length - 1, peak + LINE); k++) {
            line += power[k];
            moment += k * power[k];
        }
        boolean stands = power[peak] > OUTSTANDING * neighbourhood(power, peak);
        return line > SHARE * total && stands ? new Period(length / (moment / line), line / total) : null;
    }

    /** Mean power of the bins within half an octave, the line left out, and not less than that of the lower side. */
    private static double neighbourhood(double[] power, int peak) {
        return Math.max(
                mean(power, Math.max(1, (int) (peak / 1.5) - 1), peak - LINE),
                mean(power, peak + LINE + 1, Math.min(power.length, (int) (peak * 1.5) + LINE + 3)));
    }

    private static double mean(double[] power, int from, int to) {
        return from < to ? Arrays.stream(power, from, to).average().orElse(0) : 0;
    }

    private static void addPower(double[] values, double[] into) {
        int n = values.length;
        double mean = Arrays.stream(values).average().orElse(0);
        double[] re = new double[n];
        double[] im = new double[n];
        for (int i = 0; i < n; i++) {
            re[i] = (values[i] - mean) * (0.5 - 0.5 * Math.cos(2 * Math.PI * i / n));
        }
        transform(re, im);
        for (int k = 0; k < n / 2; k++) {
            into[k] += re[k] * re[k] + im[k] * im[k];
        }
    }

    /** Fast Fourier transform in place, radix 2 (Cooley and Tukey 1965); the length is a power of 2. */
    static void transform(double[] re, double[] im) {
        int n = re.length;
        for (int i = 1, j = 0; i < n; i++) {
            int bit = n >> 1;
            for (; (j & bit) != 0; bit >>= 1) {
                j ^= bit;
            }
            j ^= bit;
            if (i < j) {
                swap(re, i, j);
                swap(im, i, j);
            }
        }
        for (int half = 1; half < n; half *= 2) {
            for (int k = 0; k < half; k++) {
                double c = Math.cos(Math.PI * k / half);
                double s = -Math.sin(Math.PI * k / half);
                for (int i = k; i < n; i += 2 * half) {
                    double x = re[i + half] * c - im[i + half] * s;
                    double y = re[i + half] * s + im[i + half] * c;
                    re[i + half] = re[i] - x;
                    im[i + half] = im[i] - y;
                    re[i] += x;
                    im[i] += y;
                }
            }
        }
    }

    private static void swap(double[] a, int i, int j) {
        double kept = a[i];
        a[i] = a[j];
        a[j] = kept;
    }
}
