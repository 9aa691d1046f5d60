package benchtrue.estimate;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import benchtrue.model.DecisionRule;
import benchtrue.model.Interval;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

final class UncertaintyTest {
    private static final double NONE = Double.POSITIVE_INFINITY;

    /** Source: JCGM 100:2008 (GUM), G.4.1, recomputed with a real-valued ν_eff. */
    @Test
    void combinesAsTheGuideDoes() {
        Uncertainty u = Uncertainty.combine(
                List.of(new Component("a", 0.25, 9), new Component("b", 0.57, 4), new Component("c", 0.82, 14)));
        assertThat(u.standard()).isEqualTo(1.03, within(0.005));
        assertThat(u.degreesOfFreedom()).isEqualTo(18.9987, within(5e-5));
        assertThat(u.coverageFactor()).isEqualTo(2.09, within(0.005));
    }

    /** Source: JCGM 100:2008 (GUM), 7.2.6, for the first three; the others follow from the rule stated in docs/method.md. */
    @ParameterizedTest
    @CsvSource({
        "0,10.47,0,11",
        "0,28.05,0,28",
        "10.05762,0.027,10.058,0.027",
        "11.30312,0.00701,11.3031,0.0071",
        "11299.6,118,11300,120",
        "-0.02099,0.00099,-0.02099,0.00099",
        "3,9.96,3,10",
        "0.5,0.0996,0.50,0.10"
    })
    void roundsValueAndUncertaintyTogether(double value, double expanded, String v, String u) {
        Rounded rounded = Rounded.of(value, expanded);
        assertThat(rounded.uncertainty()).isEqualTo(u);
        if (value != 0) {
            assertThat(rounded.value()).isEqualTo(v);
        }
    }

    @Test
    void writesVerySmallAndVeryLargeOnesWithOneExponent() {
        assertThat(Rounded.of(1.2041e-9, 1.1e-11).text()).isEqualTo("(1.204 ± 0.011)e-9");
        assertThat(Rounded.of(3.14159e12, 2.0e9).text()).isEqualTo("(3.1416 ± 0.0020)e12");
        assertThat(Rounded.of(5e-12, 3.3e-13).text()).isEqualTo("(5.00 ± 0.33)e-12");
        assertThat(Rounded.of(-0.001, 50).text()).isEqualTo("0 ± 50");
        assertThat(Rounded.of(9.9996, 0.0099).text()).isEqualTo("9.9996 ± 0.0099");
        assertThat(Rounded.of(5, 0).text()).isEqualTo("5 ± 0");
        assertThat(Rounded.of(5, Double.POSITIVE_INFINITY).text()).isEqualTo("5 ± -");
        assertThat(Rounded.of(Double.NaN, 1).text()).isEqualTo("- ± -");
        assertThat(Rounded.of(5, Double.NaN).text()).isEqualTo("5 ± -");
        assertThat(Rounded.of(0, 0.002).text()).isEqualTo("0.0000 ± 0.0020");
    }

    @ParameterizedTest
    @CsvSource({
        "11.30,0.01,U,pass",
        "11.395,0.01,U,conditional pass",
        "11.405,0.01,U,conditional fail",
        "11.42,0.01,U,fail",
        "11.395,0.01,SIMPLE,pass",
        "11.401,0.01,SIMPLE,fail",
        "11.391,0.01,GUARD,pass",
        "11.393,0.01,GUARD,conditional pass",
        "11.30,0.11,U,not capable"
    })
    void followsTheRuleThatWasChosen(double value, double expanded, String rule, String word) {
        DecisionRule chosen = rule.equals("U")
                ? DecisionRule.GUARD_U
                : rule.equals("SIMPLE") ? DecisionRule.SIMPLE : DecisionRule.GUARD_083U;
        Verdict verdict = Verdict.judge(value, expanded, expanded / 2, NONE, new Interval(11.2, 11.4), chosen);
        assertThat(verdict.word()).isEqualTo(word);
    }

    /** Source: the normal distribution, any table: P(Z &lt; 1) = 0.841345. */
    @Test
    void knowsTheProbabilityOfConformity() {
        Interval open = new Interval(16, NONE);
        Verdict verdict = Verdict.judge(17, 2, 1, NONE, open, DecisionRule.SIMPLE);
        assertThat(verdict.conformityProbability()).isEqualTo(0.841345, within(1e-6));
        assertThat(Verdict.judge(17, 2, 1, NONE, open, DecisionRule.GUARD_U).word())
                .isEqualTo("conditional pass");
        assertThat(Verdict.judge(17, 2, 1, NONE, null, DecisionRule.GUARD_U).word())
                .isNull();
        assertThat(Verdict.judge(17, 2, 1, NONE, open, null).word()).isNull();
    }
}
