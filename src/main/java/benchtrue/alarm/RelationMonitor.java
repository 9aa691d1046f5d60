package benchtrue.alarm;

import benchtrue.sheet.UnknownSpec;
import java.util.Arrays;
import org.jspecify.annotations.Nullable;

/** The tests of one relation: against the live model for sudden faults, against the reference model for drift. */
public final class RelationMonitor {
    /** Degrees of freedom below which a few values that repeat by their resolution make the noise look like none. */
    private static final double KNOWN = 10;
    /** Looks in a row at estimates that are not plausible before it is said: a hum can mislead the first of them. */
    private static final int PATIENCE = 8;
    /** An intermittent connection is over after so many readings without an outlier. */
    private static final int GOOD_AGAIN = 5 * OutlierGate.WINDOW;

    private final Watched watched;
    private final Budget budget;
    private final AlarmBook book;
    private final Channels channels;
    private final ClockWatch clock;
    private final OutlierGate gate;
    private final StudentLimit limit = new StudentLimit();
    private final LiveWatch live;
    private final double[] own;
    private final ResidualShapes shapes;
    private final WarmUp warmUp = new WarmUp();
    private final double[] estimates;
    private @Nullable ReferenceWatch reference;
    private double bound = Double.NaN;
    private double firstOut;
    private long lastOut = Long.MIN_VALUE / 2;
    private boolean objected;
    private int implausible;
    private String untested = "no reading yet";

    RelationMonitor(Watched watched, Budget budget, AlarmBook book, Channels channels, ClockWatch clock) {
        this.watched = watched;
        this.budget = budget;
        this.book = book;
        this.channels = channels;
        this.clock = clock;
        gate = new OutlierGate(watched.holdsOut());
        live = new LiveWatch(watched, budget, book);
        shapes = new ResidualShapes(watched, book, live.autocorrelation());
        estimates = new double[watched.size()];
        Arrays.fill(estimates, Double.NaN);
        own = new double[watched.size()];
    }

    /**
     * Judges a row before it is used.
     *
     * @param phi one regressor for each unknown of the group; read
     * @param t standardised innovation of the live model; NaN while there is none
     * @param nu degrees of freedom of its standard deviation
     * @param leverage φᵀPφ of the row, relative to a reading of its weight; infinite or NaN while not determined
     */
    public Decision judge(
            long number,
            double time,
            double[] phi,
            double response,
            double weight,
            double t,
            double nu,
            double leverage) {
        Decision.HoldOut objection = channels.objection(watched.channels());
        if (objection != null) {
            object(objection.reason());
            return objection;
        }
        objected = false;
        untested = whyNot(nu, leverage);
        bound = untested.isEmpty() ? limit.at(budget.perReading(), nu) : Double.NaN;
        Decision decision = gate.judge(t, bound);
        double now = clock.running();
        if (gate.out() && number - lastOut > OutlierGate.WINDOW) {
            firstOut = now;
        }
        lastOut = gate.out() ? number : lastOut;
        tellIntermittent(number, now);
        if (gate.confirmedStep() && reference == null) {
            live.tellStep(t, number, now);
        }
        if (untested.isEmpty() && decision instanceof Decision.Use) {
            boolean quiet = !gate.intermittent() && !channels.unresolved(watched.channels());
            live.test(t, nu, number, now, reference == null && quiet);
            if (quiet) {
                look(t, phi, response, now);
            }
        }
        testReference(number, now, phi, response, weight, decision);
        return decision;
    }

    /** What the residuals of sound readings follow. */
    private void look(double t, double[] phi, double response, double now) {
        if (warmUp.add(t)) {
            tellWarmUp(now);
        }
        if (book.standingDrift(watched.label()) != null || Double.isNaN(estimates[0])) {
            return;
        }
        double residual = response;
        for (int i = 0; i < own.length; i++) {
            own[i] = phi[watched.places()[i]];
            residual -= own[i] * estimates[i];
        }
        shapes.add(own, residual, estimates, now, clock.interval());
    }

