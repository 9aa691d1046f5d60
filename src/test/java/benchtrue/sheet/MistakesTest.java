package benchtrue.sheet;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Objects;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Every mistake in a sheet is told with its place, and with what to write instead or look at. */
final class MistakesTest {
    private static final String SHEET = """
            title = "Gear-pump slip"
            item = "pump 0417"

            [channels]
            n = { unit = "rev/min", interval = [0, 3000], resolution = 1, adjustable = true, operate = [900, 2400] }
            dp = { unit = "bar", interval = [0, 250], correction = "1.002*x - 0.1", due = 2027-03-01 }
            Q = { unit = "L/min", interval = [0, 40], noise = 0.06 }

            [constants]
            I0 = { value = 1, unit = "A" }

            [derived]
            P = "dp*Q"

            [operate]
            joint = ["n*dp < 3.5e5"]

            [[relations]]
            equation = "Q = D*n + c*dp + q0"
            memory = "120 s"
            forgetting = "exponential"
            outliers = "hold out"
            weight = "1/0.06^2"

            [relations.unknowns]
            D = { unit = "cm^3/rev", plausible = [9, 13], wanted = 0.02, limits = [11.2, 11.4] }

            [[results]]
            name = "flow"
            expression = "D*(1800 rev/min) + q0"
            limits = [16.0, inf]

            [[points]]
            set = { n = 1500 }
            dwell = "30 s"

            [[exclude]]
            from = 10.0
            to = 20.0
            reason = "coupling reseated"

            [reference]
            after = "120 s"

            [alarms]
            false_alarms = "1 per 8 h"

            [verdict]
            rule = "U"

            [line]
            baud = 115200
            """;

    @TempDir
    private Path folder;

    private SheetReading read(String text) throws IOException {
        Path file = folder.resolve("sheet.toml");
        Files.writeString(file, text);
        return SheetReader.read(file);
    }

    @Test
    void thePatternOfAllThatFollowsIsSound() throws IOException {
        SheetReading reading = read(SHEET);
        assertThat(reading.mistakes()).isEmpty();
        assertThat(reading.sheet()).isNotNull();
    }

    /** Each: what is replaced, by what, on which line the mistake is, and what must be said. */
    @ParameterizedTest
    @CsvSource(
            delimiter = '|',
            quoteCharacter = '`',
            value = {
                "title = | titel = | 1 | title",
                "unit = \"rev/min\" | unit = \"rvs/min\" | 5 | rvs",
                "interval = [0, 3000] | interval = [3000, 0] | 5 | interval",
                "interval = [0, 3000] | interval = [0] | 5 | interval",
                "interval = [0, 3000] | interval = \"0-3000\" | 5 | interval",
                "resolution = 1 | resolution = -1 | 5 | resolution",
                "resolution = 1 | resolutoin = 1 | 5 | resolution",
                "adjustable = true | adjustable = \"yes\" | 5 | adjustable",
                "correction = \"1.002*x - 0.1\" | correction = \"1.002*y - 0.1\" | 6 | y",
                "correction = \"1.002*x - 0.1\" | correction = \"1.002*x -\" | 6 | ends",
                "due = 2027-03-01 | due = \"soon\" | 6 | due",
                "noise = 0.06 | noise = \"small\" | 7 | noise",
                "noise = 0.06 | noise = -0.06 | 7 | noise",
                "value = 1, | | 10 | value",
                "P = \"dp*Q\" | P = \"dp*R\" | 13 | R",
                "P = \"dp*Q\" | P = \"dp + Q\" | 13 | unit",
                "n*dp < 3.5e5 | n*dq < 3.5e5 | 16 | dq",
                "equation = \"Q = D*n + c*dp + q0\" | equation = \"D*n + c*dp + q0\" | 19 | =",
                "equation = \"Q = D*n + c*dp + q0\" | equation = \"Q = D*n + c*D*dp + q0\" | 19 | linear",
                "equation = \"Q = D*n + c*dp + q0\" | equation = \"Q = exp(D*n) + q0\" | 19 | linear",
                "equation = \"Q = D*n + c*dp + q0\" | equation = \"Q = D*n + c*(dp + q0\" | 19 | )",
                "equation = \"Q = D*n + c*dp + q0\" | equation = \"Q = D*n + n + q0\" | 19 | unit",
                "memory = \"120 s\" | memory = \"120\" | 20 | memory",
                "memory = \"120 s\" | memory = \"long\" | 20 | memory",
                "forgetting = \"exponential\" | forgetting = \"linear\" | 21 | directional",
                "outliers = \"hold out\" | outliers = \"drop\" | 22 | hold out",
                "weight = \"1/0.06^2\" | weight = \"1/s^2\" | 23 | s",
                "D = { unit = \"cm^3/rev\", | E = { unit = \"cm^3/rev\", | 26 | E",
                "unit = \"cm^3/rev\" | unit = \"bar\" | 19 | D in bar",
                "wanted = 0.02 | wanted = 0 | 26 | wanted",
                "limits = [11.2, 11.4] | limits = [11.4, 11.2] | 26 | limits",
                "expression = \"D*(1800 rev/min) + q0\" | expression = \"D*(1800 rev/min)*q0\" | 30 | multiply",
                "expression = \"D*(1800 rev/min) + q0\" | expression = \"F*(1800 rev/min) + q0\" | 30 | F",
                "set = { n = 1500 } | set = { w = 1500 } | 34 | w",
                "dwell = \"30 s\" | dwell = \"30\" | 35 | dwell",
                "to = 20.0 | to = 5.0 | 39 | to",
                "after = \"120 s\" | after = \"soon\" | 43 | after",
                "false_alarms = \"1 per 8 h\" | false_alarms = \"never\" | 46 | false alarms",
                "rule = \"U\" | rule = \"2U\" | 49 | rule",
                "baud = 115200 | baud = \"fast\" | 52 | baud",
                "baud = 115200 | bauds = 115200 | 52 | baud",
                "[verdict] | [verdicts] | 48 | verdict",
                "[alarms] | [alarms | 45 | ]"
            })
    void isToldWithItsPlaceAndItsRemedy(String what, String instead, int line, String said) throws IOException {
        assertThat(SHEET).contains(what);
        SheetReading reading = read(SHEET.replace(what, Objects.requireNonNullElse(instead, "")));
        List<Mistake> mistakes = reading.mistakes();
        assertThat(reading.sheet()).as("%s", mistakes).isNull();
        assertThat(mistakes).isNotEmpty();
        assertThat(mistakes).as("%s", mistakes).anySatisfy(mistake -> {
            assertThat(mistake.toString()).contains("sheet.toml:" + line + ":").contains(said);
            assertThat(mistake.remedy()).isNotEmpty();
        });
    }
}
