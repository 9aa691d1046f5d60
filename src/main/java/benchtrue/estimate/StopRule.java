package benchtrue.estimate;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;

/**
 * Whether there is enough: all unknowns determined, U within the wanted one, at least 30 effective readings, each planned
 * point visited and one of them revisited, the reference quiet, no alarm unacknowledged. Tolerance limits play no part:
 * stopping when the verdict pleases would make it worthless.
 */
public final class StopRule {
    private static final double ENOUGH = 30;

    private StopRule() {}

    /** @param wanted NaN: none */
    public record Sought(String name, boolean determined, double expanded, double wanted) {}

    /**
     * @param effectiveReadings (Σf)²/Σf², divided by the widening of the variance for autocorrelation
     * @param plannedPoints of the sheet; 0: none
     * @param visited how many of them
     * @param revisited whether one was left and come back to
     * @param referenceAdopted whether there is a reference model
     * @param referenceQuiet whether no drift or step alarm stands against it
     * @param unacknowledged alarms
     */
    public record Facts(
            List<Sought> unknowns,
            double effectiveReadings,
            int plannedPoints,
            int visited,
            boolean revisited,
            boolean referenceAdopted,
            boolean referenceQuiet,
            int unacknowledged) {}

    /** Why the run should go on, a phrase for each reason; empty: it may stop. */
    public static List<String> whyNotYet(Facts facts) {
        List<String> reasons = new ArrayList<>();
        for (Sought unknown : facts.unknowns) {
            if (!unknown.determined) {
                reasons.add(unknown.name + " is not determined");
            } else if (unknown.expanded > unknown.wanted) {
                reasons.add(String.format(
                        Locale.ROOT, "U of %s is %.2g, wanted %.2g", unknown.name, unknown.expanded, unknown.wanted));
            }
        }
        if (!(facts.effectiveReadings >= ENOUGH)) {
            reasons.add(String.format(
                    Locale.ROOT, "%.0f effective readings of at least %.0f", facts.effectiveReadings, ENOUGH));
        }
        if (facts.visited < facts.plannedPoints) {
            reasons.add(facts.visited + " of " + facts.plannedPoints + " planned points visited");
        } else if (facts.plannedPoints > 0 && !facts.revisited) {
            reasons.add("no planned point revisited");
        }
        if (!facts.referenceAdopted) {
            reasons.add("no reference model adopted yet");
        } else if (!facts.referenceQuiet) {
            reasons.add("a drift alarm stands against the reference");
        }
        if (facts.unacknowledged > 0) {
            reasons.add(facts.unacknowledged + (facts.unacknowledged == 1 ? " alarm" : " alarms") + " unacknowledged");
        }
        return reasons;
    }
}