    private void tellWarmUp(double now) {
        book.report(Finding.ofRelation(
                Alarm.Kind.WARM_UP,
                watched.label(),
                new Finding.Onset(0, 0, now, 1),
                Double.NaN,
                watched.unit(),
                Alarm.Priority.NEXT_STOP,
                watched.label()
                        + ": the innovations have leaned to one side since the start, and the lean has halved by "
                        + Words.number(now)
                        + " s: the rig was warming up. Begin a new segment now that it is warm, or give"
                        + " the sheet a warm-up time, so that what came before is not pooled"));
    }

    /** What a doubtful channel said since its trouble began has spoilt the tests against the reference. */
    private void object(String reason) {
        untested = reason;
        bound = Double.NaN;
        if (!objected) {
            gate.clear();
        }
        if (!objected && reference != null) {
            reference.forgetSince(channels.troubleSince(watched.channels()));
        }
        objected = true;
    }

    private String whyNot(double nu, double leverage) {
        if (!(leverage < Double.POSITIVE_INFINITY)) {
            return "an unknown is not determined";
        }
        if (leverage > 1) {
            return "new operating point: the prediction is an extrapolation";
        }
        if (!(nu >= KNOWN)) {
            return "the noise is not known yet";
        }
        return Double.isNaN(budget.perReading()) ? "the interval of readings is not known yet" : "";
    }

    private void tellIntermittent(long number, double now) {
        boolean told = book.stands(Alarm.Kind.INTERMITTENT, watched.label(), null);
        if (gate.intermittent() && !told) {
            Finding.Onset onset = new Finding.Onset(firstOut, firstOut, now, number);
            String text = watched.label() + ": 3 or more outliers in 20 readings with good ones between, since "
                    + Words.number(firstOut)
                    + " s: a loose connection? The estimates are held until 20 readings are good."
                    + " Make the rig safe, then reseat leads";
            book.report(Finding.ofRelation(
                    Alarm.Kind.INTERMITTENT,
                    watched.label(),
                    onset,
                    Double.NaN,
                    watched.unit(),
                    Alarm.Priority.NEXT_STOP,
                    text));
            if (reference != null) {
                reference.forgetSince(firstOut);
            }
        } else if (told && number - lastOut > GOOD_AGAIN) {
            book.normal(Alarm.Kind.INTERMITTENT, watched.label(), null);
        }
    }

    private void testReference(
            long number, double now, double[] phi, double response, double weight, Decision decision) {
        ReferenceWatch watch = reference;
        if (watch == null) {
            return;
        }
        for (int i = 0; i < own.length; i++) {
            own[i] = phi[watched.places()[i]];
        }
        watch.predict(own, response, weight);
        if (!gate.intermittent()) {
            watch.test(number, now, budget.perReading(), decision instanceof Decision.HoldOut, doubt());
        }
    }

    /** What may yet turn out to be no change of the rig, so that no cause is told before it has. */
    private @Nullable String doubt() {
        if (gate.unresolved()) {
            return "outliers that may be a loose connection";
        }
        return channels.unresolved(watched.channels()) ? "a channel repeats its value and may be stuck" : null;
    }

    /** Tells of the first unknown that another unit or sign would make plausible. */
    void compareWithPlausible(double[] all, double[] uncertainties) {
        for (int i = 0; i < own.length; i++) {
            estimates[i] = all[watched.places()[i]];
        }
        boolean unit = false;
        boolean sign = false;
        for (int i = 0; i < own.length && !unit && !sign; i++) {
            UnknownSpec unknown = watched.unknowns().get(i);
            double estimate = estimates[i];
            double u = uncertainties[watched.places()[i]];
            if (unknown.plausible() == null || unknown.constantTerm() || reference != null) {
                continue;
            }
            UnitSuspicion.Suspicion suspicion = UnitSuspicion.of(estimate, u, unknown.plausible());
            sign = suspicion.sign();
            unit = !sign && !suspicion.none();
            if ((sign || unit) && ++implausible >= PATIENCE) {
                tellPlausible(sign ? Alarm.Kind.SIGN : Alarm.Kind.UNIT, i, estimate, suspicion);
            }
        }
        implausible = sign || unit ? implausible : 0;
        settle(Alarm.Kind.UNIT, unit);
        settle(Alarm.Kind.SIGN, sign);
    }

