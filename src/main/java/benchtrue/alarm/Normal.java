package benchtrue.alarm;

/** The normal distribution as far as quick tests need it. */
final class Normal {
    private Normal() {}

    /** P(|Z| &lt; a) for a ≥ 0, within 3e-7: Abramowitz and Stegun 7.1.26 for erf(a/√2). */
    static double within(double a) {
        double x = a / Math.sqrt(2);
        double t = 1 / (1 + 0.3275911 * x);
        double tail = t * (0.254829592 + t * (-0.284496736 + t * (1.421413741 + t * (-1.453152027 + t * 1.061405429))));
        return 1 - tail * Math.exp(-x * x);
    }
}
