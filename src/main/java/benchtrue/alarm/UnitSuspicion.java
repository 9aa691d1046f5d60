package benchtrue.alarm;

import benchtrue.model.Interval;
import benchtrue.sheet.UnknownSpec;
import java.util.ArrayList;
import java.util.List;

/** Whether an estimate that is not plausible would be with another unit or another sign of what it multiplies. */
final class UnitSuspicion {
    /** Factors between units that get mistaken for each other; their reciprocals as well. */
    private static final double[] FACTORS = {
        3.6, 4.44822, 6.894757, 9.80665, 10, 14.5038, 16.667, 25.4, 60, 100, 1000, 2 * Math.PI / 60, 0.45359237, 1.8
    };

    private static final double SURE = 4;
    private static final double KNOWN = 0.05;
    private static final double WIDEST = 10;
    private static final Suspicion NOTHING = new Suspicion(List.of(), false);

    private UnitSuspicion() {}

    /** What is suspected; both empty where the estimate is plausible, or nothing known would make it so. */
    record Suspicion(List<String> units, boolean sign) {
        boolean none() {
            return units.isEmpty() && !sign;
        }
    }

    /**
     * Nothing is suspected while the estimate is not known to 5 %, nor of an interval that is so wide that most factors would
     * lead into it.
     *
     * @param u standard uncertainty of the estimate
     */
    static Suspicion of(double estimate, double u, Interval plausible) {
        double margin = SURE * u;
        boolean fine = estimate >= plausible.lower() - margin && estimate <= plausible.upper() + margin;
        if (fine || !(margin <= KNOWN * Math.abs(estimate))) {
            return NOTHING;
        }
        boolean sign = plausible.contains(-estimate);
        return sign || !telling(plausible)
                ? new Suspicion(List.of(), sign)
                : new Suspicion(units(estimate, plausible), false);
    }

    private static boolean telling(Interval plausible) {
        double ratio = plausible.upper() / plausible.lower();
        return ratio > 0 && Math.max(ratio, 1 / ratio) <= WIDEST;
    }

    private static List<String> units(double estimate, Interval plausible) {
        List<String> units = new ArrayList<>();
        for (double factor : FACTORS) {
            if (plausible.contains(estimate / factor)) {
                units.add("×" + Words.number(factor));
            }
            if (plausible.contains(estimate * factor)) {
                units.add("÷" + Words.number(factor));
            }
        }
        return List.copyOf(units);
    }

    /** Question and what to look at. */
    static String words(UnknownSpec unknown, double estimate, Suspicion suspicion, List<String> factors) {
        String of = factors.isEmpty() ? "the response" : String.join(", ", factors) + " or the response";
        String value = unknown.name() + " = " + Words.number(estimate)
                + Words.unit(unknown.unit().symbol());
        if (suspicion.sign()) {
            return value
                    + " has the size that is plausible, but not the sign: sign? Look at the polarity or direction of "
                    + of;
        }
        return value + " is not plausible, but would be by a factor: unit? "
                + String.join(" or ", suspicion.units())
                + ". Does " + of + " come in the unit that the sheet says?";
    }
}
