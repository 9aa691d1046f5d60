package benchtrue.estimate;

import benchtrue.model.Forgetting;
import benchtrue.model.Memory;
import java.util.Arrays;

/**
 * Recursive least squares with forgetting for relations that share their unknowns θ (p of them): y = φᵀθ + noise of variance
 * s²/w, s² one for each relation. Square-root-free information form, exact from the first reading on; see docs/method.md.
 *
 * <p>For each reading: {@link #next}, then for each row {@link #predict} and, if the row is to be used, {@link #use}. None of
 * these allocates. Where there are several relations each has an information matrix of its own, and these are joined with the
 * weights 1/s² of the present, so that the estimate is the weighted batch solution with those weights at every reading.
 */
public final class Estimator {
    /**
     * An innovation below this share of the response's size is rounding: data that fit exactly must not raise alarms. 2⁻⁴⁰ is
     * far below the noise of any instrument and well above the rounding of well-conditioned sums.
     */
    private static final double ROUNDING = 0x1p-40;

    private final int p;
    private final Information information;
    private final InformationFloor floor;
    private final CovarianceInForce covariance;
    private final RelationNoise noise;
    private final ScoreMemory score;
    private final double[] theta;
    private final double[] phi;
    private final double[] v;
    private final double[] gain;
    private final double[] work;
    private final double[] scratch;

    private Forgetting forgetting;
    private boolean determined;
    private double pendingAge;
    private double elapsed;
    private double sinceDetermined;
    private double usedWeights;
    private double usedSquares;
    private long rows;
    private int relation;
    private double response;
    private double weight;
    private double innovation = Double.NaN;
    private double leverage = Double.NaN;
    private double quadratic = Double.NaN;
    private double magnitude;

    /**
     * @param constantTerm for each unknown whether it multiplies nothing that varies
     * @param relations how many there are, at least 1
     * @param forgetting directional forgetting takes one relation only
     */
    public Estimator(boolean[] constantTerm, int relations, Forgetting forgetting) {
        p = constantTerm.length;
        if (p == 0 || relations < 1) {
            throw new IllegalArgumentException(p + " unknowns in " + relations + " relations: at least 1 of each");
        }
        this.forgetting = forgetting;
        information = new Information(p, relations);
        information.forgets(forgetting.forgets());
        floor = new InformationFloor(p);
        covariance = new CovarianceInForce(p, information);
        noise = new RelationNoise(relations);
        score = new ScoreMemory(p);
        theta = new double[p];
        phi = new double[p];
        v = new double[p];
        gain = new double[p];
        work = new double[p + 1];
        scratch = new double[p * p];
        restart();
    }

    /** Forgets all readings, as at the beginning of a segment. */
    public void restart() {
        information.clear();
        floor.clear();
        score.clear();
        noise.clear();
        covariance.clear();
        Arrays.fill(theta, Double.NaN);
        determined = false;
        pendingAge = 1;
        usedWeights = 0;
        usedSquares = 0;
        rows = 0;
        innovation = Double.NaN;
    }

    /** Another memory from now on; what is known stays. */
    public void forget(Forgetting newForgetting) {
        forgetting = newForgetting;
        information.forgets(newForgetting.forgets());
    }

    /**
     * A reading comes, whether its rows will be used or not.
     *
     * @param seconds since the one before, not negative
     */
    public void next(double seconds) {
        elapsed = seconds;
        pendingAge = forgetting.memory().factor(seconds, true);
        if (forgetting.memory() instanceof Memory.Seconds && pendingAge < 1 && !directional()) {
            age(pendingAge, seconds);
            pendingAge = 1;
        }
    }

    private boolean directional() {
        return forgetting.kind() == Forgetting.Kind.DIRECTIONAL;
    }

    /** Whether the information changed by more than the factor. */
    private boolean age(double factor, double seconds) {
        information.age(factor);
        ageCounts(factor);
        boolean gap = forgetting.memory() instanceof Memory.Seconds time && seconds > time.seconds();
        return determined && holdFloor(1 - factor, gap);
    }

