package benchtrue.alarm;

import java.util.stream.Stream;

/**
 * The likelihood-ratio bank (Willsky and Jones 1976): from the frozen reference, for each unknown and for the offset, whether
 * it moved by a step or a ramp, and whether the noise grew, at each of the onsets of {@link Onsets}.
 *
 * <p>With e the errors of the readings kept against the reference in units of s, Φ their regressors, Cₐ the reference's
 * covariance, A = Σφφᵀ, b = Σφe, and r the regressor of the change (φᵢ, or τφᵢ with τ the time since onset; 0 before it), e
 * has the covariance V = I + ΦCₐΦᵀ and
 *
 * <pre>g = rᵀV⁻¹e = Σre − cᵀWb   M = rᵀV⁻¹r = Σr² − cᵀWc   c = Σrφ   W = (Cₐ⁻¹ + A)⁻¹   ℓ = g²/M</pre>
 *
 * Where only readings since the onset are kept, a step has M = (A⁻¹ + Cₐ)⁻¹ and g = MA⁻¹b; this form needs no inverse of A,
 * which is deficient while the operating point stands still, and lets the quiet readings before the onset vouch for the
 * reference. The shortcut without W names wrongly in one case of a hundred.
 *
 * <p>Noise, with q the mean square of n readings and ν the degrees of freedom of s: ℓ = (n + ν)·ln((nq + ν)/(n + ν)) −
 * n·ln q. About 1 µs a reading with three unknowns.
 */
final class Bank {
    /** Onsets that are looked at each time; those before them change slowly and are looked at each eighth time. */
    private static final int NEAR = 13;

    private static final int ALL = 8;
    /** By so much ℓ of a ramp must exceed that of a step: 95 % point of χ² with one degree of freedom. */
    private static final double RAMP = 3.84;
    /** Below it a mean square is no evidence: saves two logarithms. */
    private static final double NOISE_WORTH_IT = 4;

    private final int q;
    private final double nu;
    private final Onsets onsets;
    private final Sums since;
    private final Sums whole;
    private final Adjustment adjustment;
    private final Evidence[] near;
    private final Evidence[] far;
    private int untilAll;

    /**
     * @param covariance Cₐ of the regressors' unknowns in units of s², q×q; zero for what is not an unknown of the reference
     * @param nu degrees of freedom of s, above 0, may be infinite
     */
    Bank(double[] covariance, double nu) {
        q = (int) Math.round(Math.sqrt(covariance.length));
        this.nu = nu;
        onsets = new Onsets(q);
        since = new Sums(q);
        whole = new Sums(q);
        adjustment = new Adjustment(covariance);
        near = evidence();
        far = evidence();
    }

    private Evidence[] evidence() {
        return Stream.generate(Evidence::new).limit(2 * q + 1).toArray(Evidence[]::new);
    }

    /**
     * @param phi times √w; read
     * @param root √w
     * @param error times √w, in units of s
     */
    void add(double[] phi, double root, double error, double z, double time, long number) {
        onsets.add(phi, root, error, z, time, number);
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
        untilAll = 0;
        clear(near);
        clear(far);
    }

    private static void clear(Evidence[] evidence) {
        for (Evidence each : evidence) {
            each.clear();
        }
    }

    /** Looks at all hypotheses at the onsets of the last hundred readings, and each eighth time at all of them. */
    void evaluate() {
        evaluate(--untilAll <= 0);
    }

    /** Looks at all hypotheses at all onsets. */
    void evaluateAll() {
        evaluate(true);
    }

    private void evaluate(boolean all) {
        int listed = onsets.list();
        clear(near);
        if (listed == 0) {
            return;
        }
        vouch(listed);
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

    /** W and Wb of all that is kept. */
    private void vouch(int listed) {
        whole.copy(onsets.listed(0));
        for (int k = 1; k < listed; k++) {
            whole.vouch(onsets.listed(k));
        }
        adjustment.over(whole.products, whole.scores);
    }

    private void consider(int k, Evidence[] evidence) {
        if (k == 0) {
            since.copy(onsets.listed(0));
        } else {
            since.reach(onsets.listed(k));
        }
        for (int i = 0; i < q; i++) {
            adjustment.offerStep(evidence[i], since, i);
            adjustment.offerRamp(evidence[q + 1 + i], since, i);
        }
        noise(evidence[q], since, nu);
    }

    static void noise(Evidence evidence, Sums since, double nu) {
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

    int regressors() {
        return q;
    }

    double nu() {
        return nu;
    }

    Onsets onsets() {
        return onsets;
    }
}
