package benchtrue.alarm;

import java.util.stream.Stream;
import org.jspecify.annotations.Nullable;

/**
 * The likelihood-ratio bank (Willsky and Jones 1976): from the frozen reference, for each unknown and for the offset, whether
 * it moved by a step or a ramp, and whether the noise grew, at each of the onsets of {@link Onsets}.
 *
 * <p>With e the errors against the reference in units of s, Cₐ the reference's covariance, A = Σφφᵀ, b = Σφe since the onset
 * and r the regressor of the change (φᵢ, or τφᵢ with τ the time since onset), e has the covariance V = I + ΦCₐΦᵀ and
 *
 * <pre>g = rᵀV⁻¹e = Σre − cᵀWb   M = rᵀV⁻¹r = Σr² − cᵀWc   c = Σrφ   W = (Cₐ⁻¹ + A)⁻¹   ℓ = g²/M</pre>
 *
 * For a step this is M = (A⁻¹ + Cₐ)⁻¹ and g = MA⁻¹b, but needs no inverse of A, which is deficient while the operating point
 * stands still. The shortcut without W names wrongly in one case of a hundred.
 *
 * <p>Noise, with q the mean square of n readings and ν the degrees of freedom of s: ℓ = (n + ν)·ln((nq + ν)/(n + ν)) −
 * n·ln q.
 */
final class Bank {
    /** Onsets that are looked at each time; those before them change slowly and are looked at each fourth time. */
    private static final int NEAR = 13;

    private static final int ALL = 4;

    private static final int QUIET = 256;
    /** Four times the mean of χ² for each degree of freedom. */
    private static final double CALM = 4;

    /** What is left of a sum after rounding. */
    private static final double NOTHING = 1e-12;

    /** By so much ℓ of a ramp must exceed that of a step: 95 % point of χ² with one degree of freedom. */
    private static final double RAMP = 3.84;

    /** Below it a mean square is no evidence: saves two logarithms. */
    private static final double NOISE_WORTH_IT = 4;

    private final int q;
    private final double[] information;
    private final double nu;
    private final Onsets onsets;
    private final Sums[] list = new Sums[Onsets.most()];
    private final Sums since;
    private final Evidence[] near;
    private final Evidence[] far;
    private final Evidence[] one;
    private final double[] ratios = new double[Onsets.most()];
    private final double[] inverse;
    private final double[] explained;
    private int listed;
    private int untilAll;

    /**
     * @param covariance Cₐ of the regressors' unknowns in units of s², q×q; zero for what is not an unknown of the reference
     * @param nu degrees of freedom of s, above 0, may be infinite
     */
    Bank(double[] covariance, double nu) {
        q = (int) Math.round(Math.sqrt(covariance.length));
        information = Symmetric.information(covariance, q);
        this.nu = nu;
        onsets = new Onsets(q);
        since = new Sums(q);
        near = Stream.generate(Evidence::new).limit(2 * q + 1).toArray(Evidence[]::new);
        one = Stream.generate(Evidence::new).limit(2 * q + 1).toArray(Evidence[]::new);
        far = Stream.generate(Evidence::new).limit(2 * q + 1).toArray(Evidence[]::new);
        inverse = new double[q * q];
        explained = new double[q];
    }

    void add(double[] phi, double error, double z, double time, long number) {
        onsets.add(phi, error, z, time, number);
    }

    void clear() {
        onsets.clear();
        reset();
    }

    void forgetSince(double time) {
        onsets.forgetSince(time);
        reset();
    }

    private void reset() {
        listed = 0;
        untilAll = 0;
        clear(near);
        clear(far);
    }

    /** Keeps the best onset of a cause among those considered, however old it grows. */
    void keep(int cause) {
        onsets.keep(evidence(cause).onset);
    }