    private void ageCounts(double factor) {
        noise.age(factor);
        usedWeights *= factor;
        usedSquares *= factor * factor;
    }

    private boolean holdFloor(double lost, boolean all) {
        boolean settled = sinceDetermined >= 1;
        if (floor.refresh(information.joint(), settled)) {
            covariance.rewhiten();
        }
        boolean held = floor.hold(information.joint(), information.floor(), theta, lost, all);
        if (held) {
            covariance.follow(floor.isSet() ? floor.base() : information.joint());
            information.join();
        }
        return held;
    }

    /**
     * Predicts a row; changes nothing that is known.
     *
     * @param regressors one for each unknown, 0 where the relation does not have it; copied
     * @param y response
     * @param w weight of the row, above 0
     */
    public void predict(int k, double[] regressors, double y, double w) {
        System.arraycopy(regressors, 0, phi, 0, p);
        relation = k;
        response = y;
        weight = w;
        InformationFactor joint = information.joint();
        double e = joint.eliminate(phi, y, v);
        if (!determined) {
            innovation = Double.NaN;
            leverage = Double.POSITIVE_INFINITY;
            quadratic = Double.NaN;
            return;
        }
        innovation = e;
        leverage = w * information.weight(k) * joint.leverage(v);
        magnitude = Math.abs(y);
        for (int i = 0; i < p; i++) {
            magnitude += Math.abs(phi[i] * theta[i]);
        }
        System.arraycopy(v, 0, gain, 0, p);
        joint.divideInPlace(gain);
        joint.solveInPlace(gain);
        quadratic = covariance.quadratic(phi, v, gain, work);
    }

    /** Takes the row last predicted into the estimate. */
    public void use() {
        if (pendingAge < 1) {
            ageForRow();
        }
        if (determined) {
            learnNoise();
        }
        covariance.use(phi, gain, weight * information.weight(relation));
        double squared = information.add(relation, phi, response, weight);
        if (!determined && squared >= 0) {
            // Readings that repeat an operating point tell the noise before they tell θ.
            noise.add(relation, squared);
        }
        usedWeights += 1;
        usedSquares += 1;
        rows++;
        noise.weigh(information);
        covariance.settle();
        if (directional() && Long.bitCount(rows) == 1) {
            covariance.rewhiten();
        }
        refresh();
    }

    private void ageForRow() {
        double factor = pendingAge;
        pendingAge = 1;
        if (!directional()) {
            if (!age(factor, elapsed)) {
                // R̄ is the same and D smaller: so is D⁻¹ larger.
                for (int i = 0; i < p; i++) {
                    gain[i] /= factor;
                }
                return;
            }
        } else if (determined) {
            ageCounts(factor);
            // A direction of which less is known than one reading tells has nothing to forget.
            if (leverage <= 1) {
                covariance.follow(floor.isSet() ? floor.base() : information.joint());
                information.ageAlong(phi, factor);
            }
        }
        InformationFactor joint = information.joint();
        joint.eliminate(phi, response, v);
        System.arraycopy(v, 0, gain, 0, p);
        joint.divideInPlace(gain);
        joint.solveInPlace(gain);
    }

    private void learnNoise() {
        double squared = innovation * innovation / (1 / weight + quadratic * information.weight(relation));
        noise.add(relation, squared);
        score.follow(information.joint(), rows);
        double effective = weight * information.weight(relation);
        score.add(gain, effective * innovation / (1 + leverage) * Math.sqrt(usedWeights), forgettingFactor());
    }

    private double forgettingFactor() {
        return forgetting.memory().factor(elapsed, true);
    }

    private void refresh() {
        InformationFactor joint = information.joint();
        if (!determined) {
            if (rows < p || !joint.isDetermined()) {
                return;
            }
            determined = true;
            sinceDetermined = 0;
            score.determined(joint);
        }
        sinceDetermined += memoryShare();
        joint.solve(theta);
    }

