package benchtrue.estimate;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import org.junit.jupiter.api.Test;

final class StopRuleTest {
    private static StopRule.Facts facts(
            boolean determined, double u, double readings, int visited, boolean again, int open) {
        return new StopRule.Facts(
                List.of(new StopRule.Sought("D", determined, u, 0.02), new StopRule.Sought("q0", true, 1, Double.NaN)),
                readings,
                3,
                visited,
                again,
                true,
                true,
                open);
    }

    @Test
    void letsARunEndOnlyWhenNothingIsMissing() {
        assertThat(StopRule.whyNotYet(facts(true, 0.02, 30, 3, true, 0))).isEmpty();
        assertThat(StopRule.whyNotYet(facts(true, 0.021, 30, 3, true, 0)))
                .containsExactly("U of D is 0.021, wanted 0.020");
        assertThat(StopRule.whyNotYet(facts(false, Double.NaN, 29, 2, false, 1)))
                .containsExactly(
                        "D is not determined",
                        "29 effective readings of at least 30",
                        "2 of 3 planned points visited",
                        "1 alarm unacknowledged");
        assertThat(StopRule.whyNotYet(facts(true, 0.01, 40, 3, false, 2)))
                .containsExactly("no planned point revisited", "2 alarms unacknowledged");
    }

    @Test
    void countsAPointAsRevisitedOnlyAfterAnother() {
        PointVisits visits = new PointVisits(
                List.of(new double[] {1500, Double.NaN}, new double[] {2000, 120}), new double[] {10, 2});
        visits.at(new double[] {1503, 55});
        visits.at(new double[] {1515, 55});
        visits.at(new double[] {1499, 55});
        assertThat(visits.visited()).isEqualTo(1);
        assertThat(visits.revisited()).isFalse();
        visits.at(new double[] {2001, 117});
        visits.at(new double[] {2001, 119});
        visits.at(new double[] {1500, 119});
        assertThat(visits.visited()).isEqualTo(visits.planned());
        assertThat(visits.revisited()).isTrue();
    }
}
