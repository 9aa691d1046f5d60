package benchtrue.estimate;

import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.ejml.dense.row.factory.LinearSolverFactory_DDRM;
import org.ejml.interfaces.linsol.LinearSolverDense;

/**
 * Directional forgetting computed a second time, in the plain information form, to check the recursion's factors against:
 * A ← A − (1−μ)·Aφφᵀ A/(φᵀAφ) and b ← b − (1−μ)·Aφ(φᵀb)/(φᵀAφ), which leaves θ = A⁻¹b where it is, then A ← A + wφφᵀ,
 * b ← b + wφy. It has half the digits of the factors, enough to judge by uncertainties.
 */
public final class DirectionalSum {
    private final int p;
    private final DMatrixRMaj a;
    private final DMatrixRMaj b;
    private final DMatrixRMaj scaled;
    private final DMatrixRMaj phi;
    private final DMatrixRMaj solution;
    private final double[] norms;
    private final LinearSolverDense<DMatrixRMaj> solver;
    private long rows;

    public DirectionalSum(int unknowns) {
        p = unknowns;
        a = new DMatrixRMaj(p, p);
        b = new DMatrixRMaj(p, 1);
        scaled = new DMatrixRMaj(p, p);
        phi = new DMatrixRMaj(p, 1);
        solution = new DMatrixRMaj(p, 1);
        norms = new double[p];
        solver = LinearSolverFactory_DDRM.symmPosDef(p);
    }

    /** @param mu factor of forgetting along φ; 1 forgets nothing */
    public void add(double[] regressors, double y, double w, double mu) {
        System.arraycopy(regressors, 0, phi.data, 0, p);
        if (mu < 1 && rows >= p && leverage() * w <= 1) {
            forget(mu);
        }
        CommonOps_DDRM.multAddTransB(w, phi, phi, a);
        CommonOps_DDRM.addEquals(b, w * y, phi);
        rows++;
    }

    private void forget(double mu) {
        CommonOps_DDRM.mult(a, phi, solution);
        double q = CommonOps_DDRM.dot(phi, solution);
        double along = CommonOps_DDRM.dot(phi, b);
        CommonOps_DDRM.multAddTransB(-(1 - mu) / q, solution, solution, a);
        CommonOps_DDRM.addEquals(b, -(1 - mu) * along / q, solution);
    }

    private double leverage() {
        return solve(phi) ? CommonOps_DDRM.dot(phi, solution) : Double.POSITIVE_INFINITY;
    }

    /** A⁻¹x into {@code solution}, through the matrix scaled to a unit diagonal; false where A is singular. */
    private boolean solve(DMatrixRMaj x) {
        for (int i = 0; i < p; i++) {
            norms[i] = Math.sqrt(a.get(i, i));
        }
        for (int i = 0; i < p; i++) {
            for (int j = 0; j < p; j++) {
                scaled.set(i, j, a.get(i, j) / (norms[i] * norms[j]));
            }
            solution.set(i, 0, x.get(i, 0) / norms[i]);
        }
        if (!solver.setA(scaled) || solver.quality() < Math.ulp(1.0)) {
            return false;
        }
        solver.solve(solution, solution);
        for (int i = 0; i < p; i++) {
            solution.set(i, 0, solution.get(i, 0) / norms[i]);
        }
        return true;
    }

    /** The solution; the residual sum of squares is not known in this form and NaN. */
    public Fit fit() {
        double[] estimates = new double[p];
        double[] covariance = new double[p * p];
        boolean determined = rows >= p && solve(b);
        for (int i = 0; i < p; i++) {
            estimates[i] = determined ? solution.get(i, 0) : Double.NaN;
        }
        for (int j = 0; j < p; j++) {
            phi.zero();
            phi.set(j, 0, 1);
            boolean known = determined && solve(phi);
            for (int i = 0; i < p; i++) {
                covariance[i * p + j] = known ? solution.get(i, 0) : Double.NaN;
            }
        }
        double condition = determined ? 1 / Math.sqrt(solver.quality()) : Double.POSITIVE_INFINITY;
        return new Fit(estimates, covariance, norms.clone(), Double.NaN, rows, condition, determined);
    }
}