    /** The part of one effective memory that a reading takes. */
    private double memoryShare() {
        if (forgetting.memory() instanceof Memory.Readings readings) {
            return 1 / readings.count();
        }
        return forgetting.memory() instanceof Memory.Seconds time ? elapsed / time.seconds() : 0;
    }

    /** Of the row last predicted, in the response's unit; NaN while not determined. */
    public double innovation() {
        return innovation;
    }

    /** w·φᵀPφ of the row last predicted; infinite while not determined. */
    public double leverage() {
        return leverage;
    }

    /** Standard deviation of the innovation, in the response's unit; NaN while the noise is not known. */
    public double predictionSd() {
        double noiseVariance = noise.variance(relation) * (1 / weight + quadratic * information.weight(relation));
        return Math.sqrt(noiseVariance + ROUNDING * magnitude * ROUNDING * magnitude);
    }

    /** Innovation of the row last predicted in units of its standard deviation; NaN while that is not known. */
    public double standardized() {
        return innovation / predictionSd();
    }

    /** Whether all unknowns have a value: the scaled condition is below 1e12. */
    public boolean determined() {
        return determined;
    }

    /** p values; NaN while not determined. */
    public void estimates(double[] into) {
        System.arraycopy(theta, 0, into, 0, p);
    }

    /** C in units of s² of the first relation, p×p; NaN while not determined. */
    private void unscaled(double[] into) {
        if (determined) {
            covariance.covariance(into);
        } else {
            Arrays.fill(into, Double.NaN);
        }
    }

    /** Standard uncertainties from the readings alone (type A), widened for autocorrelation; NaN while not known. */
    public void uncertainties(double[] into) {
        unscaled(scratch);
        double s = residualSd(0);
        for (int i = 0; i < p; i++) {
            into[i] = s * Math.sqrt(Math.max(0, scratch[i * p + i])) * score.widening(i);
        }
    }

    /** Covariance of the estimates from the readings alone, p×p in products of their units, widened as the uncertainties are. */
    public void covariance(double[] into) {
        unscaled(into);
        double variance = noise.variance(0);
        for (int i = 0; i < p; i++) {
            for (int j = 0; j < p; j++) {
                into[i * p + j] *= variance * score.widening(i) * score.widening(j);
            }
        }
    }

    /** P = A⁻¹, p×p: what one more reading of weight 1 would be weighed against. */
    public void unscaledCovariance(double[] into) {
        if (determined) {
            information.inverse(into);
        } else {
            Arrays.fill(into, Double.NaN);
        }
    }

    /** s of a reading of weight 1, in the response's unit; NaN while not known. */
    public double residualSd(int k) {
        return Math.sqrt(noise.variance(k));
    }

    public double degreesOfFreedom(int k) {
        return noise.degreesOfFreedom(k);
    }

    /** Of the uncertainties: all relations together. */
    public double degreesOfFreedom() {
        return noise.degreesOfFreedom();
    }

    /** Lag-1 autocorrelation of an unknown's score; NaN while not known. */
    public double autocorrelation(int unknown) {
        return score.autocorrelation(unknown);
    }

    /** (Σf)²/Σf² over the rows used. */
    public double effectiveReadings() {
        return usedSquares > 0 ? usedWeights * usedWeights / usedSquares : 0;
    }

    /** What the weights of a relation's rows are multiplied by; 1 for the first. */
    public double relationWeight(int k) {
        return information.weight(k);
    }

    /** Rows used in this segment. */
    public long rows() {
        return rows;
    }

    /** Rows that the information floor added in this segment. */
    public long floorRows() {
        return floor.rows();
    }

    /** What can be told apart, and how well; costs microseconds. */
    public Diagnosis diagnose() {
        return Conditioning.of(information.joint());
    }
}
