package benchtrue.cli;

import static org.assertj.core.api.Assertions.assertThat;

import benchtrue.sheet.SheetReader;
import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.InputStream;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class SheetCommandTest {
    private static final List<String> PUMP = List.of(
            "Gear-pump slip",
            "pump 0417",
            "replays/gear-pump/readings.csv",
            "", // n
            "rev/min",
            "",
            "", // dp
            "bar",
            "",
            "", // Q
            "L/min",
            "0.06",
            "Q = D*n + c*dp + q0",
            "120 s",
            "cm^3/rev", // D
            "9 13",
            "0.02",
            "[11.2, 11.4]",
            "", // c
            "",
            "",
            "-0.03 to inf",
            "", // q0
            "",
            "",
            "",
            "", // no other equation
            "U");

    @TempDir
    private Path folder;

    private final ByteArrayOutputStream out = new ByteArrayOutputStream();
    private final ByteArrayOutputStream err = new ByteArrayOutputStream();

    private int answer(Path sheet, List<String> answers) {
        InputStream before = System.in;
        String typed = answers.isEmpty() ? "" : String.join("\n", answers) + "\n";
        System.setIn(new ByteArrayInputStream(typed.getBytes(StandardCharsets.UTF_8)));
        try {
            return Main.run(
                    new String[] {"sheet", sheet.toString()},
                    new Output(new PrintStream(out), new PrintStream(err), false),
                    Map.of());
        } finally {
            System.setIn(before);
        }
    }

    private String said() {
        return out.toString(StandardCharsets.UTF_8);
    }

    private String errors() {
        return err.toString(StandardCharsets.UTF_8);
    }

    @Test
    void theAnswersBecomeASheetThatReadsTheFile() {
        Path sheet = folder.resolve("pump.toml");
        assertThat(answer(sheet, PUMP)).as(said() + errors()).isZero();
        assertThat(sheet).content().isEqualTo("""
                title = "Gear-pump slip"
                item = "pump 0417"

                [channels]
                n = { unit = "rev/min" }
                dp = { unit = "bar" }
                Q = { unit = "L/min", noise = 0.06 }

                [[relations]]
                equation = "Q = D*n + c*dp + q0"
                memory = "120 s"

                [relations.unknowns]
                D = { unit = "cm^3/rev", plausible = [9, 13], wanted = 0.02, limits = [11.2, 11.4] }
                c = { limits = [-0.03, inf] }

                [verdict]
                rule = "U"
                """);
        assertThat(SheetReader.read(sheet).mistakes()).isEmpty();
        assertThat(said())
                .contains("| 0.0,1498,59.9,15.842")
                .contains("dp = { unit = \"bar\" }    (reads 59.9 bar)")
                .contains("Next: benchtrue replay --sheet " + sheet + " replays/gear-pump/readings.csv");
        assertThat(errors()).isEmpty();
    }

    @Test
    void aMistakeIsShownWithItsPlaceAndAskedAgain() {
        List<String> answers = new ArrayList<>(PUMP);
        answers.add(27, "sure");
        answers.add(16, "0,02");
        answers.add(15, "13 9");
        answers.add(14, "cm^3/bar");
        answers.add(13, "for ever");
        answers.add(12, "Q = D*n*c");
        answers.add(12, "Q = D*n + ");
        answers.add(4, "revs");
        answers.add(3, "ln");
        answers.add(2, "nothing.csv");
        answers.add(0, "");
        Path sheet = folder.resolve("pump.toml");
        assertThat(answer(sheet, answers)).as(said() + errors()).isZero();
        assertThat(said())
                .contains("a title is needed")
                .contains("\"nothing.csv\" is neither a file")
                .contains("is a function of equations")
                .contains("revs")
                .contains("  Q = D*n*c\n         ^ not linear: the unknowns D and c multiply each other")
                .contains("\"for ever\" is no memory")
                .contains("the response is in L/min")
                .contains("\"13 9\" must be two numbers")
                .contains("\"0,02\" is no number")
                .contains("\"sure\" is no rule");
        assertThat(SheetReader.read(sheet).mistakes()).isEmpty();
    }

    @Test
    void whereTheAnswersEndNothingIsWritten() {
        for (int count : new int[] {0, 2, 5, 12, 20, PUMP.size() - 1}) {
            Path sheet = folder.resolve("half.toml");
            assertThat(answer(sheet, PUMP.subList(0, count))).isEqualTo(2);
            assertThat(sheet).doesNotExist();
        }
        assertThat(errors()).contains("nothing was written");
    }

    @Test
    void aFileThatIsThereStays() throws Exception {
        Path sheet = Files.writeString(folder.resolve("mine.toml"), "mine");
        assertThat(answer(sheet, PUMP)).isEqualTo(2);
        assertThat(sheet).hasContent("mine");
        assertThat(errors()).contains("mine.toml: is there already and stays as it is");
    }

    @Test
    void aLineOfAPortIsCutIntoItsFieldsAndTried() {
        Path sheet = folder.resolve("cell.toml");
        List<String> answers = List.of(
                "Cell",
                "",
                "/dev/ttyNONE0",
                "19200",
                "7E1",
                "7;20,1;1,25",
                "-",
                "T",
                "degC",
                "",
                "I",
                "A",
                "0.01",
                "T = R*I^2 + T0",
                "",
                "",
                "",
                "",
                "",
                "",
                "",
                "",
                "",
                "");
        assertThat(answer(sheet, answers)).as(said() + errors()).isZero();
        assertThat(sheet).content().endsWith("""
                [line]
                port = "/dev/ttyNONE0"
                baud = 19200
                frame = "7E1"
                separator = ";"
                decimal_comma = true
                fields = ["-", "T", "I"]
                """);
        assertThat(said())
                .contains("/dev/ttyNONE0: there is no such port")
                .contains("20.1")
                .contains("Next: benchtrue watch " + sheet);
        assertThat(said()).doesNotContain("not understood");
    }

    @Test
    void readingsWhoseHeaderDoesNotFitAreToldWhatTheyNeed() throws Exception {
        Path readings = Files.writeString(folder.resolve("old.csv"), "0,1.0,2.1\n1,2.0,3.9\n");
        Path sheet = folder.resolve("old.toml");
        List<String> answers = List.of(
                "Old",
                "",
                readings.toString(),
                "time",
                "x",
                "V",
                "",
                "y",
                "V",
                "",
                "y = a*x",
                "all",
                "",
                "",
                "",
                "",
                "");
        assertThat(answer(sheet, answers)).as(said() + errors()).isZero();
        assertThat(said()).contains("do not fit the sheet yet").contains("begin the file with a header row: time,x,y");
    }

    @Test
    void textsAreQuotedAsTomlNeedsIt() {
        assertThat(SheetLines.quoted("6\" pipe \\ \t")).isEqualTo("\"6\\\" pipe \\\\ \\u0009\"");
        assertThat(SheetLines.key("Δp")).isEqualTo("\"Δp\"");
        assertThat(SheetLines.key("dp_1")).isEqualTo("dp_1");
    }
}
