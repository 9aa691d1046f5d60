package benchtrue.estimate;

/**
 * The covariance of θ in units of s² by the gains that were really applied, C ← (I − Kφᵀ)C(I − Kφᵀ)ᵀ + KKᵀ/w (Joseph's form),
 * for when floor rows or directional forgetting make the closed forms untrue. It is kept whitened by a base R̄ᵦ, Dᵦ:
 * C′ = Dᵦ^½R̄ᵦ·C·R̄ᵦᵀDᵦ^½, because in raw coordinates it diverges where the unknowns are ill-conditioned.
 */
final class AppliedCovariance {
    private final int p;
    private final InformationFactor base;
    private final double[] roots;
    private final double[] c;
    private final double[] psi;
    private final double[] k;
    private final double[] cPsi;

    AppliedCovariance(int unknowns) {
        p = unknowns;
        base = new InformationFactor(p);
        roots = new double[p];
        c = new double[p * p];
        psi = new double[p];
        k = new double[p];
        cPsi = new double[p];
    }

    /** Starts from a covariance, whitened by this information, which is copied. */
    void start(InformationFactor whitening, double[] covariance) {
        base.copy(whitening);
        double[] column = new double[p];
        double[] half = new double[p * p];
        for (int i = 0; i < p; i++) {
            roots[i] = Math.sqrt(base.d(i));
        }
        for (int j = 0; j < p; j++) {
            for (int i = 0; i < p; i++) {
                column[i] = covariance[i * p + j];
            }
            whiten(column);
            for (int i = 0; i < p; i++) {
                half[j * p + i] = column[i];
            }
        }
        for (int i = 0; i < p; i++) {
            for (int j = 0; j < p; j++) {
                column[j] = half[j * p + i];
            }
            whiten(column);
            System.arraycopy(column, 0, c, i * p, p);
        }
    }

    private void whiten(double[] a) {
        base.multiplyInPlace(a);
        for (int i = 0; i < p; i++) {
            a[i] *= roots[i];
        }
    }

    private void unwhiten(double[] a) {
        for (int i = 0; i < p; i++) {
            a[i] /= roots[i];
        }
        base.solveInPlace(a);
    }

    /** Takes in a reading of weight w whose innovation moved θ by {@code gain}·e. */
    void apply(double[] phi, double[] gain, double w) {
        System.arraycopy(gain, 0, k, 0, p);
        whiten(k);
        double quadratic = project(phi);
        // C − kψᵀC − Cψkᵀ + k(ψᵀCψ + 1/w)kᵀ, the same as Joseph's product with p² operations; symmetric as written.
        double middle = quadratic + 1 / w;
        for (int i = 0; i < p; i++) {
            for (int j = 0; j <= i; j++) {
                double value = c[i * p + j] - k[i] * cPsi[j] - cPsi[i] * k[j] + k[i] * middle * k[j];
                c[i * p + j] = value;
                c[j * p + i] = value;
            }
        }
    }

    /** φᵀPᵦφ of the row last looked at, Pᵦ of the base: how much more it tells than the base knows. */
    double beyondBase() {
        double sum = 0;
        for (int i = 0; i < p; i++) {
            sum += psi[i] * psi[i];
        }
        return sum;
    }

    /** φᵀCφ. */
    double quadratic(double[] phi) {
        return project(phi);
    }

    private double project(double[] phi) {
        base.eliminate(phi, 0, psi);
        for (int i = 0; i < p; i++) {
            psi[i] /= roots[i];
        }
        double quadratic = 0;
        for (int i = 0; i < p; i++) {
            double sum = 0;
            for (int j = 0; j < p; j++) {
                sum += c[i * p + j] * psi[j];
            }
            cPsi[i] = sum;
            quadratic += psi[i] * sum;
        }
        return Math.max(0, quadratic);
    }

    /** C in the unknowns' own units, p×p. */
    void covariance(double[] into) {
        double[] column = new double[p];
        double[] half = new double[p * p];
        for (int j = 0; j < p; j++) {
            System.arraycopy(c, j * p, column, 0, p);
            unwhiten(column);
            for (int i = 0; i < p; i++) {
                half[i * p + j] = column[i];
            }
        }
        for (int i = 0; i < p; i++) {
            System.arraycopy(half, i * p, column, 0, p);
            unwhiten(column);
            System.arraycopy(column, 0, into, i * p, p);
        }
    }
}
