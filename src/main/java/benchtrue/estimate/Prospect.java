package benchtrue.estimate;

import java.util.List;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.factory.LinearSolverFactory_DDRM;
import org.ejml.interfaces.linsol.LinearSolverDense;

/**
 * How the uncertainty of a combination cᵀθ would go on with further readings. Two matrices are carried forward:
 * A ← λA + M and B ← λ²B + M with M = Σwφφᵀ of a reading; the covariance is s²·A⁻¹BA⁻¹, the one that is true under forgetting.
 * Immutable; arrays given are copied.
 */
public final class Prospect {
    private final int p;
    private final double[] a;
    private final double[] b;
    private final double variance;
    private final double factor;
    private final double nu;
    private final double otherUncertainty;
    private final double[] c;

    private Prospect(
            double[] a, double[] b, double variance, double factor, double nu, double otherUncertainty, double[] c) {
        p = c.length;
        this.a = a;
        this.b = b;
        this.variance = variance;
        this.factor = factor;
        this.nu = nu;
        this.otherUncertainty = otherUncertainty;
        this.c = c;
    }

    /**
     * @param inverse P = (Σf·w·φφᵀ)⁻¹ of the readings so far, p×p
     * @param typeA u of cᵀθ from the readings alone
     * @param variance s², widened for autocorrelation, of a reading of weight 1
     * @param factor λ of a reading; 1: nothing is forgotten
     * @param nu degrees of freedom of the readings
     * @param otherUncertainty of cᵀθ, which does not average away
     * @param c p coefficients
     */
    public static Prospect of(
            double[] inverse,
            double typeA,
            double variance,
            double factor,
            double nu,
            double otherUncertainty,
            double[] c) {
        double[] a = inverse(inverse, c.length);
        double known = quadratic(inverse, c) * variance;
        // B = A·C·A/s²; only the part of C along c is given, so B is A scaled to give it.
        double scale = known > 0 ? typeA * typeA / known : 1;
        double[] b = a.clone();
        for (int i = 0; i < b.length; i++) {
            b[i] *= scale;
        }
        return new Prospect(a, b, variance, factor, nu, otherUncertainty, c.clone());
    }

    private static double quadratic(double[] matrix, double[] c) {
        double sum = 0;
        for (int i = 0; i < c.length; i++) {
            for (int j = 0; j < c.length; j++) {
                sum += c[i] * matrix[i * c.length + j] * c[j];
            }
        }
        return sum;
    }

    /** Of a symmetric matrix, scaled to a diagonal of 1; NaN where it cannot be inverted. */
    private static double[] inverse(double[] matrix, int p) {
        double[] root = new double[p];
        for (int i = 0; i < p; i++) {
            root[i] = Math.sqrt(matrix[i * p + i]);
        }
        DMatrixRMaj scaled = new DMatrixRMaj(p, p);
        for (int i = 0; i < p; i++) {
            for (int j = 0; j < p; j++) {
                scaled.set(i, j, matrix[i * p + j] / (root[i] * root[j]));
            }
        }
        DMatrixRMaj result = new DMatrixRMaj(p, p);
        LinearSolverDense<DMatrixRMaj> solver = LinearSolverFactory_DDRM.chol(p);
        if (solver.setA(scaled)) {
            solver.invert(result);
        } else {
            result.fill(Double.NaN);
        }
        double[] inverse = new double[p * p];
        for (int i = 0; i < p; i++) {
            for (int j = 0; j < p; j++) {
                inverse[i * p + j] = result.get(i, j) / (root[i] * root[j]);
            }
        }
        return inverse;
    }

    /** After n more readings that each bring M, p×p. */
    public Prospect after(double[] m, double n) {
        double aged = Math.pow(factor, n);
        double gained = factor == 1 ? n : -Math.expm1(n * Math.log(factor)) / (1 - factor);
        double agedTwice = aged * aged;
        double gainedTwice = factor == 1 ? n : -Math.expm1(2 * n * Math.log(factor)) / (1 - factor) / (1 + factor);
        double[] nextA = new double[p * p];
        double[] nextB = new double[p * p];
        for (int i = 0; i < p * p; i++) {
            nextA[i] = aged * a[i] + gained * m[i];
            nextB[i] = agedTwice * b[i] + gainedTwice * m[i];
        }
        // ν is (Σf)²/Σf²: it grows by one a reading, up to (1 + λ)/(1 − λ).
        double most = factor == 1 ? Double.POSITIVE_INFINITY : (1 + factor) / (1 - factor);
        double nextNu = factor == 1 ? nu + n : nu + Math.max(0, most - nu) * (1 - aged);
        return new Prospect(nextA, nextB, variance, factor, nextNu, otherUncertainty, c);
    }

    /** The same readings with nothing forgotten from now on. */
    Prospect withoutForgetting() {
        return new Prospect(a, b, variance, 1, nu, otherUncertainty, c);
    }

    double factor() {
        return factor;
    }

    int unknowns() {
        return p;
    }

    /** cᵀA⁻¹c, by which candidates are compared; infinite where c is not determined. */
    double quadratic() {
        double value = quadratic(inverse(a, p), c);
        return value >= 0 ? value : Double.POSITIVE_INFINITY;
    }

    /** The part of U that readings cannot make smaller. */
    double otherExpanded() {
        return Quantiles.coverageFactor(Double.POSITIVE_INFINITY) * otherUncertainty;
    }

    /** U of cᵀθ at 95 %; infinite where c is not determined. */
    public double expanded() {
        double[] inverse = inverse(a, p);
        double[] along = new double[p];
        for (int i = 0; i < p; i++) {
            for (int j = 0; j < p; j++) {
                along[i] += inverse[i * p + j] * c[j];
            }
        }
        double squared = variance * quadratic(b, along);
        if (!(squared >= 0)) {
            return Double.POSITIVE_INFINITY;
        }
        return Uncertainty.combine(List.of(
                        new Component("readings", Math.sqrt(squared), nu),
                        new Component("other", otherUncertainty, Double.POSITIVE_INFINITY)))
                .expanded();
    }
}
