package benchtrue.alarm;

/**
 * Slack and limit of a two-sided CUSUM, in standard deviations.
 *
 * <p>Siegmund 1985: ARL₀ ≈ exp(2k(h + 1.166))/(4k²) for the two-sided chart, so with k = 0.5 h = ln ARL₀ − 1.166. A
 * reference that is itself uncertain shifts all z by a common δ with variance v (its mean leverage) and scales them by 1 + ε
 * with variance 1/(2ν); the rate, averaged over references, becomes exp(−2kh + 2h²v + 4k²h²/ν)/…, hence
 *
 * <pre>2kh − 2h²(v + 2k²/ν) = ln(4k²·ARL₀) − 2.332k</pre>
 *
 * of which h is the smaller root. Where there is none the reference is too short for k = 0.5, and k grows until there is one.
 *
 * @param slack k
 * @param limit h
 */
record CusumDesign(double slack, double limit) {
    private static final double SLACK = 0.5;
    private static final double OVERSHOOT = 1.166;
    /** How far inside the region with a root to stay: at the edge h is twice the height it needs without uncertainty. */
    private static final double MARGIN = 1.15;

    private static final double GROWTH = 1.05;

    /**
     * @param perReading false alarms for each (thinned) reading, in (0, 1)
     * @param leverage mean of φᵀCφ over the readings tested, not negative
     * @param nu degrees of freedom of the reference's standard deviation, above 0, may be infinite
     */
    static CusumDesign of(double perReading, double leverage, double nu) {
        for (double k = SLACK; ; k *= GROWTH) {
            double needed = Math.max(1, Math.log(4 * k * k / perReading) - 2 * OVERSHOOT * k);
            double spread = leverage + 2 * k * k / nu;
            double root = k * k - 2 * spread * needed;
            if (k * k >= 2 * MARGIN * spread * needed || k > 4) {
                return new CusumDesign(k, needed / (k + Math.sqrt(Math.max(0, root))));
            }
        }
    }
}
