package benchtrue.screen;

import benchtrue.model.Interval;
import benchtrue.run.Snapshot;
import java.util.Locale;
import org.jspecify.annotations.Nullable;

/** What is said of one unknown. */
final class Wording {
    private Wording() {}

    static boolean determined(Snapshot.UnknownView unknown) {
        return Double.isFinite(unknown.estimate());
    }

    /** {@code 11.303 ± 0.012}. */
    static String value(Decimals decimals, Snapshot.UnknownView unknown) {
        return determined(unknown)
                ? decimals.text(unknown.name(), unknown.estimate(), unknown.expandedUncertainty())
                : Texts.UNKNOWN;
    }

    /** {@code 0.02 reached}, {@code 0.02 in 40 s}, {@code 0.02 never}; empty where none is wanted. */
    static String wanted(Snapshot.UnknownView unknown) {
        if (Double.isNaN(unknown.wanted()) || Double.isInfinite(unknown.wanted())) {
            return "";
        }
        String wanted = Texts.value(unknown.wanted(), 2);
        if (unknown.expandedUncertainty() <= unknown.wanted()) {
            return wanted + " reached";
        }
        double seconds = unknown.secondsToWanted();
        if (Double.isNaN(seconds)) {
            return wanted;
        }
        return Double.isInfinite(seconds) ? wanted + " never" : wanted + " in " + Texts.span(seconds);
    }

    /** {@code 11.3036, -0.3 u}. */
    static String fromReference(Snapshot.UnknownView unknown) {
        if (Double.isNaN(unknown.reference())) {
            return "";
        }
        String difference = Double.isNaN(unknown.referenceDifference())
                ? ""
                : String.format(Locale.ROOT, ", %+.1f u", unknown.referenceDifference());
        return Texts.value(unknown.reference(), 6) + difference;
    }

    /** The verdict so far, or that it is withheld. */
    static String verdict(Snapshot.UnknownView unknown) {
        if (unknown.verdict() != null) {
            return unknown.verdict();
        }
        return unknown.verdictWithheld() == null ? "" : "withheld";
    }

    /** {@code 11.2 to 11.4}, {@code at least 16}; empty where there are none. */
    static String limits(@Nullable Interval limits) {
        if (limits == null || (Double.isInfinite(limits.lower()) && Double.isInfinite(limits.upper()))) {
            return "";
        }
        if (Double.isInfinite(limits.upper())) {
            return "at least " + Texts.exact(limits.lower());
        }
        return Double.isInfinite(limits.lower())
                ? "at most " + Texts.exact(limits.upper())
                : Texts.exact(limits.lower()) + " to " + Texts.exact(limits.upper());
    }
}
