package benchtrue.estimate;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.factory.LinearSolverFactory_DDRM;
import org.ejml.interfaces.linsol.LinearSolverDense;
import org.jspecify.annotations.Nullable;

/**
 * Least absolute deviations, exactly: the minimum of Σ√w|y − φᵀθ| lies where p rows fit exactly. From such a vertex the
 * steepest edge is followed to the weighted median of its crossings, until no edge goes down (Bloomfield and Steiger 1983,
 * Least Absolute Deviations, ch. 1; from memory). Weighted least squares comes close first and chooses the first vertex.
 */
final class LeastAbsoluteFit {
    private static final int APPROACHES = 12;
    private static final int MOST_EDGES = 300;
    /** A residual below this share of the response fits exactly. */
    private static final double ROUNDING = 0x1p-46;
    /** A slope above −1e-9 of the sum of its terms is level. */
    private static final double LEVEL = 1e-9;

    private final ThinnedRows rows;
    private final int p;
    private final int n;
    private final double[] residuals;
    private final int[] basis;
    private final boolean[] isBasis;
    private final DMatrixRMaj matrix;
    private final DMatrixRMaj inverse;
    private double[] theta;

    private LeastAbsoluteFit(ThinnedRows rows, double[] start) {
        this.rows = rows;
        p = rows.unknowns();
        n = rows.size();
        residuals = new double[n];
        basis = new int[p];
        isBasis = new boolean[n];
        matrix = new DMatrixRMaj(p, p);
        inverse = new DMatrixRMaj(p, p);
        theta = start.clone();
    }

    /** @return p estimates; the start must be the least-squares fit, or another near one */
    static double[] of(ThinnedRows rows, double[] start) {
        LeastAbsoluteFit fit = new LeastAbsoluteFit(rows, start);
        if (fit.n <= fit.p) {
            return start.clone();
        }
        fit.approach();
        double[] near = fit.theta;
        double before = fit.sum(near);
        if (!fit.firstVertex()) {
            return near;
        }
        fit.descend();
        return fit.sum(fit.theta) <= before ? fit.theta : near;
    }

    private double sum(double[] at) {
        double sum = 0;
        for (int i = 0; i < n; i++) {
            sum += Math.abs(rows.residual(i, at));
        }
        return sum;
    }

    /** Least squares with weights 1/|r| (Schlossmacher 1973), where |r| is not below a small share of the scale. */
    private void approach() {
        double share = 1;
        for (int round = 0; round < APPROACHES; round++) {
            double least = share * HuberFit.scale(rows, theta);
            if (!(least > 0)) {
                return;
            }
            BlockQr qr = new BlockQr(p);
            for (int i = 0; i < n; i++) {
                double[] row = rows.row(i);
                qr.add(row, row[p], 1 / Math.max(least, Math.abs(rows.residual(i, theta))));
            }
            Fit fit = qr.fit();
            if (!fit.determined()) {
                return;
            }
            theta = fit.estimates();
            share /= 3;
        }
    }

    /** The p rows that fit best and are independent of each other; false where there are none. */
    private boolean firstVertex() {
        Integer[] order = new Integer[n];
        for (int i = 0; i < n; i++) {
            order[i] = i;
            residuals[i] = Math.abs(rows.residual(i, theta));
        }
        Arrays.sort(order, Comparator.comparingDouble(i -> residuals[i]));
        double[][] orthogonal = new double[p][];
        int found = 0;
        double[] scale = columnScale();
        for (int at = 0; at < n && found < p; at++) {
            double[] left = independent(rows.row(order[at]), scale, orthogonal, found);
            if (left != null) {
                orthogonal[found] = left;
                basis[found++] = order[at];
                isBasis[order[at]] = true;
            }
        }
        return found == p && solveVertex();
    }

    private double[] columnScale() {
        double[] scale = new double[p];
        for (int i = 0; i < n; i++) {
            for (int j = 0; j < p; j++) {
                scale[j] = Math.max(scale[j], Math.abs(rows.row(i)[j]));
            }
        }
        return scale;
    }

