package benchtrue.sheet;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import benchtrue.model.DecisionRule;
import benchtrue.model.Memory;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import org.junit.jupiter.api.Test;

final class SheetReaderTest {
    private static final String PUMP = """
            title = "Gear-pump slip, stand 2"
            item = "pump 0417"

            [channels]
            n  = { unit = "rev/min", interval = [0, 3000], resolution = 1, adjustable = true, operate = [900, 2400] }
            dp = { unit = "bar", interval = [0, 250], adjustable = true, operate = [30, 175], correction = "1.002*x - 0.1", due = 2027-03-01 }
            Q  = { unit = "L/min", interval = [0, 40], noise = 0.06, u_other = 0.02 }

            [constants]
            p0 = { value = 1, unit = "bar" }

            [derived]
            Ph = "dp*Q"

            [operate]
            joint = ["n*dp < 3.5e5"]

            [[relations]]
            equation = "Q = D*n + c*dp + q0"
            memory = "120 s"
            weight = "1/0.06^2"

            [relations.unknowns]
            D = { unit = "cm^3/rev", plausible = [9, 13], wanted = 0.02, limits = [11.2, 11.4], u_other = 0.003 }
            c = { limits = [-0.03, inf] }

            [[results]]
            name = "flow at 1800 rev/min and 120 bar"
            expression = "D*(1800 rev/min) + c*(120 bar) + q0"
            limits = [16.0, inf]

            [[points]]
            set = { n = 1500, dp = 120 }
            dwell = "30 s"

            [[exclude]]
            from = 712.0
            to = 730.0
            reason = "coupling reseated"

            [reference]
            after = "120 s"

            [alarms]
            false_alarms = "1 per 8 h"

            [verdict]
            rule = "U"
            """;

    private static SheetReading read(String text) {
        return SheetReader.read("pump.toml", text.getBytes(StandardCharsets.UTF_8));
    }

    @Test
    void readsAWholeSheet() {
        SheetReading reading = read("\uFEFF" + PUMP.replace("\n", "\r\n"));
        assertThat(reading.mistakes()).isEmpty();
        BenchSheet sheet = reading.sheet();
        assertThat(sheet).isNotNull();
        assertThat(sheet.channels()).extracting(Channel::name).containsExactly("n", "dp", "Q");
        Group group = sheet.groups().get(0);
        assertThat(group.unknowns()).extracting(UnknownSpec::name).containsExactly("D", "c", "q0");
        assertThat(group.unknowns().get(0).unit().symbol()).isEqualTo("cm^3/rev");
        assertThat(group.unknowns().get(2).constantTerm()).isTrue();
        assertThat(group.forgetting().memory()).isEqualTo(new Memory.Seconds(120));
        assertThat(sheet.rule()).isEqualTo(DecisionRule.GUARD_U);
        assertThat(sheet.alarms().falseAlarmsPerSecond()).isEqualTo(1 / 28800.0, within(1e-12));
        Result result = sheet.results().get(0);
        assertThat(result.coefficients()[0]).isEqualTo(1.8, within(1e-12));
        assertThat(result.coefficients()[1]).isEqualTo(120, within(1e-9));
        assertThat(result.unit().symbol()).isEqualTo("L/min");
        assertThat(sheet.reference().afterSeconds()).isEqualTo(120);
        assertThat(sheet.joint()).hasSize(1);
        assertThat(sheet.points().get(0).set()).containsExactly(1500, 120, Double.NaN);
    }

    @Test
    void namesThePlaceOfAMistakeInsideAnEquation() {
        SheetReading reading = read(PUMP.replace("Q = D*n + c*dp + q0", "Q = D*n + c*dq^D + q0"));
        assertThat(reading.sheet()).isNull();
        Mistake mistake = reading.mistakes().get(0);
        assertThat(mistake.line()).isEqualTo(19);
        assertThat(mistake.column()).isGreaterThan(12);
        assertThat(mistake.remedy()).isNotEmpty();
    }

    @Test
    void findsSeveralMistakesInOnePassWithWhatWasMeant() {
        SheetReading reading = read(PUMP.replace("memory = \"120 s\"", "memorry = \"120 s\"")
                .replace("unit = \"bar\", interval", "unit = \"barr\", interval")
                .replace("after = \"120 s\"", "after = \"120 parsecs\""));
        assertThat(reading.mistakes()).extracting(Mistake::line).contains(6, 20, 42);
        assertThat(reading.mistakes()).anyMatch(m -> m.remedy().contains("did you mean memory?"));
    }

    @Test
    void refusesWhatIsNoSheet() {
        assertThat(SheetReader.read(Path.of("no-such.toml")).mistakes().get(0).toString())
                .isEqualTo("no-such.toml: there is no such file; check the name");
        assertThat(SheetReader.read(Path.of("src")).mistakes().get(0).message()).startsWith("is a folder");
        assertThat(read("").mistakes()).isNotEmpty().allMatch(m -> !m.remedy().isEmpty());
        assertThat(read("title = ").mistakes().get(0).line()).isEqualTo(1);
    }
}
