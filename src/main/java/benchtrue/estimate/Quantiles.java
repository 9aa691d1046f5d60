package benchtrue.estimate;

import org.apache.commons.statistics.distribution.ChiSquaredDistribution;
import org.apache.commons.statistics.distribution.FDistribution;
import org.apache.commons.statistics.distribution.NormalDistribution;
import org.apache.commons.statistics.distribution.TDistribution;

/** Quantiles and tails of the distributions that the tests are judged by. Degrees of freedom may be any real number above 0. */
public final class Quantiles {
    private static final NormalDistribution NORMAL = NormalDistribution.of(0, 1);

    private Quantiles() {}

    /** What Student's t exceeds with this probability; the normal distribution's where ν is infinite; NaN where ν is not above 0. */
    public static double student(double tail, double nu) {
        if (!(nu > 0)) {
            return Double.NaN;
        }
        return Double.isInfinite(nu)
                ? NORMAL.inverseSurvivalProbability(tail)
                : TDistribution.of(nu).inverseSurvivalProbability(tail);
    }

    /** k for an expanded uncertainty at 95 %: t₀.₉₇₅(ν) (GUM G.3.2). */
    public static double coverageFactor(double nu) {
        return student(0.025, nu);
    }

    /** P(T ≤ t). */
    public static double studentProbability(double t, double nu) {
        if (!(nu > 0)) {
            return Double.NaN;
        }
        return Double.isInfinite(nu)
                ? NORMAL.cumulativeProbability(t)
                : TDistribution.of(nu).cumulativeProbability(t);
    }

    /** P(χ² &gt; x). */
    public static double chiSquaredTail(double x, double nu) {
        return ChiSquaredDistribution.of(nu).survivalProbability(x);
    }

    /** P(F &gt; x). */
    public static double fisherTail(double x, double above, double below) {
        return FDistribution.of(above, below).survivalProbability(x);
    }

    /** What F exceeds with this probability. */
    public static double fisher(double tail, double above, double below) {
        return FDistribution.of(above, below).inverseSurvivalProbability(tail);
    }
}
