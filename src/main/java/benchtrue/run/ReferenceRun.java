package benchtrue.run;

import benchtrue.alarm.Alarm;
import benchtrue.alarm.ReferenceModel;
import benchtrue.sheet.BenchSheet;
import benchtrue.sheet.Group;
import benchtrue.sheet.RelationSpec;
import benchtrue.sheet.UnknownSpec;
import java.util.ArrayList;
import java.util.List;
import org.jspecify.annotations.Nullable;

/**
 * The reference model from an earlier run: the run is replayed with its own sheet, and what its live model says at the end is
 * taken over for each group of the present sheet that has the same unknowns and relations.
 */
public final class ReferenceRun {
    private final Engine engine;
    private final String name;

    private ReferenceRun(Engine engine, String name) {
        this.engine = engine;
        this.name = name;
    }

    /** Replays the earlier run; nothing is written. */
    public static ReferenceRun of(Setup earlier, SourceMaker maker, List<TimedAct> acts) {
        RunListener deaf = new RunListener() {
            @Override
            public boolean wants(long reading) {
                return false;
            }

            @Override
            public void reading(EstimateRow row) {}

            @Override
            public void event(Event event) {}

            @Override
            public void closed(Closing closing) {}
        };
        try (Session session = new Session(earlier, maker, acts, deaf)) {
            while (!session.ended()) {
                session.fetch();
                if (session.due()) {
                    session.take();
                }
            }
            return new ReferenceRun(session.engine(), earlier.sourceName());
        }
    }

    /** Why it cannot serve as a reference for the sheet; empty where it can. */
    public String refusal(BenchSheet sheet) {
        for (Alarm alarm : engine.monitor().book().alarms()) {
            if (alarm.kind().isDrift()) {
                return "that run has a " + alarm.kind().word() + " alarm: a reference must be of a sound rig";
            }
        }
        return models(sheet).stream().allMatch(m -> m == null)
                ? "none of its relations has the same unknowns with determined values as one of this sheet"
                : "";
    }

    /** One for each group of the sheet; null where the run has none for it. */
    public List<@Nullable ReferenceModel> models(BenchSheet sheet) {
        List<@Nullable ReferenceModel> models = new ArrayList<>();
        for (Group group : sheet.groups()) {
            models.add(model(group));
        }
        return models;
    }

    private @Nullable ReferenceModel model(Group wanted) {
        for (GroupRun run : engine.groups()) {
            Group group = run.group();
            boolean same = names(group).equals(names(wanted))
                    && labels(group).equals(labels(wanted))
                    && units(group).equals(units(wanted));
            if (same && run.estimator().determined() && run.estimator().residualSd(0) > 0) {
                return engine.adoption(run.index()).model(0, 0, ReferenceModel.How.FROM_RUN, "", "run " + name);
            }
        }
        return null;
    }

    private static List<String> names(Group group) {
        return group.unknowns().stream().map(UnknownSpec::name).toList();
    }

    private static List<?> units(Group group) {
        return group.unknowns().stream().map(UnknownSpec::unit).toList();
    }

    private static List<String> labels(Group group) {
        return group.relations().stream().map(RelationSpec::label).toList();
    }
}
