package benchtrue.alarm;

/** What is asked of the readings that the bank keeps once an alarm stands, and therefore rarely. */
final class Review {
    private static final int QUIET = 256;
    /** Four times the mean of χ² for each degree of freedom. */
    private static final double CALM = 4;

    private final int q;
    private final double nu;
    private final Onsets onsets;
    private final Sums since;
    private final Sums whole;
    private final Adjustment adjustment;
    private final Evidence one = new Evidence();
    private final double[] ratios = new double[Onsets.most()];
    private final double[] m;
    private final double[] g;
    private double from;
    private double to;

    Review(Bank bank, double[] covariance) {
        q = bank.regressors();
        nu = bank.nu();
        onsets = bank.onsets();
        since = new Sums(q);
        whole = new Sums(q);
        adjustment = new Adjustment(covariance);
        m = new double[q * q];
        g = new double[q];
    }

    private void extend(int k) {
        if (k == 0) {
            since.copy(onsets.listed(0));
        } else {
            since.reach(onsets.listed(k));
        }
    }

    private int vouched() {
        int listed = onsets.list();
        for (int k = 0; k < listed; k++) {
            if (k == 0) {
                whole.copy(onsets.listed(0));
            } else {
                whole.vouch(onsets.listed(k));
            }
        }
        if (listed > 0) {
            adjustment.over(whole.products, whole.scores);
        }
        return listed;
    }

    /**
     * M and g of a step of all regressors at once since an onset.
     *
     * @param intoM q×q, written
     * @param intoG written
     * @return the sums since that onset, valid until the next question
     */
    Sums jointSince(double onset, double[] intoM, double[] intoG) {
        int listed = vouched();
        for (int k = 0; k < listed && (k == 0 || onsets.listed(k).start >= onset); k++) {
            extend(k);
        }
        adjustment.joint(since, intoM, intoG);
        return since;
    }

    /** ℓ of a step of all unknowns at once, each by its own amount, at its best onset: gᵀM⁻¹g. */
    double together() {
        double most = 0;
        int listed = vouched();
        for (int k = 0; k < listed; k++) {
            extend(k);
            adjustment.joint(since, m, g);
            most = Math.max(most, Symmetric.quadratic(m, g));
        }
        return most;
    }

    /** By how much the mean squares of all readings kept, with what is known of the reference, exceed those of mere noise. */
    double misfit() {
        int listed = vouched();
        double squares = 0;
        for (int k = 0; k < listed; k++) {
            squares += onsets.listed(k).squares - onsets.listed(k).count;
        }
        return squares - adjustment.explainedBy(whole.scores);
    }

    /**
     * Between which times the onset of a cause lies: how far the evidence stays within a distance of its best, and to the next
     * onset beyond on either side. To be read from {@link #from} and {@link #to}.
     */
    void date(int cause, double within) {
        int listed = vouched();
        double best = 0;
        for (int k = 0; k < listed; k++) {
            extend(k);
            ratios[k] = ratio(cause);
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
        from = listed == 0 ? Double.NaN : onsets.listed(Math.min(listed - 1, oldest + 1)).start;
        to = listed == 0 ? Double.NaN : onsets.listed(Math.max(0, newest - 1)).start;
    }

    private double ratio(int cause) {
        one.clear();
        if (cause == q) {
            Bank.noise(one, since, nu);
        } else {
            adjustment.offerStep(one, since, cause);
            adjustment.offerRamp(one, since, cause);
        }
        return one.ratio;
    }

    /** In s; NaN where nothing is kept. */
    double from() {
        return from;
    }

    double to() {
        return to;
    }

    /** Whether the last 256 readings or more, all since the onset, have neither moved nor grown noisier. */
    boolean quiet(double onset) {
        int listed = onsets.list();
        for (int k = 0; k < listed && onsets.listed(k).start > onset; k++) {
            extend(k);
            if (since.count >= QUIET) {
                adjustment.over(since.products, since.scores);
                adjustment.joint(since, m, g);
                return ratio(q) < CALM && Symmetric.quadratic(m, g) < CALM * q;
            }
        }
        return false;
    }

    /**
     * By how much 2·ln of the likelihood of the readings since some time, whichever speaks most clearly, is larger without a
     * change than with it: for a change δ of an unknown −(2δg − δ²M), for noise grown by the factor f
     * n(2 ln f − q(1 − 1/f²)). Of a ramp only the last quarter of its time counts, in which it is much like a step.
     */
    double against(Cause cause, double now) {
        double onset = cause.onset().time();
        double earliest = cause.ramp() ? now - (now - onset) / 4 : onset;
        double most = 0;
        int listed = onsets.list();
        for (int k = 0; k < listed && onsets.listed(k).start > earliest; k++) {
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
        adjustment.over(since.products, since.scores);
        one.clear();
        adjustment.offerStep(one, since, cause.leader());
        return cause.change() * (cause.change() * one.information - 2 * one.score);
    }

    /** When the oldest onset considered began, in s; NaN while there is none. */
    double oldest() {
        int listed = onsets.list();
        return listed == 0 ? Double.NaN : onsets.listed(listed - 1).start;
    }
}
