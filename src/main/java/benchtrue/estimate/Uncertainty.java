package benchtrue.estimate;

import java.util.List;

/**
 * A combined uncertainty.
 *
 * @param standard u
 * @param degreesOfFreedom ν_eff by Welch and Satterthwaite, real-valued: GUM (JCGM 100:2008) G.4.1 allows interpolation
 * @param coverageFactor k = t₀.₉₇₅(ν_eff)
 * @param expanded U = k·u, at 95 %
 */
public record Uncertainty(double standard, double degreesOfFreedom, double coverageFactor, double expanded) {

    /** In quadrature, of contributions that do not depend on each other; NaN where one is not known. */
    public static Uncertainty combine(List<Component> components) {
        double variance = 0;
        for (Component component : components) {
            variance += component.standardUncertainty() * component.standardUncertainty();
        }
        double spread = 0;
        for (Component component : components) {
            double share = variance == 0 ? 0 : component.standardUncertainty() / Math.sqrt(variance);
            spread += share * share * share * share / component.degreesOfFreedom();
        }
        double u = Math.sqrt(variance);
        double nu = spread == 0 ? Double.POSITIVE_INFINITY : 1 / spread;
        if (variance == 0 && !components.isEmpty()) {
            nu = components.get(0).degreesOfFreedom();
        }
        double k = Quantiles.coverageFactor(nu);
        return new Uncertainty(u, nu, k, k * u);
    }
}
