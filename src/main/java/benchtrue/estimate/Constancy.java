package benchtrue.estimate;

import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.factory.DecompositionFactory_DDRM;
import org.ejml.interfaces.decomposition.EigenDecomposition_F64;
import org.jspecify.annotations.Nullable;

/**
 * Whether the live memory and the whole segment say the same: d = θ_live − θ_all, dᵀ(V_live − V_all)⁻¹d ~ χ²ₚ while the
 * unknowns are constant (Hausman 1978, Econometrica 46, 1251). It informs; it decides nothing.
 */
public record Constancy(double statistic, double degreesOfFreedom, double pValue) {
    /** Directions in which the two covariances differ by less than this share say nothing. */
    private static final double NOTHING = 1e-6;

    /**
     * @param liveCovariance and {@code allCovariance} p×p, in the unknowns' units
     * @return null where the two do not differ in what they know
     */
    public static @Nullable Constancy judge(
            double[] live, double[] liveCovariance, double[] all, double[] allCovariance) {
        int p = live.length;
        DMatrixRMaj difference = new DMatrixRMaj(p, p);
        double[] scale = new double[p];
        for (int i = 0; i < p; i++) {
            scale[i] = Math.sqrt(liveCovariance[i * p + i]);
        }
        for (int i = 0; i < p; i++) {
            for (int j = 0; j < p; j++) {
                double entry = liveCovariance[i * p + j] - allCovariance[i * p + j];
                difference.set(i, j, entry / (scale[i] * scale[j]));
            }
        }
        EigenDecomposition_F64<DMatrixRMaj> eigen = DecompositionFactory_DDRM.eig(p, true, true);
        if (!eigen.decompose(difference)) {
            return null;
        }
        double statistic = 0;
        int rank = 0;
        for (int k = 0; k < p; k++) {
            double value = eigen.getEigenvalue(k).getReal();
            if (value > NOTHING) {
                double along = 0;
                for (int i = 0; i < p; i++) {
                    along += eigen.getEigenVector(k).get(i) * (live[i] - all[i]) / scale[i];
                }
                statistic += along * along / value;
                rank++;
            }
        }
        return rank == 0 ? null : new Constancy(statistic, rank, Quantiles.chiSquaredTail(statistic, rank));
    }
}
