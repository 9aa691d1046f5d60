package benchtrue.run;

import benchtrue.estimate.BlockQr;
import benchtrue.estimate.Fit;
import benchtrue.estimate.NeweyWest;
import benchtrue.estimate.ResidualTests;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * The residuals of the last segment about its own fit at λ = 1, tested; and what the declared other uncertainty of each
 * channel does to that fit.
 */
final class ResidualSink implements SecondPass.Sink {
    private final int group;
    private final Fit whole;
    private final List<BatchSink.Segment> segments;
    private final double[] weights;
    private final Systematic systematic;
    private final ResidualTests[] tests;
    private final BlockQr[] shifts;
    private final ModelTests model;
    private int segment;

    ResidualSink(BatchSink batch, Systematic systematic, Systematic noise) {
        GroupRun run = batch.group();
        group = run.index();
        segments = batch.segments();
        whole = segments.isEmpty()
                ? new BlockQr(run.estimates().length).fit()
                : segments.get(segments.size() - 1).fit();
        weights = batch.weights();
        this.systematic = systematic;
        tests = new ResidualTests[weights.length];
        for (int k = 0; k < tests.length; k++) {
            tests[k] = new ResidualTests();
        }
        model = new ModelTests(run.group(), whole, noise);
        shifts = new BlockQr[systematic.size()];
        for (int c = 0; c < shifts.length; c++) {
            shifts[c] = new BlockQr(whole.estimates().length);
        }
    }

    @Override
    public void segment(Turn turn) {
        segment++;
    }

    /** Whether rows are of the last segment; the first one begins without a turn, unless it has no reading. */
    private boolean last() {
        return segment >= segments.size() - 1;
    }

    @Override
    public void next(double now, double elapsed) {
        if (last()) {
            model.next(now);
        }
    }

    @Override
    public void row(int relation, Row row) {
        if (!last() || !whole.determined()) {
            return;
        }
        double[] theta = whole.estimates();
        tests[relation].add(row.residual(theta) * Math.sqrt(row.weight));
        model.row(group, relation, row, weights[relation]);
        for (int c = 0; c < shifts.length; c++) {
            double shift = systematic.shift(c, group, relation, row, theta);
            if (!Double.isNaN(shift)) {
                shifts[c].add(row.phi, shift, row.weight * weights[relation]);
            }
        }
    }

    Fit whole() {
        return whole;
    }

    List<BatchSink.Segment> segments() {
        return segments;
    }

    /** c×p: what one standard uncertainty of each such channel does to the estimates. */
    double[][] systematic() {
        double[][] effects = new double[shifts.length][];
        for (int c = 0; c < shifts.length; c++) {
            Fit fit = shifts[c].fit();
            effects[c] = fit.determined() ? fit.estimates() : new double[fit.estimates().length];
        }
        return effects;
    }

    boolean autocorrelated() {
        return Arrays.stream(tests).anyMatch(ResidualTests::autocorrelated);
    }

    /** For a third pass: the covariance that is true though neighbours are alike. */
    Correction correction() {
        int length = Arrays.stream(tests)
                .mapToInt(ResidualTests::correlationLength)
                .max()
                .orElse(1);
        return new Correction(2 * length);
    }

    double durbinWatson(int relation) {
        return tests[relation].durbinWatson();
    }

    double autocorrelation(int relation) {
        return tests[relation].autocorrelation(1);
    }

    List<String> sentences(int relation) {
        List<String> sentences = new ArrayList<>(tests[relation].sentences());
        if (whole.determined()) {
            sentences.addAll(model.sentences(relation, tests[relation].autocorrelation(1)));
        }
        return sentences;
    }

    ModelTests model() {
        return model;
    }

    /** Sums the scores of the last segment for the covariance after Newey and West. */
    final class Correction implements SecondPass.Sink {
        private final NeweyWest sum;
        private int turns;

        Correction(int lag) {
            sum = new NeweyWest(whole.estimates().length, lag);
        }

        @Override
        public void segment(Turn turn) {
            turns++;
        }

        @Override
        public void row(int relation, Row row) {
            if (turns >= segments.size() - 1 && whole.determined()) {
                sum.add(row.phi, row.residual(whole.estimates()), row.weight * weights[relation]);
            }
        }

        double[] covariance() {
            return sum.covariance(whole.covariance());
        }
    }
}
