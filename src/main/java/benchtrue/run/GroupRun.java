package benchtrue.run;

import benchtrue.alarm.Decision;
import benchtrue.alarm.GroupMonitor;
import benchtrue.alarm.RelationMonitor;
import benchtrue.estimate.Estimator;
import benchtrue.model.Forgetting;
import benchtrue.sheet.Group;
import benchtrue.sheet.RelationSpec;
import java.util.Arrays;
import java.util.List;
import org.jspecify.annotations.Nullable;

/** One group of relations over a run: its estimator, what it has left out, its segments. */
final class GroupRun {
    /** Readings that are kept so that a step can be let in again; more than a row of outliers that confirms one. */
    private static final int RING = 64;

    private final int index;
    private final Group group;
    private final GroupMonitor monitor;
    private final Estimator estimator;
    private final Shadows shadows;
    private final InputWatch inputs;
    private final Ledger ledger;
    private final RowRing ring;
    private final RelationTrack[] tracks;
    private final double[] estimates;
    private final double[] uncertainties;
    private final double[] other;
    private Forgetting forgetting;
    private double segmentStart;
    private String segmentReason = "start of the run";

    GroupRun(int index, Group group, GroupMonitor monitor, Systematic systematic, Systematic noise) {
        this.index = index;
        this.group = group;
        this.monitor = monitor;
        int p = group.unknowns().size();
        int relations = group.relations().size();
        forgetting = group.forgetting();
        boolean[] constant = constantTerms(group);
        estimator = new Estimator(constant, relations, forgetting);
        shadows = new Shadows(systematic, index, constant, forgetting);
        inputs = new InputWatch(noise, index, p);
        ledger = new Ledger(relations);
        ring = new RowRing(RING, relations, p);
        tracks = new RelationTrack[relations];
        for (int k = 0; k < relations; k++) {
            tracks[k] = new RelationTrack();
        }
        uncertainties = new double[p];
        other = otherOf(group);
        estimates = new double[p];
        Arrays.fill(estimates, Double.NaN);
    }

    static boolean[] constantTerms(Group group) {
        boolean[] constant = new boolean[group.unknowns().size()];
        for (int i = 0; i < constant.length; i++) {
            constant[i] = group.unknowns().get(i).constantTerm();
        }
        return constant;
    }

    /**
     * Takes one reading in.
     *
     * @param barred why none of its rows may be used or tested (excluded, warm-up); null: they may
     * @param onHold whether the operator holds the estimates: rows are tested but not used
     */
    Tally.Fate take(
            long number, double time, double elapsed, Row[] rows, @Nullable String barred, boolean onHold, Log log) {
        estimator.next(elapsed);
        shadows.next(elapsed);
        inputs.next(forgetting, elapsed);
        ring.add(number, time, elapsed, rows);
        Tally.Fate fate = Tally.Fate.USED;
        for (int k = 0; k < rows.length; k++) {
            Tally.Fate one = row(k, number, time, rows[k], barred, onHold, log);
            fate = one.compareTo(fate) < 0 ? one : fate;
        }
        estimator.estimates(estimates);
        return fate;
    }

    private Tally.Fate row(int k, long number, double time, Row row, @Nullable String barred, boolean onHold, Log log) {
        RelationTrack track = tracks[k];
        if (!row.present) {
            track.nothing();
            ledger.leaveOut(k, number);
            return Tally.Fate.MISSING;
        }
        estimator.predict(k, row.phi, row.response, row.weight);
        if (barred != null) {
            track.predicted(estimator, Double.NaN, true);
            leaveOut(k, number, barred, log);
            return Tally.Fate.HELD_OUT;
        }
        RelationMonitor tests = monitor.relation(k);
        Decision decision = tests.judge(
                number,
                time,
                row.phi,
                row.response,
                row.weight,
                estimator.standardized(),
                estimator.degreesOfFreedom(k),
                estimator.leverage());
        log.tested(label(k), tests.untested());
        track.predicted(estimator, tests.bound(), !(decision instanceof Decision.Use) || onHold);
        if (onHold) {
            leaveOut(k, number, "held by the operator", log);
            return Tally.Fate.HELD_OUT;
        }
        return follow(decision, k, number, row, log);
    }

    private Tally.Fate follow(Decision decision, int k, long number, Row row, Log log) {
        if (decision instanceof Decision.HoldOut out) {
            if (out.bySampleTest()) {
                ring.hold(k, out.reason());
                ledger.leaveOut(k, number);
                log.leftOut(label(k), out.reason());
            } else {
                leaveOut(k, number, out.reason(), log);
            }
            return Tally.Fate.HELD_OUT;
        }
        if (decision instanceof Decision.Readmit step) {
            ring.hold(k, "outlier");
            ledger.leaveOut(k, number);
            log.leftOut(label(k), "outlier");
            confirmStep(k, step.rows(), log);
            // Taken back with the others, before this reading is counted.
            return Tally.Fate.HELD_OUT;
        }
        use(k, row);
        inputs.use(k, row, row.weight * estimator.relationWeight(k));
        log.used(label(k));
        return Tally.Fate.USED;
    }

