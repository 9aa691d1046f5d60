package benchtrue.alarm;

import benchtrue.sheet.Group;
import benchtrue.sheet.UnknownSpec;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.jspecify.annotations.Nullable;

/** The tests of the relations that are estimated together, and the reference model that they share. */
public final class GroupMonitor {
    private final Group group;
    private final AlarmBook book;
    private final List<RelationMonitor> relations = new ArrayList<>();
    private final List<ReferenceModel> references = new ArrayList<>();

    GroupMonitor(
            Group group, List<Watched> watched, Budget budget, AlarmBook book, Channels channels, ClockWatch clock) {
        this.group = group;
        this.book = book;
        for (Watched each : watched) {
            relations.add(new RelationMonitor(each, budget, book, channels, clock));
        }
    }

    public RelationMonitor relation(int k) {
        return relations.get(k);
    }

    /** The reference model that drift is judged against, or null. */
    public @Nullable ReferenceModel reference() {
        return references.isEmpty() ? null : references.get(references.size() - 1);
    }

    /** All that were adopted, oldest first. */
    public List<ReferenceModel> references() {
        return List.copyOf(references);
    }

    /** From the next reading on drift is judged against this model; earlier ones are kept in the list. */
    public void adopt(ReferenceModel model) {
        references.add(model);
        for (int k = 0; k < relations.size(); k++) {
            relations.get(k).adopt(model, k);
        }
    }

    /**
     * Compares the estimates with what the sheet calls plausible: a unit or a sign mistaken is an alarm until it is mended. To
     * be called now and then, with estimates that are determined.
     *
     * @param estimates one for each unknown, in its unit, NaN where not known; read
     * @param uncertainties standard uncertainties of these; read
     */
    public void compareWithPlausible(double[] estimates, double[] uncertainties) {
        for (RelationMonitor relation : relations) {
            relation.compareWithPlausible(estimates, uncertainties);
        }
    }

    /**
     * Why the present model must not yet become the reference by itself, apart from the sheet's time.
     *
     * @param settled whether each unknown is determined and settled
     * @param estimates one for each unknown, in its unit; read
     * @return empty where nothing stands against it
     */
    public String notAdoptedWhy(boolean settled, double[] estimates) {
        if (!settled) {
            return "not settled";
        }
        for (int i = 0; i < estimates.length; i++) {
            UnknownSpec unknown = group.unknowns().get(i);
            if (unknown.plausible() != null && !unknown.plausible().contains(estimates[i])) {
                return String.format(Locale.ROOT, "%s is not plausible", unknown.name());
            }
        }
        if (book.anyStanding()) {
            return "an alarm stands";
        }
        return relations.stream().allMatch(RelationMonitor::autocorrelationKnown)
                ? ""
                : "too few readings to know the noise";
    }

    /** Variance of a mean over many readings relative to independent ones, for the covariance of a new reference; at least 1. */
    public double varianceFactor() {
        return relations.stream()
                .mapToDouble(RelationMonitor::varianceFactor)
                .max()
                .orElse(1);
    }

    /** Begins a segment: what the live model's innovations said before is forgotten, the reference stays. */
    public void restart() {
        relations.forEach(RelationMonitor::restart);
    }
}
