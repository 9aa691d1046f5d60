package benchtrue.run;

import benchtrue.alarm.Alarm;
import benchtrue.alarm.ReferenceModel;
import benchtrue.alarm.RelationMonitor;
import benchtrue.estimate.Diagnosis;
import benchtrue.estimate.Forecast;
import benchtrue.estimate.Uncertainty;
import benchtrue.estimate.Verdict;
import benchtrue.model.DecisionRule;
import benchtrue.sheet.RelationSpec;
import benchtrue.sheet.UnknownSpec;
import java.util.ArrayList;
import java.util.List;
import org.jspecify.annotations.Nullable;

/** What the screen sees of one group of relations. */
final class GroupViews {
    private static final int PATH = 512;

    private final Engine engine;
    private final GroupRun run;
    private final PathHistory path;
    private double pathSegment = Double.NaN;

    GroupViews(Engine engine, GroupRun run) {
        this.engine = engine;
        this.run = run;
        path = new PathHistory(1 + 2 * run.estimates().length, PATH);
    }

    void reading() {
        if (run.segmentStart() != pathSegment) {
            path.clear();
            pathSegment = run.segmentStart();
        }
        if (!path.wants() || !run.estimator().determined()) {
            return;
        }
        Estimates now = run.now();
        path.set(0, engine.time());
        for (int i = 0; i < now.size(); i++) {
            path.set(1 + 2 * i, now.values()[i]);
            path.set(2 + 2 * i, now.of(i).expanded());
        }
        path.keep();
    }

    void addTo(List<Snapshot.RelationView> views) {
        Diagnosis diagnosis = run.estimator().diagnose();
        Estimates now = run.now();
        Outlook outlook = new Outlook(run, now, engine.monitor().interval());
        List<Snapshot.UnknownView> unknowns = new ArrayList<>();
        for (int i = 0; i < now.size(); i++) {
            unknowns.add(unknown(i, now, outlook));
        }
        for (int k = 0; k < run.specs().size(); k++) {
            views.add(relation(k, diagnosis, unknowns));
        }
    }

    private Snapshot.RelationView relation(int k, Diagnosis diagnosis, List<Snapshot.UnknownView> unknowns) {
        RelationSpec spec = run.specs().get(k);
        RelationMonitor tests = run.monitor().relation(k);
        RelationTrack track = run.track(k);
        List<Snapshot.UnknownView> own = new ArrayList<>();
        for (int place : spec.unknownIndex()) {
            own.add(unknowns.get(place));
        }
        return new Snapshot.RelationView(
                spec.relation().text(),
                spec.label(),
                spec.relation().responseUnit().symbol(),
                MemoryWords.of(run.forgetting().memory()),
                run.estimator().residualSd(k),
                run.estimator().degreesOfFreedom(k),
                run.estimator().effectiveReadings(),
                diagnosis.conditionIndex(),
                Names.groups(run.group(), diagnosis.inseparable()),
                own,
                track.strip(),
                track.heldOut(),
                tests.bound(),
                tests.untested().isEmpty(),
                tests.untested(),
                new Snapshot.Arms(tests.liveUp(), tests.liveDown()),
                new Snapshot.Arms(tests.referenceUp(), tests.referenceDown()));
    }

    private Snapshot.UnknownView unknown(int i, Estimates now, Outlook outlook) {
        UnknownSpec spec = run.group().unknowns().get(i);
        Uncertainty u = now.of(i);
        DecisionRule rule = engine.setup().sheet().rule();
        Verdict verdict =
                Verdict.judge(now.values()[i], u.expanded(), u.standard(), u.degreesOfFreedom(), spec.limits(), rule);
        String withheld = withheld();
        ReferenceModel reference = run.monitor().reference();
        double was = reference == null ? Double.NaN : reference.values()[i];
        Forecast forecast = outlook.forecast(i, spec.wanted());
        return new Snapshot.UnknownView(
                spec.name(),
                spec.unit().symbol(),
                now.values()[i],
                u.standard(),
                u.expanded(),
                u.coverageFactor(),
                u.degreesOfFreedom(),
                engine.settling(run.index()).of(i).word(),
                spec.wanted(),
                forecast.seconds(),
                forecast.neverWhy(),
                spec.limits(),
                rule == null ? "" : rule.word(),
                withheld == null ? verdict.word() : null,
                verdict.word() == null ? null : withheld,
                was,
                reference == null ? Double.NaN : difference(i, now, reference),
                path.copy(0),
                path.copy(1 + 2 * i),
                path.copy(2 + 2 * i));
    }

    /** In units of the standard uncertainty of the difference; what is systematic is common to both. */
    private static double difference(int i, Estimates now, ReferenceModel reference) {
        int at = i * now.size() + i;
        return (now.values()[i] - reference.values()[i])
                / Math.sqrt(now.covariance()[at] + reference.covariance()[at]);
    }

    /** Why no verdict is given now, or null. */
    private @Nullable String withheld() {
        for (RelationSpec spec : run.specs()) {
            Alarm alarm = engine.monitor().book().standingDrift(spec.label());
            if (alarm != null) {
                return Withheld.because(alarm);
            }
        }
        return null;
    }
}