    /** Looks at all hypotheses at the onsets of the last hundred readings, and at times at all of them. */
    void evaluate() {
        boolean all = --untilAll <= 0;
        listed = onsets.list(list);
        clear(near);
        for (int k = 0; k < Math.min(listed, NEAR); k++) {
            consider(k, near);
        }
        if (all) {
            untilAll = ALL;
            clear(far);
            for (int k = NEAR; k < listed; k++) {
                consider(k, far);
            }
        }
    }

    private static void clear(Evidence[] evidence) {
        for (Evidence each : evidence) {
            each.clear();
        }
    }

    private void consider(int k, Evidence[] evidence) {
        extend(k);
        prepare();
        for (int i = 0; i < q; i++) {
            offer(evidence[i], false, since.products, i * q, since.products[i * q + i], since.scores[i]);
            offer(evidence[q + 1 + i], true, since.timed, i * q, since.timedTwice[i], since.timedScores[i]);
        }
        noise(evidence[q]);
    }

    /** Takes one more stretch into the sums since the onset; they count time from that onset. */
    private void extend(int k) {
        if (k == 0) {
            since.copy(list[0]);
            return;
        }
        since.reach(list[k]);
    }

    /** Computes the sums since an onset afresh, with W and Wb, for what is asked rarely; null where nothing is left. */
    @Nullable
    Sums sumsSince(double time) {
        listed = onsets.list(list);
        int k = 0;
        while (k < listed && (k == 0 || list[k].start >= time)) {
            extend(k++);
        }
        if (k == 0) {
            return null;
        }
        prepare();
        return since;
    }

    /** Whether the last 256 readings or more, all since the onset, have neither moved nor grown noisier. */
    boolean quiet(double onset, double[] m, double[] g) {
        listed = onsets.list(list);
        for (int k = 0; k < listed && list[k].start > onset; k++) {
            extend(k);
            if (since.count >= QUIET) {
                prepare();
                joint(m, g);
                one[q].clear();
                noise(one[q]);
                return Symmetric.quadratic(m, g) < CALM * q && one[q].ratio < CALM;
            }
        }
        return false;
    }

    /** ℓ of a step of all unknowns at once, each by its own amount, at its best onset: gᵀM⁻¹g. */
    double together(double[] m, double[] g) {
        double most = 0;
        listed = onsets.list(list);
        for (int k = 0; k < listed; k++) {
            extend(k);
            prepare();
            joint(m, g);
            most = Math.max(most, Symmetric.quadratic(m, g));
        }
        return most;
    }

    /**
     * M and g of a step of all regressors at once, for the onset of the last {@link #sumsSince}.
     *
     * @param m q×q, written
     * @param g written
     */
    void joint(double[] m, double[] g) {
        double[] a = since.products;
        for (int i = 0; i < q; i++) {
            g[i] = since.scores[i];
            for (int k = 0; k < q; k++) {
                g[i] -= a[i * q + k] * explained[k];
            }
            for (int j = 0; j < q; j++) {
                double sum = a[i * q + j];
                for (int k = 0; k < q; k++) {
                    for (int l = 0; l < q; l++) {
                        sum -= a[i * q + k] * inverse[k * q + l] * a[l * q + j];
                    }
                }
                m[i * q + j] = sum;
            }
        }
    }

    /**
     * Between which times the onset of a cause lies: how far the evidence stays within a distance of its best, and to the next
     * onset beyond on either side.
     */
    void interval(int cause, double within, Interval into) {
        listed = onsets.list(list);
        double best = 0;
        for (int k = 0; k < listed; k++) {
            ratios[k] = alone(cause, k);
            best = Math.max(best, ratios[k]);
        }
        int newest = 0;
        while (newest < listed && ratios[newest] < best - within) {
            newest++;
        }
        int oldest = listed - 1;
        while (oldest > newest && ratios[oldest] < best - within) {
            oldest--;
        }
        into.from = listed == 0 ? Double.NaN : list[Math.min(listed - 1, oldest + 1)].start;
        into.to = listed == 0 ? Double.NaN : list[Math.max(0, newest - 1)].start;
    }

