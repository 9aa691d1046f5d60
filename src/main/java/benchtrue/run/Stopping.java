package benchtrue.run;

import benchtrue.estimate.PointVisits;
import benchtrue.estimate.StopRule;
import benchtrue.sheet.BenchSheet;
import benchtrue.sheet.Channel;
import benchtrue.sheet.Point;
import benchtrue.sheet.RelationSpec;
import benchtrue.sheet.UnknownSpec;
import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.List;
import java.util.StringJoiner;

/** Whether the run has enough, and what is missing. */
final class Stopping {
    /** A channel is at its setting within this share of the range of its planned settings. */
    private static final double NEAR = 0.05;

    private static final double NOISES = 3;

    private final Engine engine;
    private final PointVisits visits;

    Stopping(Engine engine) {
        this.engine = engine;
        BenchSheet sheet = engine.setup().sheet();
        double[] tolerance = new double[sheet.channels().size()];
        for (int i = 0; i < tolerance.length; i++) {
            tolerance[i] = tolerance(sheet, i);
        }
        visits = new PointVisits(sheet.points().stream().map(Point::set).toList(), tolerance);
    }

    private static double tolerance(BenchSheet sheet, int i) {
        Channel channel = sheet.channels().get(i);
        double lowest = Double.POSITIVE_INFINITY;
        double highest = Double.NEGATIVE_INFINITY;
        for (Point point : sheet.points()) {
            if (!Double.isNaN(point.set()[i])) {
                lowest = Math.min(lowest, point.set()[i]);
                highest = Math.max(highest, point.set()[i]);
            }
        }
        double range = highest > lowest ? highest - lowest : Math.abs(highest);
        double own = Double.isNaN(channel.noise()) ? 0 : NOISES * channel.noise();
        double step = Double.isNaN(channel.resolution()) ? 0 : channel.resolution();
        return Math.max(NEAR * range, Math.max(own, step));
    }

    /** To be called after each reading. */
    void reading() {
        visits.at(engine.rows().observation().values);
    }

    /** The planned points and whether the run has been at each. */
    List<Snapshot.PointView> points() {
        BenchSheet sheet = engine.setup().sheet();
        List<Snapshot.PointView> views = new ArrayList<>();
        for (int i = 0; i < sheet.points().size(); i++) {
            StringJoiner text = new StringJoiner(", ");
            double[] set = sheet.points().get(i).set();
            for (int j = 0; j < set.length; j++) {
                if (!Double.isNaN(set[j])) {
                    Channel channel = sheet.channels().get(j);
                    String value =
                            BigDecimal.valueOf(set[j]).stripTrailingZeros().toPlainString();
                    text.add((channel.name() + " = " + value + " "
                                    + channel.unit().symbol())
                            .strip());
                }
            }
            views.add(new Snapshot.PointView(text.toString(), visits.isVisited(i)));
        }
        return List.copyOf(views);
    }

    /** Why the run should go on, a phrase for each reason; empty: it may stop. */
    List<String> whyNotYet() {
        List<StopRule.Sought> sought = new ArrayList<>();
        double effective = Double.POSITIVE_INFINITY;
        boolean adopted = true;
        boolean quiet = true;
        for (GroupRun run : engine.groups()) {
            Estimates now = run.now();
            Outlook outlook = new Outlook(run, now, engine.monitor().interval());
            for (int i = 0; i < now.size(); i++) {
                UnknownSpec spec = run.group().unknowns().get(i);
                boolean determined = engine.settling(run.index()).of(i) != Standing.NOT_DETERMINED;
                sought.add(
                        new StopRule.Sought(spec.name(), determined, now.of(i).expanded(), spec.wanted()));
                effective = Math.min(effective, run.estimator().effectiveReadings() / outlook.widening(i));
            }
            adopted &= run.monitor().reference() != null;
            for (RelationSpec spec : run.specs()) {
                quiet &= engine.monitor().book().standingDrift(spec.label()) == null;
            }
        }
        return StopRule.whyNotYet(new StopRule.Facts(
                sought,
                effective,
                visits.planned(),
                visits.visited(),
                visits.revisited(),
                adopted,
                quiet,
                engine.monitor().book().unacknowledged()));
    }
}