    private void settle(Alarm.Kind kind, boolean found) {
        if (!found && book.stands(kind, watched.label(), null)) {
            book.normal(kind, watched.label(), null);
        }
    }

    private void tellPlausible(Alarm.Kind kind, int i, double estimate, UnitSuspicion.Suspicion suspicion) {
        if (book.stands(kind, watched.label(), null)) {
            return;
        }
        UnknownSpec unknown = watched.unknowns().get(i);
        book.report(new Finding(
                kind,
                watched.label(),
                null,
                unknown.name(),
                new Finding.Onset(Double.NaN, Double.NaN, clock.running(), 0),
                estimate,
                Double.NaN,
                unknown.unit().symbol(),
                null,
                false,
                false,
                Alarm.Priority.NEXT_STOP,
                UnitSuspicion.words(
                        unknown, estimate, suspicion, watched.factors().get(i))));
    }

    /** Takes its part of the group's model as its reference. */
    void adopt(ReferenceModel model, int relation) {
        int p = own.length;
        int all = model.values().length;
        double sd = model.residualSd()[relation];
        double[] values = new double[p];
        double[] covariance = new double[p * p];
        for (int i = 0; i < p; i++) {
            values[i] = model.values()[watched.places()[i]];
            for (int j = 0; j < p; j++) {
                covariance[i * p + j] = model.covariance()[watched.places()[i] * all + watched.places()[j]] / (sd * sd);
            }
        }
        double nu = model.degreesOfFreedom()[relation];
        ReferenceWatch.Frozen frozen = new ReferenceWatch.Frozen(values, covariance, sd, nu);
        book.normal(Alarm.Kind.STEP, watched.label(), null);
        reference = new ReferenceWatch(watched, book, frozen, p / model.effectiveReadings(), thinning(model));
    }

    private int thinning(ReferenceModel model) {
        return Double.isNaN(model.autocorrelation())
                ? Math.max(1, live.autocorrelation().thinning())
                : Autocorrelation.thinning(model.autocorrelation());
    }

    /** Whether enough innovations were seen to know how they are autocorrelated. */
    boolean autocorrelationKnown() {
        return live.autocorrelation().thinning() > 0;
    }

    double varianceFactor() {
        return live.autocorrelation().varianceFactor();
    }

    /** Forgets the last innovations, as at the beginning of a segment. */
    void restart() {
        gate.clear();
        live.clear();
        shapes.clear();
    }

    LiveWatch live() {
        return live;
    }

    /** The bound of |t| at the last reading; NaN where it was not tested. */
    public double bound() {
        return bound;
    }

    /** Why the last reading was not tested, or empty. */
    public String untested() {
        return untested;
    }

    /** Arms of the CUSUM as fractions of their limit: of the live model, or NaN while it is not yet tested. */
    public double liveUp() {
        return live.up();
    }

    public double liveDown() {
        return live.down();
    }

    /** Arms against the reference as fractions of their limit; NaN while there is none. */
    public double referenceUp() {
        return reference == null ? Double.NaN : reference.up();
    }

    public double referenceDown() {
        return reference == null ? Double.NaN : reference.down();
    }

    /** Largest likelihood ratio of a change against the reference as a fraction of its limit; NaN while there is none. */
    public double evidence() {
        return reference == null ? Double.NaN : reference.evidence();
    }

    /** Why the last reading was not tested against the reference, or empty. */
    public String referenceUntested() {
        if (reference == null) {
            return "no reference model is adopted yet";
        }
        if (gate.intermittent()) {
            return "intermittent";
        }
        return reference.testable() ? "" : "new operating point: the reference would be extrapolated";
    }

    /** Rows beyond their bound so far. */
    public long outliers() {
        return gate.outliers();
    }
}
