package benchtrue.estimate;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;

/**
 * Two fits beside least squares that single wild readings do not move. Arrays have p entries.
 *
 * @param huber Huber's estimate with c = 1.345
 * @param leastAbsolute least absolute deviations
 * @param rows how many were used
 * @param stride every how many-th reading that was
 */
public record RobustFits(double[] huber, double[] leastAbsolute, int rows, long stride) {

    /** @param start the least-squares estimates, all determined */
    public static RobustFits of(ThinnedRows rows, double[] start) {
        double[] leastAbsolute = LeastAbsoluteFit.of(rows, start);
        return new RobustFits(HuberFit.of(rows, leastAbsolute), leastAbsolute, rows.size(), rows.stride());
    }

    /**
     * A sentence for each unknown of which a robust fit is further than U from least squares, or one that none is.
     *
     * @param expanded U of the least-squares estimates
     */
    public List<String> sentences(List<String> names, List<String> units, double[] estimates, double[] expanded) {
        List<String> sentences = new ArrayList<>();
        for (int j = 0; j < estimates.length; j++) {
            compare(sentences, "Huber", names.get(j), units.get(j), huber[j], estimates[j], expanded[j]);
            compare(
                    sentences,
                    "Least absolute deviations",
                    names.get(j),
                    units.get(j),
                    leastAbsolute[j],
                    estimates[j],
                    expanded[j]);
        }
        if (sentences.isEmpty()) {
            sentences.add("Huber's fit and least absolute deviations lie within U of least squares" + of() + ".");
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
        return stride == 1 ? "" : " (on every " + stride + ". reading)";
    }
}
