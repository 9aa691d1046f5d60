package benchtrue.estimate;

import java.util.Arrays;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.factory.DecompositionFactory_DDRM;
import org.ejml.interfaces.decomposition.QRDecomposition;
import org.ejml.interfaces.decomposition.SingularValueDecomposition_F64;

/**
 * Batch least squares over rows of any number: Householder QR of blocks, the R factors stacked. Independent of the recursion,
 * which it is there to check. The response is one more column.
 */
public final class BlockQr {
    private static final int BLOCK = 512;
    private static final double LARGEST_CONDITION = 1e12;
    /** Rows are kept relative to the ageing since the block began; before that underflows the block is closed. */
    private static final double SMALLEST_AGE = 1e-100;

    private final int p;
    private final int width;
    private final DMatrixRMaj block;
    private final QRDecomposition<DMatrixRMaj> qr;
    private final DMatrixRMaj r;
    private int filled;
    private double age = 1;
    private long rows;

    public BlockQr(int unknowns) {
        p = unknowns;
        width = p + 1;
        block = new DMatrixRMaj(BLOCK + width, width);
        qr = DecompositionFactory_DDRM.qr(BLOCK + width, width);
        r = new DMatrixRMaj(width, width);
    }

    /** All rows so far weigh {@code factor} times as much; above 0, at most 1. */
    public void age(double factor) {
        age *= factor;
        if (age < SMALLEST_AGE) {
            reduce();
        }
    }

    /** Takes a row in. φ is read. */
    public void add(double[] phi, double y, double w) {
        double root = Math.sqrt(w / age);
        int at = filled * width;
        for (int j = 0; j < p; j++) {
            block.data[at + j] = root * phi[j];
        }
        block.data[at + p] = root * y;
        filled++;
        rows++;
        if (filled == BLOCK) {
            reduce();
        }
    }

    /** Replaces the rows of the block and the R factor before them by one R factor. */
    private void reduce() {
        if (filled == 0) {
            scale(Math.sqrt(age));
            age = 1;
            return;
        }
        System.arraycopy(r.data, 0, block.data, filled * width, width * width);
        block.numRows = filled + width;
        // False only tells that a column had nothing left below its diagonal: R is right all the same.
        qr.decompose(block);
        qr.getR(r, true);
        block.reshape(BLOCK + width, width);
        scale(Math.sqrt(age));
        age = 1;
        filled = 0;
    }

    private void scale(double factor) {
        if (factor != 1) {
            for (int i = 0; i < width * width; i++) {
                r.data[i] *= factor;
            }
        }
    }

    public long rows() {
        return rows;
    }

    /** The solution over all rows so far; more may be added afterwards. */
    public Fit fit() {
        // While all rows are at hand one step of refinement costs nothing and brings back what the QR rounded away.
        double[] raw = rows == filled ? Arrays.copyOf(block.data, filled * width) : new double[0];
        double root = Math.sqrt(age);
        reduce();
        double[] norms = new double[p];
        DMatrixRMaj scaled = new DMatrixRMaj(p, p);
        for (int j = 0; j < p; j++) {
            double sum = 0;
            for (int i = 0; i <= j; i++) {
                sum += r.get(i, j) * r.get(i, j);
            }
            norms[j] = Math.sqrt(sum);
            for (int i = 0; i <= j; i++) {
                scaled.set(i, j, norms[j] > 0 ? r.get(i, j) / norms[j] : 0);
            }
        }
        double condition = condition(scaled);
        double rss = r.get(p, p) * r.get(p, p);
        boolean determined = rows >= p && condition < LARGEST_CONDITION;
        double[] estimates = new double[p];
        double[] covariance = new double[p * p];
        if (determined) {
            solve(estimates);
            invert(covariance);
            refine(estimates, covariance, raw, root);
        } else {
            Arrays.fill(estimates, Double.NaN);
            Arrays.fill(covariance, Double.NaN);
        }
        return new Fit(estimates, covariance, norms, rss, rows, condition, determined);
    }

    private double condition(DMatrixRMaj scaled) {
        SingularValueDecomposition_F64<DMatrixRMaj> svd = DecompositionFactory_DDRM.svd(p, p, false, false, true);
        if (!svd.decompose(scaled)) {
            throw new IllegalStateException("singular values of a " + p + "×" + p + " matrix did not converge");
        }
        double largest = 0;
        double smallest = Double.POSITIVE_INFINITY;
        for (double value : svd.getSingularValues()) {
            largest = Math.max(largest, value);
            smallest = Math.min(smallest, value);
        }
        return smallest > 0 ? largest / smallest : Double.POSITIVE_INFINITY;
    }

    private void solve(double[] estimates) {
        for (int i = p - 1; i >= 0; i--) {
            double sum = r.get(i, p);
            for (int j = i + 1; j < p; j++) {
                sum -= r.get(i, j) * estimates[j];
            }
            estimates[i] = sum / r.get(i, i);
        }
    }

    /** θ ← θ + (RᵀR)⁻¹Xᵀ(y − Xθ): corrected seminormal equations (Björck 1987, Linear Algebra Appl. 88, 31; from memory). */
    private void refine(double[] estimates, double[] covariance, double[] raw, double root) {
        double[] gradient = new double[p];
        for (int at = 0; at < raw.length; at += width) {
            double residual = raw[at + p];
            for (int j = 0; j < p; j++) {
                residual = Math.fma(-raw[at + j], estimates[j], residual);
            }
            for (int j = 0; j < p; j++) {
                gradient[j] += root * raw[at + j] * root * residual;
            }
        }
        for (int i = 0; i < p; i++) {
            double step = 0;
            for (int j = 0; j < p; j++) {
                step += covariance[i * p + j] * gradient[j];
            }
            estimates[i] += step;
        }
    }

    /** R⁻¹R⁻ᵀ. */
    private void invert(double[] covariance) {
        double[][] inverse = new double[p][p];
        for (int k = 0; k < p; k++) {
            for (int i = k; i >= 0; i--) {
                double sum = i == k ? 1 : 0;
                for (int j = i + 1; j <= k; j++) {
                    sum -= r.get(i, j) * inverse[j][k];
                }
                inverse[i][k] = sum / r.get(i, i);
            }
        }
        for (int i = 0; i < p; i++) {
            for (int j = 0; j < p; j++) {
                double sum = 0;
                for (int k = Math.max(i, j); k < p; k++) {
                    sum += inverse[i][k] * inverse[j][k];
                }
                covariance[i * p + j] = sum;
            }
        }
    }
}