    private void leaveOut(int k, long number, String reason, Log log) {
        ring.bar(k);
        ledger.leaveOut(k, number);
        log.leftOut(label(k), reason);
    }

    private void use(int k, Row row) {
        estimator.use();
        shadows.use(k, row, estimates, estimator);
    }

    /** The rows held out since the step began are the first of a new segment. */
    private void confirmStep(int k, int count, Log log) {
        int from = ring.oldestOf(k, count);
        long first = ring.reading(from);
        long taken = ledger.takeBack(k, first);
        for (int i = from; i < ring.size(); i++) {
            String reason = ring.held(i, k);
            if (reason != null) {
                log.takeBack(reason);
            } else if (!ring.row(i, k).present) {
                ledger.leaveOut(k, ring.reading(i));
            }
        }
        log.event(
                "segment",
                label(k),
                Double.NaN,
                "",
                "from reading " + first + ": step confirmed by " + count + " readings in a row beyond the bound; "
                        + taken + " of them are let in again as the first of a new segment");
        begin(first, ring.time(from), "confirmed step");
        replay(from, k);
    }

    private void replay(int from, int readmitted) {
        for (int i = from; i < ring.size(); i++) {
            estimator.next(i == from ? 0 : ring.elapsed(i));
            shadows.next(i == from ? 0 : ring.elapsed(i));
            for (int k = 0; k < tracks.length; k++) {
                Row row = ring.row(i, k);
                if (row.present && (k == readmitted || ring.held(i, k) == null)) {
                    estimator.predict(k, row.phi, row.response, row.weight);
                    use(k, row);
                    estimator.estimates(estimates);
                }
            }
        }
    }

    /** Begins a segment with this reading: what was before is not pooled with what comes. */
    void begin(long firstReading, double time, String reason) {
        ledger.segment(firstReading, time, reason);
        segmentStart = time;
        segmentReason = reason;
        estimator.restart();
        shadows.restart();
        inputs.restart();
        monitor.restart();
        for (RelationTrack track : tracks) {
            track.restart();
        }
    }

    void forget(long fromReading, Forgetting newForgetting) {
        forgetting = newForgetting;
        ledger.forgetting(fromReading, newForgetting);
        estimator.forget(newForgetting);
        shadows.forget(newForgetting);
    }

    /** Whether at least half of what tells this unknown from the others is declared noise of the channels. */
    boolean onlyNoise(int unknown) {
        return inputs.onlyNoise(unknown, estimator, estimates);
    }

    /** Fills its part of the row that is published. */
    void fill(EstimateRow row, int firstUnknown, int firstRelation) {
        System.arraycopy(estimates, 0, row.estimates, firstUnknown, estimates.length);
        estimator.uncertainties(uncertainties);
        shadows.widen(uncertainties, other);
        System.arraycopy(uncertainties, 0, row.uncertainties, firstUnknown, estimates.length);
        for (int k = 0; k < tracks.length; k++) {
            row.innovations[firstRelation + k] = tracks[k].innovation();
            row.bounds[firstRelation + k] = tracks[k].bound();
        }
    }

    /** Looks for a unit or a sign mistaken. */
    void compareWithPlausible() {
        estimator.uncertainties(uncertainties);
        monitor.compareWithPlausible(estimates, uncertainties);
    }

    /** Values with their uncertainties as they stand. */
    Estimates now() {
        int p = estimates.length;
        double[] covariance = new double[p * p];
        estimator.covariance(covariance);
        return new Estimates(
                estimates.clone(), covariance, estimator.degreesOfFreedom(), shadows.effects(), shadows.names(), other);
    }

    static double[] otherOf(Group group) {
        return group.unknowns().stream().mapToDouble(u -> u.otherUncertainty()).toArray();
    }

    private String label(int k) {
        return group.relations().get(k).label();
    }

    List<RelationSpec> specs() {
        return group.relations();
    }

    Group group() {
        return group;
    }

    int index() {
        return index;
    }

    GroupMonitor monitor() {
        return monitor;
    }

    Estimator estimator() {
        return estimator;
    }

    /** The last rows. */
    RowRing ring() {
        return ring;
    }

    Ledger ledger() {
        return ledger;
    }

    Forgetting forgetting() {
        return forgetting;
    }

    RelationTrack track(int k) {
        return tracks[k];
    }

    /** One for each unknown; NaN while not determined. Read only, changes with each reading. */
    double[] estimates() {
        return estimates;
    }

    double segmentStart() {
        return segmentStart;
    }

    String segmentReason() {
        return segmentReason;
    }
}
