package benchtrue.run;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import benchtrue.model.Forgetting;
import benchtrue.model.Interval;
import benchtrue.model.Memory;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import org.jspecify.annotations.Nullable;
import org.junit.jupiter.api.Test;

/** Runs beside each other, with numbers worked by hand. */
final class ComparedUnknownTest {
    private static Closing closing(String name, @Nullable Instant start, double estimate, double own, double shared) {
        double u = Math.hypot(own, shared);
        Closing.Unknown unknown = new Closing.Unknown(
                "R",
                "ohm",
                estimate,
                u,
                1.96 * u,
                1.96,
                Double.POSITIVE_INFINITY,
                true,
                true,
                Double.NaN,
                new Interval(1.9, 2.1),
                "U",
                null,
                null,
                Double.NaN,
                List.of(
                        new Closing.Contribution("readings", own, Double.POSITIVE_INFINITY),
                        new Closing.Contribution("other, declared", shared, Double.POSITIVE_INFINITY)));
        Closing.Relation relation = new Closing.Relation(
                "V = R*I",
                "V",
                "V",
                new Forgetting(Forgetting.Kind.EXPONENTIAL, new Memory.All()),
                "all",
                0,
                List.of(unknown),
                0.01,
                1,
                100,
                1,
                List.of(),
                0,
                2,
                100,
                null,
                null,
                List.of(),
                List.of());
        return new Closing(
                "Resistor",
                "",
                "",
                List.of(),
                List.of(),
                "replay",
                name,
                null,
                start,
                new Closing.Readings(1, 1, 0, 0, 0, 0, 0, 0, 1, 1),
                List.of(),
                List.of(relation),
                List.of(),
                List.of(),
                List.of(),
                List.of(),
                0,
                "");
    }

    /** E_n after ISO 13528 (from memory): |2.03 − 2.00| / √(U² + U²) with U = 1.96·0.01 each = 1.082; what is shared counts for nothing. */
    @Test
    void neighboursAreComparedWithoutWhatTheyShare() {
        List<ComparedUnknown> unknowns = ComparedUnknown.of(
                List.of(closing("one", null, 2.00, 0.01, 0.5), closing("two", null, 2.03, 0.01, 0.5)));
        assertThat(unknowns).hasSize(1);
        double agreement = unknowns.get(0).comparison().agreement()[1];
        assertThat(Math.abs(agreement)).isEqualTo(0.03 / (1.96 * 0.01 * Math.sqrt(2)), within(1e-4));
        assertThat(unknowns.get(0).isFinding()).isTrue();
        assertThat(unknowns.get(0).comparison().trend()).isNull();
    }

    /** 0.01 a day from 2.00 on: 2.1 is reached on day 10. */
    @Test
    void runsGoByTheirRecordedStartAndTheTrendIsDrawnOnToTheLimit() {
        Instant first = Instant.parse("2027-03-01T08:00:00Z");
        List<Closing> closings = new ArrayList<>();
        for (int day : new int[] {3, 0, 2, 1}) {
            closings.add(closing("day " + day, first.plusSeconds(day * 86_400L), 2 + 0.01 * day, 0.001, 0));
        }
        ComparedUnknown unknown = ComparedUnknown.of(closings).get(0);
        assertThat(unknown.values().stream().map(ComparedUnknown.Value::run))
                .containsExactly("day 0", "day 1", "day 2", "day 3");
        assertThat(unknown.comparison().trend()).isNotNull();
        assertThat(unknown.comparison().trend().slope()).isEqualTo(0.01, within(1e-9));
        assertThat(unknown.comparison().reaches()).isNotNull();
        assertThat(unknown.comparison().reaches().time()).isEqualTo(10, within(1e-6));
    }
}
