package benchtrue.estimate;

/**
 * A batch fit. Where it is not determined its arrays hold NaN.
 *
 * @param estimates p, each in its unit
 * @param covariance unscaled, (Σwφφᵀ)⁻¹, p×p row by row
 * @param columnNorms √(Σwφⱼ²), p
 * @param residualSumOfSquares Σw(y − φᵀθ)²
 * @param conditionIndex of the scaled, uncentred columns; infinite where not determined
 */
public record Fit(
        double[] estimates,
        double[] covariance,
        double[] columnNorms,
        double residualSumOfSquares,
        long rows,
        double conditionIndex,
        boolean determined) {

    public double degreesOfFreedom() {
        return rows - (double) estimates.length;
    }

    /** Of a reading of weight 1 where nothing was aged; NaN where no degree of freedom is left. */
    public double residualSd() {
        return degreesOfFreedom() > 0 ? Math.sqrt(residualSumOfSquares / degreesOfFreedom()) : Double.NaN;
    }
}
