package benchtrue.estimate;

import java.util.Arrays;

/**
 * Huber's M-estimate with c = 1.345, 95 % efficient under normal noise (Huber 1964, Annals of Mathematical Statistics 35, 73;
 * Holland and Welsch 1977, Communications in Statistics A6, 813): least squares with weights min(1, c·s/|r|), repeated. The
 * scale s is the median of |r| over 0.6745, taken afresh each time.
 */
final class HuberFit {
    private static final double C = 1.345;
    /** Median of |z| of the normal distribution. */
    private static final double MEDIAN_OF_ABSOLUTE = 0.6744897501960817;

    private static final int MOST_ROUNDS = 100;
    private static final double ENOUGH = 1e-9;

    private HuberFit() {}

    /** @return p estimates, or the start where the scale is 0: at least half of the rows fit it exactly */
    static double[] of(ThinnedRows rows, double[] start) {
        double[] theta = start.clone();
        for (int round = 0; round < MOST_ROUNDS; round++) {
            double scale = scale(rows, theta);
            if (!(scale > 0)) {
                return theta;
            }
            Fit fit = weighted(rows, theta, C * scale);
            if (!fit.determined()) {
                return theta;
            }
            double moved = moved(fit, theta);
            theta = fit.estimates();
            if (moved <= ENOUGH * scale) {
                return theta;
            }
        }
        return theta;
    }

    static double scale(ThinnedRows rows, double[] theta) {
        double[] sizes = new double[rows.size()];
        for (int i = 0; i < sizes.length; i++) {
            sizes[i] = Math.abs(rows.residual(i, theta));
        }
        Arrays.sort(sizes);
        int n = sizes.length;
        return (sizes[n / 2] + sizes[(n - 1) / 2]) / 2 / MEDIAN_OF_ABSOLUTE;
    }

    private static Fit weighted(ThinnedRows rows, double[] theta, double bound) {
        BlockQr qr = new BlockQr(rows.unknowns());
        for (int i = 0; i < rows.size(); i++) {
            double size = Math.abs(rows.residual(i, theta));
            double[] row = rows.row(i);
            qr.add(row, row[rows.unknowns()], size <= bound ? 1 : bound / size);
        }
        return qr.fit();
    }

    /** The root mean square change of the fitted values. */
    private static double moved(Fit fit, double[] theta) {
        double sum = 0;
        for (int j = 0; j < theta.length; j++) {
            sum = Math.hypot(sum, fit.columnNorms()[j] * (fit.estimates()[j] - theta[j]));
        }
        return sum / Math.sqrt((double) fit.rows());
    }
}
