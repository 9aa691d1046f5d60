package benchtrue.estimate;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import benchtrue.estimate.RunComparison.RunValue;
import benchtrue.model.Interval;
import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

class RunComparisonTest {
    private static final double CERTAIN = Double.POSITIVE_INFINITY;

    private static RunValue run(double time, double value, double u) {
        return new RunValue(time, value, u, CERTAIN);
    }

    @Test
    void neighboursAgreeWhileTheirDifferenceIsWithinTheirUncertainties() {
        // E_n = (x − X)/√(U² + U²): ISO 13528:2015, 9.7; by hand with U = 1.959964·0.1 each
        RunComparison compared = RunComparison.of(List.of(run(0, 10, 0.1), run(1, 10.2, 0.1), run(2, 11.2, 0.1)), null);
        assertThat(compared.agreement()[0]).isNaN();
        assertThat(compared.agreement()[1]).isCloseTo(0.2 / (0.1959964 * Math.sqrt(2)), within(1e-6));
        assertThat(compared.agreement()[2]).isGreaterThan(1);
    }

    @Test
    void fewerDegreesOfFreedomMakeAgreementEasier() {
        RunValue few = new RunValue(1, 10.3, 0.1, 4);
        // t(0.975, 4) = 2.776: any table of Student's t
        assertThat(RunComparison.agreement(run(0, 10, 0.1), few))
                .isCloseTo(0.3 / Math.hypot(0.1959964, 0.2776445), within(1e-6));
    }

    @Test
    void theTrendIsTheWeightedLine() {
        // Three points with weights 4, 1, 1 by hand: normal equations of y = a + b·t
        RunComparison compared = RunComparison.of(List.of(run(0, 1, 0.5), run(1, 3, 1), run(2, 4, 1)), null);
        RunComparison.Trend trend = compared.trend();
        assertThat(trend).isNotNull();
        assertThat(trend.time()).isCloseTo(0.5, within(1e-12));
        assertThat(trend.level()).isCloseTo(11.0 / 6, within(1e-12));
        assertThat(trend.slope()).isCloseTo((11 - 3 * 11.0 / 6) / (5 - 1.5), within(1e-12));
        assertThat(trend.scatter()).isLessThan(1);
        assertThat(trend.slopeU()).isCloseTo(1.959964 / Math.sqrt(3.5), within(1e-6));
    }

    @Test
    void aClearTrendReachesTheLimitAhead() {
        List<RunValue> runs =
                List.of(run(0, 10.0, 0.01), run(10, 10.1, 0.01), run(20, 10.2, 0.01), run(30, 10.3, 0.01));
        RunComparison.Reach reach = RunComparison.of(runs, new Interval(9, 11)).reaches();
        assertThat(reach).isNotNull();
        assertThat(reach.limit()).isEqualTo(11);
        assertThat(reach.time()).isCloseTo(100, within(1e-9));
        assertThat(reach.earliest()).isBetween(90.0, 100.0);
        assertThat(reach.latest()).isBetween(100.0, 112.0);
        assertThat(RunComparison.of(runs, null).reaches()).isNull();
    }

    @Test
    void noTrendReachesNoLimit() {
        List<RunValue> runs = List.of(run(0, 10.0, 0.1), run(10, 10.1, 0.1), run(20, 9.95, 0.1));
        assertThat(RunComparison.of(runs, new Interval(9, 11)).reaches()).isNull();
    }

    @Test
    void oneRunThatStandsApartIsAnOutlierAndFewOthersAre() {
        SplittableRandom random = new SplittableRandom(4);
        int found = 0;
        int wrong = 0;
        for (int k = 0; k < 400; k++) {
            List<RunValue> runs = new ArrayList<>();
            for (int i = 0; i < 8; i++) {
                runs.add(run(i, 5 + 0.1 * i + 0.05 * random.nextGaussian(), 0.05));
            }
            for (boolean outlier : RunComparison.of(runs, null).outlier()) {
                wrong += outlier ? 1 : 0;
            }
            runs.set(3, run(3, 5.3 + 0.5, 0.05));
            found += RunComparison.of(runs, null).outlier()[3] ? 1 : 0;
        }
        assertThat(found).isGreaterThan(390);
        // 5 % of 400 comparisons are 20, with a standard deviation of 4.4
        assertThat(wrong).isLessThan(38);
    }

    @Test
    void aRunWithoutUncertaintyTakesNoPart() {
        List<RunValue> runs = List.of(run(0, 1, 0.1), run(1, Double.NaN, Double.NaN), run(2, 1.1, 0.1));
        RunComparison compared = RunComparison.of(runs, null);
        assertThat(compared.trend()).isNull();
        assertThat(compared.agreement()[1]).isNaN();
        assertThat(compared.outlier()).containsOnly(false);
    }
}
