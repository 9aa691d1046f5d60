package benchtrue.run;

import benchtrue.alarm.Alarm;
import benchtrue.estimate.Agreement;
import benchtrue.estimate.ArithmeticCheck;
import benchtrue.estimate.Component;
import benchtrue.estimate.Constancy;
import benchtrue.estimate.Diagnosis;
import benchtrue.estimate.Estimator;
import benchtrue.estimate.Fit;
import benchtrue.estimate.NeweyWest;
import benchtrue.estimate.Uncertainty;
import benchtrue.estimate.Verdict;
import benchtrue.model.DecisionRule;
import benchtrue.model.Interval;
import benchtrue.sheet.Group;
import benchtrue.sheet.RelationSpec;
import benchtrue.sheet.Result;
import benchtrue.sheet.UnknownSpec;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.jspecify.annotations.Nullable;

/** The closing of one group: unknowns with their budgets and verdicts, the batch fit beside them, tests, segments. */
final class GroupClosing {
    private final Engine engine;
    private final GroupRun run;
    private final Group group;
    private final BatchSink batch;
    private final ResidualSink residuals;
    private final double @Nullable [] corrected;

    /** @param corrected covariance of the whole segment for autocorrelated noise; null where there is none */
    GroupClosing(Engine engine, BatchSink batch, ResidualSink residuals, double @Nullable [] corrected) {
        this.engine = engine;
        this.batch = batch;
        this.residuals = residuals;
        this.corrected = corrected;
        run = batch.group();
        group = run.group();
    }

    private boolean forgets() {
        return run.forgetting().forgets();
    }

    /** What the top of the summary states: of the last segment at λ = 1, of the live memory otherwise. */
    private Estimates stated() {
        Estimates now = run.now();
        if (forgets() || !residuals.whole().determined()) {
            return now;
        }
        return new Estimates(
                now.values(),
                covariance(),
                now.degreesOfFreedom() / independent(),
                residuals.systematic(),
                now.channels(),
                now.other());
    }

    /** Of the whole segment at λ = 1, p×p. */
    private double[] covariance() {
        return corrected == null ? scaled(residuals.whole()) : corrected;
    }

    /** How many readings of the whole segment count as one. */
    private double independent() {
        return corrected == null
                ? 1
                : NeweyWest.factor(
                        corrected, scaled(residuals.whole()), group.unknowns().size());
    }

    /** s²P. */
    private static double[] scaled(Fit fit) {
        double variance = fit.determined() ? fit.residualSd() * fit.residualSd() : Double.NaN;
        return Arrays.stream(fit.covariance()).map(c -> variance * c).toArray();
    }

    void addTo(List<Closing.Relation> relations) {
        Estimates stated = stated();
        Diagnosis diagnosis = engine.settling(run.index()).diagnosis();
        for (int k = 0; k < run.specs().size(); k++) {
            relations.add(relation(k, stated, diagnosis));
        }
    }

    private Closing.Relation relation(int k, Estimates stated, Diagnosis diagnosis) {
        RelationSpec spec = run.specs().get(k);
        Estimator estimator = run.estimator();
        int[] places = spec.unknownIndex();
        return new Closing.Relation(
                spec.relation().text(),
                spec.relation().responseText(),
                spec.relation().responseUnit().symbol(),
                run.forgetting(),
                MemoryWords.of(run.forgetting().memory()),
                estimator.floorRows(),
                unknowns(places, stated, true),
                estimator.residualSd(k),
                spec.relation().constantWeight(),
                estimator.degreesOfFreedom(k),
                diagnosis.conditionIndex(),
                Names.groups(group, diagnosis.inseparable()),
                residuals.autocorrelation(k),
                residuals.durbinWatson(k),
                estimator.effectiveReadings() / (forgets() ? 1 : independent()),
                batch(places),
                constancy(),
                sentences(k),
                segments(places));
    }

    /** What concerns all relations of the group is said with the first. */
    private List<String> sentences(int k) {
        List<String> sentences = residuals.sentences(k);
        if (k == 0 && residuals.whole().determined()) {
            Estimates all = new Estimates(
                    residuals.whole().estimates(),
                    covariance(),
                    residuals.whole().degreesOfFreedom() / independent(),
                    residuals.systematic(),
                    run.now().channels(),
                    run.now().other());
            double[] expanded = new double[all.size()];
            for (int i = 0; i < expanded.length; i++) {
                expanded[i] = all.of(i).expanded();
            }
            sentences.addAll(residuals.model().sentences(expanded));
        }
        return sentences;
    }

    private List<Closing.Unknown> unknowns(int[] places, Estimates of, boolean last) {
        return Arrays.stream(places).mapToObj(i -> unknown(i, of, last)).toList();
    }

    private Closing.Unknown unknown(int i, Estimates of, boolean last) {
        UnknownSpec spec = group.unknowns().get(i);
        boolean determined = !Double.isNaN(of.values()[i])
                && (!last || engine.settling(run.index()).of(i) != Standing.NOT_DETERMINED)
                && !(last && residuals.model().onlyNoise(i));
        Uncertainty u = of.of(i);
        Judged judged = last && determined ? judge(of.values()[i], u, spec.limits()) : Judged.NONE;
        return new Closing.Unknown(
                spec.name(),
                spec.unit().symbol(),
                determined ? of.values()[i] : Double.NaN,
                determined ? u.standard() : Double.NaN,
                determined ? u.expanded() : Double.NaN,
                determined ? u.coverageFactor() : Double.NaN,
                determined ? u.degreesOfFreedom() : Double.NaN,
                determined,
                last && engine.settling(run.index()).of(i) == Standing.SETTLED,
                spec.wanted(),
                spec.limits(),
                rule(),
                judged.verdict,
                judged.withheld,
                judged.probability,
                determined && last ? budget(of.components(i)) : List.of());
    }

