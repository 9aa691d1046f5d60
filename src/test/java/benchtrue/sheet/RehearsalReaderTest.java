package benchtrue.sheet;

import static org.assertj.core.api.Assertions.assertThat;

import java.math.BigDecimal;
import java.nio.charset.StandardCharsets;
import java.time.Instant;
import java.util.List;
import java.util.Objects;
import org.junit.jupiter.api.Test;

class RehearsalReaderTest {
    private static final String SHEET = """
            title = "rig"
            [channels]
            I = { unit = "A", resolution = 0.01 }
            T = { unit = "K" }
            V = { unit = "V", noise = 0.006 }
            [[relations]]
            equation = "V = R*I + S*T + V0"
            [rehearsal]
            seed = 5
            rate = 2
            duration = "10 min"
            start = 2027-03-02T13:00:00Z
            [rehearsal.truth]
            R = 1.87
            S = { ramps = [[0, 0.05], [60, 0.06]] }
            V0 = 0
            [rehearsal.channels]
            I = { stairs = [1, 2], dwell = "20 s", noise = 0.02 }
            T = { follows = "I", gain = 5, offset = 12.5, lag = "1 min" }
            [[rehearsal.faults]]
            kind = "loose"
            channel = "V"
            from = 100
            probability = 0.1
            range = [-2, -1]
            """;

    private static SheetReading read(String text) {
        return SheetReader.read("rig.toml", text.getBytes(StandardCharsets.UTF_8));
    }

    private static List<String> mistakes(String from, String to) {
        assertThat(SHEET).contains(from);
        SheetReading reading = read(SHEET.replace(from, to));
        assertThat(reading.sheet()).isNull();
        return reading.mistakes().stream().map(Mistake::toString).toList();
    }

    @Test
    void readsWhatTheRigDoes() {
        SheetReading reading = read(SHEET);
        assertThat(reading.mistakes()).isEmpty();
        Rehearsal rehearsal =
                Objects.requireNonNull(Objects.requireNonNull(reading.sheet()).rehearsal());
        assertThat(rehearsal.seed()).isEqualTo(5);
        assertThat(rehearsal.readings()).isEqualTo(1200);
        assertThat(rehearsal.start()).isEqualTo(Instant.parse("2027-03-02T13:00:00Z"));
        assertThat(rehearsal.truth().get("R")).isEqualTo(new Course.Constant(1.87));
        assertThat(rehearsal.truth().get("S")).isInstanceOf(Course.Ramps.class);
        Rehearsal.Instrument current = rehearsal.channels().get(0);
        assertThat(current.course()).isInstanceOf(Course.Stairs.class);
        assertThat(current.step()).isEqualTo(new BigDecimal("0.01"));
        Rehearsal.Instrument temperature = rehearsal.channels().get(1);
        assertThat(temperature.course()).isEqualTo(new Course.Following(0, 5, 12.5));
        assertThat(temperature.lagSeconds()).isEqualTo(60);
        Rehearsal.Instrument voltage = rehearsal.channels().get(2);
        assertThat(voltage.course()).isNull();
        assertThat(voltage.noise()).as("declared with the channel").isEqualTo(0.006);
        assertThat(voltage.step()).as("hidden by the noise").isEqualByComparingTo("0.0001");
        assertThat(rehearsal.faults())
                .containsExactly(new Fault.Loose(2, 100, Double.POSITIVE_INFINITY, 0.1, -2, -1, false));
    }

    @Test
    void mistakesHaveTheirPlaceAndRemedy() {
        assertThat(mistakes("V0 = 0\n", "")).anyMatch(m -> m.contains("the truth of V0 is not given"));
        assertThat(mistakes("V0 = 0\n", "V0 = 0\nVO = 1\n"))
                .containsExactly("rig.toml:17:1: unknown key VO in [rehearsal.truth]; did you mean V0?");
        assertThat(mistakes("T = { follows = \"I\"", "T = { follows = \"J\""))
                .contains("rig.toml:19:7: there is no channel J to follow; known here: I, T, V");
        assertThat(mistakes("T = { follows = \"I\", gain = 5, offset = 12.5, lag = \"1 min\" }\n", ""))
                .anyMatch(m -> m.contains("nothing says what channel T measures"));
        assertThat(mistakes("T = { follows = \"I\"", "T = { follows = \"V\""))
                .anyMatch(m -> m.contains("channel T follows a channel that has no course of its own"));
        assertThat(mistakes("[[0, 0.05], [60, 0.06]]", "[[60, 0.05], [0, 0.06]]"))
                .contains("rig.toml:15:7: ramps needs pairs of time and value, the times rising;"
                        + " write [[0, 1.5], [60, 2.5]]");
        assertThat(mistakes("stairs = [1, 2], dwell = \"20 s\"", "stairs = [1, 2]"))
                .anyMatch(m -> m.contains("has no dwell; add dwell = \"20 s\""));
        assertThat(mistakes("stairs = [1, 2], dwell = \"20 s\"", "value = 1, sine = [1, 2], period = 3"))
                .anyMatch(m -> m.contains("has two courses, value and sine"));
        assertThat(mistakes("kind = \"loose\"", "kind = \"lose\""))
                .contains("rig.toml:21:1: \"lose\" is no fault; did you mean loose?");
        assertThat(mistakes("channel = \"V\"", "channel = \"U\""))
                .anyMatch(m -> m.startsWith("rig.toml:22:1: there is no channel U"));
        assertThat(mistakes("probability = 0.1", "probability = 12"))
                .contains("rig.toml:24:1: a probability is at most 1; write 12 % as 0.12");
        assertThat(mistakes("range = [-2, -1]", "rang = [-2, -1]"))
                .anyMatch(m -> m.contains("has no range"))
                .anyMatch(m -> m.contains("unknown key rang") && m.contains("did you mean range?"));
        assertThat(mistakes("from = 100", "from = 100\nto = 50"))
                .anyMatch(m -> m.contains("the fault ends before it begins"));
        assertThat(mistakes("rate = 2", "rat = 2")).anyMatch(m -> m.contains("[rehearsal] has no rate; add rate = 5"));
        assertThat(mistakes("rate = 2", "rate = 0")).anyMatch(m -> m.startsWith("rig.toml:10:1: "));
        assertThat(mistakes("duration = \"10 min\"", "duration = 0"))
                .anyMatch(m -> m.contains("duration must be above 0"));
        assertThat(mistakes("rate = 2", "rate = 1e9")).anyMatch(m -> m.contains("more than a billion readings"));
        assertThat(mistakes("start = 2027-03-02T13:00:00Z", "start = \"noon\""))
                .anyMatch(m -> m.contains("start must be a date with its time"));
        assertThat(mistakes("noise = 0.02 }", "noise = -0.02 }")).anyMatch(m -> m.startsWith("rig.toml:18:"));
        assertThat(mistakes("noise = 0.02 }", "correlation = 1 }"))
                .anyMatch(m -> m.contains("the correlation of neighbouring readings is below 1"));
    }

    @Test
    void aRelationThatLooksBackAtItsOwnResponseCannotBeRehearsed() {
        assertThat(mistakes("R*I + S*T", "R*prev(V) + S*T"))
                .anyMatch(m -> m.contains("V = R*prev(V) + S*T + V0 computes its response from itself"));
    }
}
