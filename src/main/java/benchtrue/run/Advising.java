package benchtrue.run;

import benchtrue.estimate.Advice;
import benchtrue.estimate.CandidatePoint;
import benchtrue.sheet.UnknownSpec;
import java.util.ArrayList;
import java.util.List;
import org.jspecify.annotations.Nullable;

/**
 * What to vary next, for the unknown that is furthest from what is wanted of it. Planning costs milliseconds, so a plan is kept
 * until the run has grown by a tenth.
 */
final class Advising {
    private static final long OFTEN = 32;
    private static final double GROWTH = 1.1;
    private static final String FARTHER =
            "this does not reach the wanted U: the memory or the declared other uncertainty holds it up";

    private final Engine engine;
    private final OperatingPoints points;
    private Snapshot.@Nullable AdviceView kept;
    private long planned;
    private boolean determined;

    Advising(Engine engine) {
        this.engine = engine;
        points = new OperatingPoints(engine.setup().sheet());
    }

    /** Null before the first reading and where nothing is left to wish for. */
    Snapshot.@Nullable AdviceView advice() {
        if (engine.reading() == 0) {
            return null;
        }
        String refusal = refusal();
        if (!refusal.isEmpty()) {
            planned = 0;
            return new Snapshot.AdviceView("", refusal, List.of(), Double.NaN, Double.NaN);
        }
        boolean now = engine.groups().stream().allMatch(g -> g.estimator().determined());
        if (planned == 0
                || now != determined
                || engine.reading() >= Math.max((double) planned + OFTEN, GROWTH * planned)) {
            planned = engine.reading();
            determined = now;
            kept = plan();
        }
        return kept;
    }

    private String refusal() {
        if (!points.any()) {
            return "no channel is declared adjustable with limits of operation (adjustable, operate)";
        }
        if (engine.monitor().book().anyUnacknowledged()) {
            return "an alarm is unacknowledged";
        }
        for (int i = 0; i < engine.setup().sheet().channels().size(); i++) {
            String status = engine.monitor().channelStatus(i);
            if (!status.equals("good")) {
                return "channel " + engine.setup().sheet().channels().get(i).name() + " is " + status;
            }
        }
        return "";
    }

    private Snapshot.@Nullable AdviceView plan() {
        for (GroupRun run : engine.groups()) {
            if (!run.estimator().determined()) {
                return towards(run);
            }
        }
        GroupRun worst = null;
        int unknown = 0;
        double most = 1;
        for (GroupRun run : engine.groups()) {
            Estimates now = run.now();
            for (int i = 0; i < now.size(); i++) {
                double wanted = run.group().unknowns().get(i).wanted();
                double ratio = now.of(i).expanded() / wanted;
                if (ratio > most) {
                    most = ratio;
                    worst = run;
                    unknown = i;
                }
            }
        }
        return worst == null ? null : plan(worst, unknown);
    }

    private List<CandidatePoint> candidates(GroupRun run) {
        double[] weights = new double[run.specs().size()];
        for (int k = 0; k < weights.length; k++) {
            weights[k] = run.estimator().relationWeight(k);
        }
        double[] present = engine.rows().observation().values;
        return points.candidates(run.group(), present, weights);
    }

    private Snapshot.AdviceView towards(GroupRun run) {
        double[] direction = run.estimator().diagnose().weakestDirection();
        long readings = Math.max(OFTEN / 2, 2L * direction.length);
        return view("", Advice.towards(direction, candidates(run), readings), List.of());
    }

    private Snapshot.AdviceView plan(GroupRun run, int unknown) {
        UnknownSpec spec = run.group().unknowns().get(unknown);
        Outlook outlook = new Outlook(run, run.now(), engine.monitor().interval());
        Advice advice = Advice.plan(outlook.prospect(unknown), spec.wanted(), candidates(run));
        return view(spec.name(), advice, advice.reaches() ? List.of() : List.of(FARTHER));
    }

    private Snapshot.AdviceView view(String unknown, Advice advice, List<String> more) {
        double interval = engine.monitor().interval();
        if (advice.steps().isEmpty()) {
            return new Snapshot.AdviceView(
                    unknown, "no point inside the limits of operation helps", List.of(), Double.NaN, Double.NaN);
        }
        List<String> words = new ArrayList<>(advice.words(interval));
        words.addAll(more);
        return new Snapshot.AdviceView(
                unknown, "", List.copyOf(words), advice.expectedU(), advice.readings() * interval);
    }
}
