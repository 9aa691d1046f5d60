package benchtrue.alarm;

/**
 * What the reference's own uncertainty takes off the evidence: W = (Cₐ⁻¹ + A)⁻¹ and Wb for the sums A and b of the readings
 * that are looked at together.
 */
final class Adjustment {
    /** What is left of a sum after rounding. */
    private static final double NOTHING = 1e-12;

    private final int q;
    private final double[] information;
    private final double[] inverse;
    private final double[] explained;

    /** @param covariance Cₐ in units of s², q×q; zero for what is known exactly */
    Adjustment(double[] covariance) {
        q = (int) Math.round(Math.sqrt(covariance.length));
        information = Symmetric.information(covariance, q);
        inverse = new double[q * q];
        explained = new double[q];
    }

    /**
     * @param products A, q×q; read
     * @param scores b; read
     */
    void over(double[] products, double[] scores) {
        for (int at = 0; at < inverse.length; at++) {
            inverse[at] = information[at] + products[at];
        }
        Symmetric.invert(inverse, q);
        for (int i = 0, row = 0; i < q; i++, row += q) {
            double sum = 0;
            for (int j = 0; j < q; j++) {
                sum += inverse[row + j] * scores[j];
            }
            explained[i] = sum;
        }
    }

    /** bᵀWb. */
    double explainedBy(double[] scores) {
        double sum = 0;
        for (int i = 0; i < q; i++) {
            sum += scores[i] * explained[i];
        }
        return sum;
    }

    /** Offers a cause the evidence for a step of the i-th regressor since the onset of the sums. */
    void offerStep(Evidence cause, Sums since, int i) {
        offer(cause, false, since, since.products, i * q, since.products[i * q + i], since.scores[i]);
    }

    /** The same for a ramp. */
    void offerRamp(Evidence cause, Sums since, int i) {
        offer(cause, true, since, since.timed, i * q, since.timedTwice[i], since.timedScores[i]);
    }

    private void offer(
            Evidence cause, boolean ramp, Sums since, double[] crossed, int row, double full, double scored) {
        double m = full;
        double g = scored;
        for (int i = 0, at = 0; i < q; i++) {
            double sum = 0;
            for (int j = 0; j < q; j++, at++) {
                sum += inverse[at] * crossed[row + j];
            }
            m -= crossed[row + i] * sum;
            g -= crossed[row + i] * explained[i];
        }
        if (m > NOTHING * full) {
            cause.offer(g * g / m, ramp, since, g, m);
        }
    }

    /**
     * M and g of a step of all regressors at once since the onset of the sums.
     *
     * @param m q×q, written
     * @param g written
     */
    void joint(Sums since, double[] m, double[] g) {
        double[] a = since.products;
        for (int i = 0; i < q; i++) {
            g[i] = since.scores[i];
            for (int k = 0; k < q; k++) {
                g[i] -= a[i * q + k] * explained[k];
            }
            for (int j = 0; j < q; j++) {
                m[i * q + j] = a[i * q + j] - quadratic(a, i * q, j * q);
            }
        }
    }

    /** xᵀWy of two rows. */
    private double quadratic(double[] a, int x, int y) {
        double sum = 0;
        for (int k = 0; k < q; k++) {
            for (int l = 0; l < q; l++) {
                sum += a[x + k] * inverse[k * q + l] * a[y + l];
            }
        }
        return sum;
    }
}
