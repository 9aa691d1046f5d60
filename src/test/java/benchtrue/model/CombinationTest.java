package benchtrue.model;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;

class CombinationTest {
    private static final Unit LITRES = Unit.parse("L/min").get();
    private static final Map<String, Unit> UNKNOWNS = Map.of(
            "D",
            Unit.parse("cm^3/rev").get(),
            "c",
            LITRES.over(Unit.parse("bar").get()),
            "q0",
            LITRES);

    @Test
    void flowAtAnOperatingPointIsInTheResponsesUnit() {
        Combination flow = Combination.parse(
                        "D*(1800 rev/min) + c*(120 bar) + q0", Scope.EMPTY, UNKNOWNS, null, List.of(LITRES))
                .get();
        assertThat(flow.unit()).isEqualTo(LITRES);
        assertThat(flow.constant()).isZero();
        assertThat(flow.coefficients()).isEqualTo(Map.of("D", 1.8, "c", 120.0, "q0", 1.0));
    }
}
