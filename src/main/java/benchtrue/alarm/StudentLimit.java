package benchtrue.alarm;

import benchtrue.estimate.Quantiles;

/**
 * The bound of |t| for a two-sided level and degrees of freedom. Quantiles cost microseconds: it is computed again only when
 * one of the two has moved by 0.2 %.
 */
final class StudentLimit {
    private static final double WORTH_IT = 0.002;

    private double level = Double.NaN;
    private double degreesOfFreedom = Double.NaN;
    private double limit = Double.NaN;

    /** NaN where the level is NaN or ν is not above 0; ν may be infinite. */
    double at(double newLevel, double nu) {
        if (!(nu > 0) || !(newLevel > 0)) {
            return Double.NaN;
        }
        if (moved(level, newLevel) || moved(degreesOfFreedom, nu)) {
            level = newLevel;
            degreesOfFreedom = nu;
            limit = Quantiles.student(newLevel / 2, nu);
        }
        return limit;
    }

    private static boolean moved(double from, double to) {
        return from != to && !(Math.abs(to - from) <= WORTH_IT * Math.abs(from));
    }
}
