package benchtrue.estimate;

import java.util.Locale;

/**
 * The arithmetic part of the closing cross-check: the same rows with the same weights, solved in two ways. They agree where
 * |Δθⱼ| ≤ 0.01·uⱼ for all j, or where ‖SΔθ‖ ≤ 100·ε·κ·max(1, √(n/10⁶))·‖Sθ‖ with S the column norms (u may be 0). The
 * first is what matters to whoever uses the numbers; the second is what double precision can promise.
 */
public final class ArithmeticCheck {
    private static final double SHARE_OF_U = 0.01;
    private static final double ROUNDINGS = 100;
    private static final double MANY_ROWS = 1e6;

    private ArithmeticCheck() {}

    /**
     * @param recursive estimates of the recursion
     * @param u their standard uncertainties from the readings
     * @param byUncertaintyOnly where rounding is no measure: rows of the information floor were added, or the second
     *     computation has fewer digits
     */
    public static Agreement judge(double[] recursive, double[] u, Fit batch, boolean byUncertaintyOnly) {
        int p = recursive.length;
        double[] inU = new double[p];
        double largest = 0;
        double moved = 0;
        double length = 0;
        for (int j = 0; j < p; j++) {
            double difference = recursive[j] - batch.estimates()[j];
            inU[j] = difference == 0 ? 0 : difference / u[j];
            largest = Math.max(largest, Math.abs(inU[j]));
            moved = Math.hypot(moved, batch.columnNorms()[j] * difference);
            length = Math.hypot(length, batch.columnNorms()[j] * batch.estimates()[j]);
        }
        double rounding = ROUNDINGS
                * Math.ulp(1.0)
                * batch.conditionIndex()
                * Math.max(1, Math.sqrt(batch.rows() / MANY_ROWS))
                * length;
        boolean close = largest <= SHARE_OF_U;
        boolean rounded = !byUncertaintyOnly && moved <= rounding;
        return new Agreement(inU, largest, close || rounded, words(largest, close, rounded, byUncertaintyOnly));
    }

    private static String words(double largest, boolean close, boolean rounded, boolean byUncertaintyOnly) {
        String difference = String.format(Locale.ROOT, "Largest difference %.2g u", largest);
        if (close) {
            return difference + " (limit 0.01 u)"
                    + (byUncertaintyOnly ? "; they need not agree to rounding here." : ".");
        }
        return rounded
                ? difference + ", within the rounding of double precision at this condition."
                : difference + ", more than 0.01 u and more than rounding explains.";
    }
}
