package benchtrue.run;

import benchtrue.estimate.BlockQr;
import benchtrue.estimate.DirectionalSum;
import benchtrue.estimate.Fit;
import benchtrue.model.Forgetting;
import benchtrue.model.Memory;
import java.util.ArrayList;
import java.util.List;

/** The batch fits of one group: for each segment all its rows alike, and for the last one with the live memory too. */
final class BatchSink implements SecondPass.Sink {
    /** One segment with the fit over all its rows. */
    record Segment(double from, double to, String reason, Fit fit) {}

    private final GroupRun group;
    private final int unknowns;
    private final double[] weights;
    private final List<Segment> segments = new ArrayList<>();
    private Forgetting forgetting;
    private BlockQr all;
    private BlockQr live;
    private DirectionalSum directional;
    private double from = Double.NaN;
    private double time = Double.NaN;
    private String reason = "start of the run";
    private final boolean forgets;
    private double elapsed;
    private boolean counted;

    BatchSink(GroupRun group) {
        this.group = group;
        unknowns = group.estimates().length;
        weights = new double[group.specs().size()];
        for (int k = 0; k < weights.length; k++) {
            weights[k] = group.estimator().relationWeight(k);
        }
        forgetting = group.group().forgetting();
        forgets = forgetting.forgets()
                || group.ledger().turns().stream()
                        .anyMatch(t -> t.forgetting() != null && t.forgetting().forgets());
        all = new BlockQr(unknowns);
        live = new BlockQr(unknowns);
        directional = new DirectionalSum(unknowns);
    }

    @Override
    public void segment(Turn turn) {
        finish();
        from = turn.time();
        reason = turn.segment() == null ? "" : turn.segment();
        all = new BlockQr(unknowns);
        live = new BlockQr(unknowns);
        directional = new DirectionalSum(unknowns);
    }

    private void finish() {
        if (!Double.isNaN(from)) {
            segments.add(new Segment(from, time, reason, all.fit()));
        }
    }

    @Override
    public void forget(Forgetting newForgetting) {
        forgetting = newForgetting;
    }

    @Override
    public void next(double now, double seconds) {
        elapsed = seconds;
        from = Double.isNaN(from) ? now : from;
        time = now;
        counted = false;
        if (forgetting.memory() instanceof Memory.Seconds memory && elapsed > 0) {
            live.age(memory.factor(elapsed, true));
        }
    }

    @Override
    public void row(int relation, Row row) {
        double factor = counted ? 1 : forgetting.memory().factor(elapsed, true);
        if (forgetting.memory() instanceof Memory.Readings) {
            live.age(factor);
        }
        counted = true;
        double weight = row.weight * weights[relation];
        all.add(row.phi, row.response, weight);
        if (isDirectional()) {
            directional.add(row.phi, row.response, weight, factor);
        } else if (forgets) {
            live.add(row.phi, row.response, weight);
        }
    }

    /** All segments, the last one up to the end of the run; to be called once, after the pass. */
    List<Segment> segments() {
        finish();
        return List.copyOf(segments);
    }

    /** The fit of the last segment with the weights of the live memory. */
    Fit live() {
        if (!forgets) {
            return all.fit();
        }
        return isDirectional() ? directional.fit() : live.fit();
    }

    boolean isDirectional() {
        return forgetting.kind() == Forgetting.Kind.DIRECTIONAL;
    }

    /** What the weights of each relation's rows are multiplied by; read. */
    double[] weights() {
        return weights;
    }

    GroupRun group() {
        return group;
    }
}