    private String rule() {
        DecisionRule rule = engine.setup().sheet().rule();
        return rule == null ? "" : rule.word();
    }

    /** A verdict, or why it is withheld. */
    private record Judged(
            @Nullable String verdict, @Nullable String withheld, double probability) {
        static final Judged NONE = new Judged(null, null, Double.NaN);
    }

    private Judged judge(double value, Uncertainty u, @Nullable Interval limits) {
        DecisionRule rule = engine.setup().sheet().rule();
        if (limits == null || rule == null) {
            return Judged.NONE;
        }
        Verdict verdict = Verdict.judge(value, u.expanded(), u.standard(), u.degreesOfFreedom(), limits, rule);
        Alarm drift = drift();
        return drift == null
                ? new Judged(verdict.word(), null, verdict.conformityProbability())
                : new Judged(null, Withheld.because(drift), verdict.conformityProbability());
    }

    private @Nullable Alarm drift() {
        for (RelationSpec spec : run.specs()) {
            Alarm alarm = engine.monitor().book().standingDrift(spec.label());
            if (alarm != null) {
                return alarm;
            }
        }
        return null;
    }

    private static List<Closing.Contribution> budget(List<Component> components) {
        return components.stream()
                .map(c -> new Closing.Contribution(c.name(), c.standardUncertainty(), c.degreesOfFreedom()))
                .toList();
    }

    private Closing.@Nullable Batch batch(int[] places) {
        Fit fit = batch.live();
        if (!fit.determined() || !run.estimator().determined()) {
            return null;
        }
        int p = fit.estimates().length;
        double[] covariance = run.now().covariance();
        double[] u = new double[p];
        for (int i = 0; i < p; i++) {
            u[i] = Math.sqrt(covariance[i * p + i]);
        }
        Agreement agreement = ArithmeticCheck.judge(
                run.estimates(), u, fit, run.estimator().floorRows() > 0 || batch.isDirectional());
        double[] batchCovariance = forgets() ? covariance : scaled(fit);
        List<Closing.Fitted> fitted = new ArrayList<>();
        for (int i : places) {
            fitted.add(new Closing.Fitted(
                    group.unknowns().get(i).name(),
                    fit.estimates()[i],
                    Math.sqrt(batchCovariance[i * p + i]),
                    agreement.differenceInU()[i]));
        }
        return new Closing.Batch(fitted, agreement.largestDifferenceInU(), agreement.agrees(), agreement.judgement());
    }

    private Closing.@Nullable Constancy constancy() {
        Fit whole = residuals.whole();
        if (!forgets() || !whole.determined() || !run.estimator().determined()) {
            return null;
        }
        Constancy constancy =
                Constancy.judge(run.estimates(), run.now().covariance(), whole.estimates(), scaled(whole));
        return constancy == null
                ? null
                : new Closing.Constancy(constancy.statistic(), constancy.degreesOfFreedom(), constancy.pValue());
    }

    private List<Closing.Segment> segments(int[] places) {
        List<Closing.Segment> segments = new ArrayList<>();
        for (BatchSink.Segment segment : residuals.segments()) {
            Fit fit = segment.fit();
            // What is systematic is common to all segments: they are compared by what the readings say.
            Estimates of = new Estimates(
                    fit.estimates(),
                    scaled(fit),
                    fit.degreesOfFreedom(),
                    new double[0][],
                    List.of(),
                    new double[fit.estimates().length]);
            segments.add(
                    new Closing.Segment(segment.from(), segment.to(), segment.reason(), unknowns(places, of, false)));
        }
        return segments;
    }

    Closing.Result result(Result result) {
        Estimates stated = stated();
        double value = result.constant() + stated.value(result.coefficients());
        Uncertainty u = stated.of(result.coefficients());
        Judged judged = Double.isNaN(value) ? Judged.NONE : judge(value, u, result.limits());
        return new Closing.Result(
                result.name(),
                result.unit().symbol(),
                value,
                u.standard(),
                u.expanded(),
                u.coverageFactor(),
                u.degreesOfFreedom(),
                result.limits(),
                rule(),
                judged.verdict,
                judged.withheld,
                judged.probability);
    }

    List<String> careful() {
        List<String> careful = new ArrayList<>();
        String name = run.specs().get(0).label();
        if (run.estimator().floorRows() > 0) {
            careful.add(name + ": the readings stopped carrying information in some direction while the memory went on"
                    + " forgetting; " + run.estimator().floorRows()
                    + " rows of the information floor held the estimates.");
        }
        Diagnosis diagnosis = engine.settling(run.index()).diagnosis();
        for (List<String> names : Names.groups(group, diagnosis.inseparable())) {
            careful.add(name + ": " + String.join(" and ", names) + " cannot be told apart by these readings.");
        }
        if (run.monitor().reference() == null) {
            careful.add(name + ": no reference model was adopted"
                    + because(engine.adoption(run.index()).waitingFor()) + ", so slow drift could not be judged.");
        }
        return careful;
    }

    private static String because(String why) {
        return why.isEmpty() ? "" : " (" + why + ")";
    }
}
