package benchtrue.alarm;

/**
 * Limit of the likelihood ratios from the budget of false alarms. While nothing is wrong, the largest ℓ over the onsets
 * passes L at a rate per reading of
 *
 * <pre>K·H·√L·(1 + L/ν)^(−ν/2)</pre>
 *
 * for H hypotheses: the form of Siegmund and Venkatraman 1995 for one mean of known variance (ν = ∞, e^(−L/2)), averaged over
 * the estimated variance of the reference. K = 0.02 from 6e6 simulated readings for one to four unknowns.
 */
final class BankLimit {
    private static final double RATE = 0.02;
    private static final int ROUNDS = 20;

    private BankLimit() {}

    /**
     * @param perReading false alarms for each reading that the bank sees, in (0, 1)
     * @param hypotheses two for each regressor and one for the noise
     */
    static double of(double perReading, int hypotheses, double nu) {
        double limit = 30;
        for (int i = 0; i < ROUNDS; i++) {
            double tail = Math.log(RATE * hypotheses * Math.sqrt(limit) / perReading);
            limit = Math.max(10, Double.isInfinite(nu) ? 2 * tail : nu * Math.expm1(2 * tail / nu));
        }
        return limit;
    }
}
