package benchtrue.alarm;

import org.apache.commons.statistics.distribution.NormalDistribution;
import org.apache.commons.statistics.distribution.TDistribution;

final class Quantiles {
    private Quantiles() {}

    static double student(double tail, double nu) {
        return Double.isInfinite(nu)
                ? NormalDistribution.of(0, 1).inverseSurvivalProbability(tail)
                : TDistribution.of(nu).inverseSurvivalProbability(tail);
    }
}
