package benchtrue.estimate;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;

/**
 * What the residuals of a fit say about the model: taken in one after the other, in bounded memory. Each is to be scaled by
 * √w, so that all have the same variance.
 */
public final class ResidualTests {
    private static final int LAGS = 20;
    /** Lengths of batches whose sums are compared: 2⁰ … 2²⁰ residuals. */
    private static final int LEVELS = 21;
    /** Of huge runs any p-value is tiny; what matters is how large the autocorrelation is (common practice, no source). */
    private static final double MATTERS = 0.1;

    private static final int ENOUGH_BATCHES = 64;
    private static final double NEAR = 0.85;

    private final double[] last = new double[LAGS];
    private final double[] products = new double[LAGS + 1];
    private final double[] open = new double[LEVELS];
    private final double[] squares = new double[LEVELS];
    private final long[] closed = new long[LEVELS];
    private double steps;
    private double sum;
    private long n;

    public void add(double residual) {
        if (n > 0) {
            double step = residual - last[(int) ((n - 1) % LAGS)];
            steps += step * step;
        }
        products[0] += residual * residual;
        for (int lag = 1; lag <= LAGS && lag <= n; lag++) {
            products[lag] += residual * last[(int) ((n - lag) % LAGS)];
        }
        sum += residual;
        addToBatches(residual);
        last[(int) (n % LAGS)] = residual;
        n++;
    }

    /** The sum of a batch of 2ᵏ⁺¹ is that of two batches of 2ᵏ. */
    private void addToBatches(double residual) {
        double batch = residual;
        for (int level = 0; level < LEVELS; level++) {
            squares[level] += batch * batch;
            closed[level]++;
            if ((closed[level] & 1) == 1) {
                open[level] = batch;
                return;
            }
            batch += open[level];
        }
    }

    /** Durbin–Watson: Σ(eᵢ − eᵢ₋₁)²/Σeᵢ²; about 2 without autocorrelation, NaN where there is no residual. */
    public double durbinWatson() {
        return products[0] > 0 ? steps / products[0] : Double.NaN;
    }

    /** Σeᵢeᵢ₋ₗ/Σeᵢ², not centred. */
    public double autocorrelation(int lag) {
        return products[0] > 0 ? products[lag] / products[0] : Double.NaN;
    }

    /** Ljung and Box 1978: n(n+2)Σρₗ²/(n−l) over the first lags; χ² with so many degrees of freedom while independent. */
    public double ljungBox(int lags) {
        double q = 0;
        for (int lag = 1; lag <= lags; lag++) {
            double rho = autocorrelation(lag);
            q += rho * rho / (n - lag);
        }
        return n * (n + 2.0) * q;
    }

    /** Whether the neighbours are alike enough that uncertainties must be widened. */
    public boolean autocorrelated() {
        return autocorrelation(1) > Math.max(MATTERS, 2 / Math.sqrt((double) n));
    }

    /**
     * Readings over which neighbours are alike: the shortest batch for which the variance of batch sums, divided by their
     * length, comes near its largest; only lengths of which there are enough batches to know that variance count.
     */
    public int correlationLength() {
        double largest = 0;
        for (int level = 0; level < LEVELS && closed[level] >= ENOUGH_BATCHES; level++) {
            largest = Math.max(largest, perReading(level));
        }
        int level = 0;
        while (level < LEVELS - 1 && closed[level + 1] > 0 && perReading(level) < NEAR * largest) {
            level++;
        }
        return 1 << level;
    }

    private double perReading(int level) {
        return squares[level] / closed[level] / (1L << level);
    }

    public double mean() {
        return sum / n;
    }

    public long count() {
        return n;
    }

    /** A sentence for each test, for the closing summary. */
    public List<String> sentences() {
        List<String> sentences = new ArrayList<>();
        if (n < 8 || !(products[0] > 0)) {
            sentences.add("Too few residuals, or none that differ from 0, to test them.");
            return sentences;
        }
        int lags = (int) Math.min(10, n / 4);
        double q = ljungBox(lags);
        sentences.add(String.format(
                Locale.ROOT,
                "Durbin-Watson %.3f; autocorrelation at lag 1 %+.3f; Ljung-Box over %d lags %.4g (%s).",
                durbinWatson(),
                autocorrelation(1),
                lags,
                q,
                probability(Quantiles.chiSquaredTail(q, lags))));
        if (autocorrelated()) {
            sentences.add(String.format(
                    Locale.ROOT,
                    "Neighbouring residuals are alike over about %d readings: the uncertainties are widened for it.",
                    correlationLength()));
        } else if (autocorrelation(1) < -MATTERS) {
            sentences.add("Neighbouring residuals alternate: look for a value that is reported twice or a filter in the"
                    + " instrument. The uncertainties are not narrowed for it.");
        }
        return sentences;
    }

    private static String probability(double p) {
        return p < 1e-4 ? "P < 0.0001" : String.format(Locale.ROOT, "P = %.2g", p);
    }
}