    private double alone(int cause, int onset) {
        clear(one);
        consider(onset, one);
        return cause == q ? one[q].ratio : Math.max(one[cause].ratio, one[q + 1 + cause].ratio);
    }

    /**
     * By how much 2·ln of the likelihood of the readings since some time, whichever speaks most clearly, is larger without a
     * change than with it: for a change δ of an unknown −(2δg − δ²M), for noise grown by the factor f
     * n(2 ln f − q(1 − 1/f²)). Of a ramp only the last quarter of its time counts, in which it is much like a step.
     */
    double against(Cause cause, double now) {
        double onset = cause.onset().time();
        double from = cause.ramp() ? now - (now - onset) / 4 : onset;
        double most = 0;
        listed = onsets.list(list);
        for (int k = 0; k < listed && list[k].start > from; k++) {
            extend(k);
            most = Math.max(most, cause.leader() == q ? againstNoise(cause.change()) : againstChange(cause));
        }
        return most;
    }

    private double againstNoise(double factor) {
        double variance = factor * factor;
        return since.count * Math.log(variance) - since.squares * (1 - 1 / variance);
    }

    private double againstChange(Cause cause) {
        int i = cause.leader();
        prepare();
        one[i].clear();
        offer(one[i], false, since.products, i * q, since.products[i * q + i], since.scores[i]);
        return cause.change() * (cause.change() * one[i].information - 2 * one[i].score);
    }

    /** An onset lies between these times; NaN where it is not known. */
    static final class Interval {
        double from;
        double to;
    }

    /** W and Wb. */
    private void prepare() {
        double[] a = since.products;
        for (int at = 0; at < inverse.length; at++) {
            inverse[at] = information[at] + a[at];
        }
        Symmetric.invert(inverse, q);
        for (int i = 0, row = 0; i < q; i++, row += q) {
            double sum = 0;
            for (int j = 0; j < q; j++) {
                sum += inverse[row + j] * since.scores[j];
            }
            explained[i] = sum;
        }
    }

    /** What is left of Σr² and Σre once the reference's own uncertainty is taken off. */
    private void offer(Evidence cause, boolean ramp, double[] crossed, int row, double full, double scored) {
        double m = full;
        double g = scored;
        for (int i = 0, at = 0; i < q; i++) {
            double sum = 0;
            for (int j = 0; j < q; j++, at++) {
                sum += inverse[at] * crossed[row + j];
            }
            m -= crossed[row + i] * sum;
            g -= crossed[row + i] * explained[i];
        }
        if (m > NOTHING * full) {
            cause.offer(g * g / m, ramp, since, g, m);
        }
    }

    private void noise(Evidence evidence) {
        double n = since.count;
        double mean = since.squares / n;
        if (mean > 1 && n * (mean - 1) * (mean - 1) > NOISE_WORTH_IT) {
            double all = Double.isInfinite(nu) ? n * (mean - 1) : (n + nu) * Math.log((n * mean + nu) / (n + nu));
            evidence.offer(all - n * Math.log(mean), false, since, mean, n);
        }
    }

    /** For each regressor at its best onset, and behind them for the noise. A ramp must fit clearly better than a step. */
    Evidence evidence(int i) {
        Evidence step = better(i);
        if (i == q) {
            return step;
        }
        Evidence ramp = better(q + 1 + i);
        return ramp.ratio > step.ratio + RAMP ? ramp : step;
    }

    private Evidence better(int i) {
        return near[i].ratio >= far[i].ratio ? near[i] : far[i];
    }

    /** How many causes there is evidence for: the regressors and the noise. */
    int size() {
        return q + 1;
    }

    int regressors() {
        return q;
    }

    /** When the oldest onset considered began, in s; NaN while there is none. */
    double oldest() {
        return listed == 0 ? Double.NaN : list[listed - 1].start;
    }
}
