package benchtrue.alarm;

import static org.assertj.core.api.Assertions.assertThat;

import benchtrue.model.Interval;
import org.junit.jupiter.api.Test;

class UnitSuspicionTest {
    private static final Interval PLAUSIBLE = new Interval(9, 13);

    @Test
    void aSpeedInRevolutionsPerSecondShowsAsAFactorOfSixty() {
        UnitSuspicion.Suspicion suspicion = UnitSuspicion.of(676, 1, PLAUSIBLE);
        assertThat(suspicion.units()).containsExactly("×60");
        assertThat(suspicion.sign()).isFalse();
    }

    @Test
    void allFactorsThatFitAreListedInBothDirections() {
        assertThat(UnitSuspicion.of(1.13, 0.01, PLAUSIBLE).units()).containsExactly("÷9.8066", "÷10", "×0.10472");
        assertThat(UnitSuspicion.of(3.14, 0.01, PLAUSIBLE).units()).containsExactly("÷3.6");
    }

    @Test
    void theOppositeValueIsASign() {
        assertThat(UnitSuspicion.of(-11.3, 0.1, PLAUSIBLE).sign()).isTrue();
    }

    @Test
    void anIntervalAsWideAsTheFactorsTellsNothing() {
        assertThat(UnitSuspicion.of(212, 0.1, new Interval(-5, 5)).none()).isTrue();
        assertThat(UnitSuspicion.of(212, 0.1, new Interval(1, 20)).none()).isTrue();
    }

    @Test
    void whatMayBePlausibleOrIsExplainedByNothingIsNotSuspected() {
        assertThat(UnitSuspicion.of(13.5, 0.15, PLAUSIBLE).none()).isTrue();
        assertThat(UnitSuspicion.of(1e9, 1, PLAUSIBLE).none()).isTrue();
        assertThat(UnitSuspicion.of(Double.NaN, 1, PLAUSIBLE).none()).isTrue();
    }
}
