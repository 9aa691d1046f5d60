package benchtrue.estimate;

import java.util.Arrays;

/**
 * Covariance of a fit whose residuals are autocorrelated (Newey and West 1987, Econometrica 55, 703): P·S·P with
 * S = Γ₀ + Σₗ(1 − l/(L+1))(Γₗ + Γₗᵀ), Γₗ = Σgᵢgᵢ₋ₗᵀ, gᵢ = wᵢφᵢeᵢ, scaled by n/(n − p). For a long lag the g of neighbouring
 * readings are summed first, which changes the weights of the lags by less than one step, so that the cost stays bounded.
 */
public final class NeweyWest {
    private static final int MOST_LAGS = 64;

    private final int p;
    private final int block;
    private final int lags;
    private final double[][] ring;
    private final double[][] gamma;
    private final double[] open;
    private int filled;
    private long blocks;
    private long rows;

    /** @param lag L in readings, at least 1: one correlation time or more */
    public NeweyWest(int unknowns, int lag) {
        p = unknowns;
        block = Math.max(1, (lag + MOST_LAGS - 1) / MOST_LAGS);
        lags = Math.max(1, (lag + block - 1) / block);
        ring = new double[lags + 1][p];
        gamma = new double[lags + 1][p * p];
        open = new double[p];
    }

    public void add(double[] phi, double residual, double w) {
        double scale = w * residual;
        for (int i = 0; i < p; i++) {
            open[i] += scale * phi[i];
        }
        rows++;
        if (++filled == block) {
            close();
        }
    }

    private void close() {
        double[] now = ring[(int) (blocks % ring.length)];
        System.arraycopy(open, 0, now, 0, p);
        Arrays.fill(open, 0);
        for (int lag = 0; lag <= lags && lag <= blocks; lag++) {
            double[] before = ring[(int) ((blocks - lag) % ring.length)];
            double[] sum = gamma[lag];
            for (int i = 0; i < p; i++) {
                for (int j = 0; j < p; j++) {
                    sum[i * p + j] += now[i] * before[j];
                }
            }
        }
        blocks++;
        filled = 0;
    }

    /**
     * @param inverse P = (Σwφφᵀ)⁻¹, p×p; read
     * @return covariance in the unknowns' units, p×p
     */
    public double[] covariance(double[] inverse) {
        if (filled > 0) {
            close();
        }
        double[] s = gamma[0].clone();
        for (int lag = 1; lag <= lags; lag++) {
            double weight = 1 - lag / (lags + 1.0);
            for (int i = 0; i < p; i++) {
                for (int j = 0; j < p; j++) {
                    s[i * p + j] += weight * (gamma[lag][i * p + j] + gamma[lag][j * p + i]);
                }
            }
        }
        double[] covariance = product(product(inverse, s), inverse);
        double correction = rows > p ? rows / (double) (rows - p) : Double.NaN;
        for (int i = 0; i < covariance.length; i++) {
            covariance[i] *= correction;
        }
        return covariance;
    }

    /**
     * How many times larger the widened variance is than that of independent residuals, of the unknown of which it is
     * largest, at least 1: so many readings count as one.
     *
     * @param widened of {@link #covariance}
     * @param independent s²P
     */
    public static double factor(double[] widened, double[] independent, int unknowns) {
        double factor = 1;
        for (int i = 0; i < unknowns; i++) {
            factor = Math.max(factor, widened[i * unknowns + i] / independent[i * unknowns + i]);
        }
        return factor;
    }

    private double[] product(double[] a, double[] b) {
        double[] c = new double[p * p];
        for (int i = 0; i < p; i++) {
            for (int k = 0; k < p; k++) {
                for (int j = 0; j < p; j++) {
                    c[i * p + j] += a[i * p + k] * b[k * p + j];
                }
            }
        }
        return c;
    }
}
