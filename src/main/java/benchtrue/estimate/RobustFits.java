package benchtrue.estimate;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;

/**
 * Two fits beside least squares that single wild readings do not move. Arrays have p entries.
 *
 * @param leastSquares over the same rows
 * @param huber Huber's estimate with c = 1.345
 * @param leastAbsolute least absolute deviations
 * @param scale of the residuals about Huber's fit: their median size over 0.6745
 * @param rows how many were used
 * @param coarse whether the response takes so few values that least absolute deviations runs along its steps
 * @param stride every how many-th reading that was
 */
public record RobustFits(
        double[] leastSquares,
        double[] huber,
        double[] leastAbsolute,
        double scale,
        int rows,
        long stride,
        boolean coarse) {
    /** Rows for each different value of the response above which it is coarse (common practice, no source). */
    private static final int SHARED = 4;

    /** s this many times the robust scale: tails far heavier than normal ones (common practice, no source). */
    private static final double HEAVY = 2;

    private static final double MEDIAN = 0.6745;
    private static final String LEAST = "Least absolute deviations";

    /** @param start the least-squares estimates, all determined */
    public static RobustFits of(ThinnedRows rows, double[] start) {
        double[] same = rows.stride() == 1 ? start : leastSquares(rows);
        double[] leastAbsolute = LeastAbsoluteFit.of(rows, same);
        double[] huber = HuberFit.of(rows, leastAbsolute);
        double scale = HuberFit.scale(rows, huber);
        return new RobustFits(same, huber, leastAbsolute, scale, rows.size(), rows.stride(), coarse(rows));
    }

    private static double[] leastSquares(ThinnedRows rows) {
        BlockQr qr = new BlockQr(rows.unknowns());
        for (int i = 0; i < rows.size(); i++) {
            qr.add(rows.row(i), rows.row(i)[rows.unknowns()], 1);
        }
        return qr.fit().estimates();
    }

    private static boolean coarse(ThinnedRows rows) {
        int p = rows.unknowns();
        double[] responses = new double[rows.size()];
        for (int i = 0; i < responses.length; i++) {
            responses[i] = rows.row(i)[p];
        }
        return Arrays.stream(responses).distinct().count() * SHARED < responses.length;
    }

    /**
     * A sentence for each unknown of which a robust fit is further than U from least squares, or one that none is.
     *
     * @param sd s of the least-squares fit
     * @param expanded U of its estimates over all rows: over a kth part of them it is taken √k times as large
     */
    public List<String> sentences(List<String> names, List<String> units, double sd, double[] expanded) {
        List<String> sentences = new ArrayList<>();
        for (int j = 0; j < huber.length; j++) {
            double u = expanded[j] * Math.sqrt((double) stride);
            compare(sentences, "Huber", names.get(j), units.get(j), huber[j], leastSquares[j], u);
            if (!coarse) {
                compare(sentences, LEAST, names.get(j), units.get(j), leastAbsolute[j], leastSquares[j], u);
            }
        }
        if (coarse) {
            sentences.add("Least absolute deviations is not judged: the response takes too few different values.");
        }
        if (sentences.size() == (coarse ? 1 : 0)) {
            sentences.add("Huber's fit" + (coarse ? " lies" : " and least absolute deviations lie")
                    + " within U of least squares" + of() + ".");
        }
        if (sd > HEAVY * scale) {
            sentences.add(String.format(
                    Locale.ROOT,
                    "Half of the residuals lie within %.3g of Huber's fit, as of noise with s = %.3g; the few large ones make"
                            + " s = %.3g.",
                    MEDIAN * scale,
                    scale,
                    sd));
        }
        return sentences;
    }

    private void compare(
            List<String> sentences, String fit, String name, String unit, double robust, double estimate, double u) {
        if (Math.abs(robust - estimate) > u) {
            sentences.add(String.format(
                    Locale.ROOT,
                    "%s puts %s at %.6g%s, which is %.1f U from least squares%s: single readings or a part of the run"
                            + " carry the result; look at the residuals.",
                    fit,
                    name,
                    robust,
                    unit.isEmpty() ? "" : " " + unit,
                    Math.abs(robust - estimate) / u,
                    of()));
        }
    }

    private String of() {
        return stride == 1 ? "" : " (on one reading in " + stride + ")";
    }
}
