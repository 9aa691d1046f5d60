package benchtrue.estimate;

import benchtrue.model.DecisionRule;
import benchtrue.model.Interval;
import org.jspecify.annotations.Nullable;

/**
 * A statement of conformity under the decision rule that was chosen beforehand (ISO/IEC 17025:2017, 7.8.6; ILAC-G8:09/2019;
 * ISO 14253-1:2017), with the probability of conformity (JCGM 106:2012, 7).
 *
 * @param word pass, conditional pass, conditional fail, fail, not capable; null where there are no limits or no rule
 * @param conformityProbability P(the true value lies within the limits); NaN where there are none
 */
public record Verdict(@Nullable String word, double conformityProbability) {
    private static final Verdict NONE = new Verdict(null, Double.NaN);

    /**
     * @param expanded U
     * @param standard u
     * @param nu its degrees of freedom
     * @param limits a side without a limit is infinite
     */
    public static Verdict judge(
            double value,
            double expanded,
            double standard,
            double nu,
            @Nullable Interval limits,
            @Nullable DecisionRule rule) {
        if (limits == null || rule == null || !(expanded >= 0) || Double.isNaN(value)) {
            return NONE;
        }
        double guard = rule.guardInU() * expanded;
        return new Verdict(word(value, guard, limits), probability(value, standard, nu, limits));
    }

    private static String word(double value, double guard, Interval limits) {
        if (2 * guard > limits.width()) {
            return "not capable";
        }
        if (limits.lower() + guard <= value && value <= limits.upper() - guard) {
            return "pass";
        }
        if (limits.contains(value)) {
            return "conditional pass";
        }
        boolean near = limits.lower() - guard <= value && value <= limits.upper() + guard;
        return near && guard > 0 ? "conditional fail" : "fail";
    }

    private static double probability(double value, double standard, double nu, Interval limits) {
        if (standard == 0) {
            return limits.contains(value) ? 1 : 0;
        }
        double above = Quantiles.studentProbability((limits.upper() - value) / standard, nu);
        double below = Quantiles.studentProbability((limits.lower() - value) / standard, nu);
        return above - below;
    }
}