    /** The part of a row at right angles to those found, of length 1; null where next to nothing is left. */
    private double @Nullable [] independent(double[] row, double[] scale, double[][] orthogonal, int found) {
        double[] left = new double[p];
        for (int j = 0; j < p; j++) {
            left[j] = scale[j] > 0 ? row[j] / scale[j] : 0;
        }
        double length = length(left);
        for (int twice = 0; twice < 2; twice++) {
            for (int k = 0; k < found; k++) {
                double along = 0;
                for (int j = 0; j < p; j++) {
                    along += left[j] * orthogonal[k][j];
                }
                for (int j = 0; j < p; j++) {
                    left[j] -= along * orthogonal[k][j];
                }
            }
        }
        double remaining = length(left);
        if (!(remaining > 1e-4 * length)) {
            return null;
        }
        for (int j = 0; j < p; j++) {
            left[j] /= remaining;
        }
        return left;
    }

    private static double length(double[] a) {
        double length = 0;
        for (double each : a) {
            length = Math.hypot(length, each);
        }
        return length;
    }

    /** θ through the rows of the basis, and the inverse of their matrix. */
    private boolean solveVertex() {
        DMatrixRMaj response = new DMatrixRMaj(p, 1);
        for (int k = 0; k < p; k++) {
            double[] row = rows.row(basis[k]);
            for (int j = 0; j < p; j++) {
                matrix.set(k, j, row[j]);
            }
            response.set(k, 0, row[p]);
        }
        LinearSolverDense<DMatrixRMaj> solver = LinearSolverFactory_DDRM.lu(p);
        if (!solver.setA(matrix.copy())) {
            return false;
        }
        DMatrixRMaj solution = new DMatrixRMaj(p, 1);
        solver.solve(response, solution);
        solver.invert(inverse);
        theta = solution.data.clone();
        for (int i = 0; i < n; i++) {
            double residual = rows.residual(i, theta);
            residuals[i] = isBasis[i] || Math.abs(residual) <= ROUNDING * Math.abs(rows.row(i)[p]) ? 0 : residual;
        }
        return true;
    }

    /** An edge leaves one row of the basis, whose fit then grows (sign 1) or falls (−1). */
    private record Edge(int place, int sign) {}

    private void descend() {
        for (int step = 0; step < MOST_EDGES; step++) {
            Edge edge = steepest();
            int entering = edge == null ? -1 : crossing(edge);
            if (edge == null || entering < 0) {
                return;
            }
            isBasis[basis[edge.place]] = false;
            isBasis[entering] = true;
            basis[edge.place] = entering;
            if (!solveVertex()) {
                return;
            }
        }
    }

    /** Null where no edge goes down. Rows that fit exactly without being in the basis resist both ways. */
    private @Nullable Edge steepest() {
        double best = -LEVEL;
        Edge edge = null;
        for (int k = 0; k < p; k++) {
            double pull = 0;
            double resistance = 1;
            double size = 1;
            for (int i = 0; i < n; i++) {
                if (!isBasis[i]) {
                    double along = along(i, k);
                    pull += Math.signum(residuals[i]) * along;
                    resistance += residuals[i] == 0 ? Math.abs(along) : 0;
                    size += Math.abs(along);
                }
            }
            double slope = (resistance - Math.abs(pull)) / size;
            if (slope < best) {
                best = slope;
                edge = new Edge(k, pull > 0 ? 1 : -1);
            }
        }
        return edge;
    }

    /** How fast the fitted value of row i grows along edge k, on which the fit of row k of the basis grows by 1. */
    private double along(int i, int k) {
        double[] row = rows.row(i);
        double sum = 0;
        for (int j = 0; j < p; j++) {
            sum += row[j] * inverse.get(j, k);
        }
        return sum;
    }

    /** The row whose residual changes sign where the sum stops to fall along an edge; −1 where none does. */
    private int crossing(Edge edge) {
        double[] at = new double[n];
        double[] speed = new double[n];
        List<Integer> crossed = new ArrayList<>();
        double slope = 1;
        for (int i = 0; i < n; i++) {
            if (!isBasis[i]) {
                double along = edge.sign * along(i, edge.place);
                speed[i] = Math.abs(along);
                at[i] = residuals[i] / along;
                slope += at[i] > 0 ? -speed[i] : speed[i];
                if (at[i] > 0 && speed[i] > 0) {
                    crossed.add(i);
                }
            }
        }
        crossed.sort(Comparator.comparingDouble(i -> at[i]));
        for (int i : crossed) {
            slope += 2 * speed[i];
            if (slope >= 0) {
                return i;
            }
        }
        return -1;
    }
}
