package benchtrue.cli;

import static org.assertj.core.api.Assertions.assertThat;

import benchtrue.sheet.BenchSheet;
import benchtrue.sheet.SheetReader;
import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Objects;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import picocli.CommandLine;

/** A first sheet by answering questions. */
final class SheetCommandTest {
    @TempDir
    private Path folder;

    private final ByteArrayOutputStream printed = new ByteArrayOutputStream();

    private int answer(Path sheet, String... answers) {
        PrintStream out = new PrintStream(printed, true, StandardCharsets.UTF_8);
        String text = String.join("\n", answers) + "\n";
        SheetCommand command = new SheetCommand(
                new Output(out, out, false), new ByteArrayInputStream(text.getBytes(StandardCharsets.UTF_8)));
        CommandLine line = new CommandLine(command);
        line.setExecutionExceptionHandler((e, l, r) -> {
            out.println(e.getMessage());
            return 2;
        });
        return line.execute(sheet.toString());
    }

    private String printed() {
        return printed.toString(StandardCharsets.UTF_8);
    }

    @Test
    void asksAgainWhereAnAnswerIsNoneAndWritesASheetThatCanBeRead() throws IOException {
        Path readings = Files.writeString(folder.resolve("r.csv"), "time,I [mA],V,T\n0,1,2,20\n");
        Path sheet = folder.resolve("new.toml");
        int status = answer(
                sheet,
                "Coil \"A\"",
                "K7",
                readings.toString(),
                "",
                "mA", // I
                "",
                "V",
                "Volt", // no unit
                "",
                "V",
                "V",
                "0.01",
                "-", // T is left out
                "V = R*I*L + V0", // not linear
                "",
                "V = R*I + V0",
                "60 s");
        assertThat(printed())
                .contains("new.toml is written")
                .contains("replay --sheet")
                .contains("linear");
        assertThat(status).isZero();
        BenchSheet read = Objects.requireNonNull(SheetReader.read(sheet).sheet());
        assertThat(read.title()).isEqualTo("Coil \"A\"");
        assertThat(read.channels()).hasSize(2);
        assertThat(read.channels().get(1).noise()).isEqualTo(0.01);
        assertThat(read.groups().get(0).relations().get(0).relation().text()).isEqualTo("V = R*I + V0");
    }

    @Test
    void aPortThatIsNotThereDoesNotEndTheQuestions() throws IOException {
        Path sheet = folder.resolve("new.toml");
        int status = answer(
                sheet,
                "Coil",
                "",
                folder.resolve("none").toString(),
                "115200",
                ";",
                ",",
                "3",
                "I",
                "A",
                "",
                "-",
                "V",
                "V",
                "",
                "V = R*I + V0",
                "");
        assertThat(printed()).contains("there is no such port");
        assertThat(status).isZero();
        BenchSheet read = Objects.requireNonNull(SheetReader.read(sheet).sheet());
        assertThat(read.line()).isNotNull();
        assertThat(read.line().decimalComma()).isTrue();
        assertThat(read.line().dialect().fields()).containsExactly("I", "-", "V");
    }

    @Test
    void writesNothingWhereTheAnswersEndAndNeverOverAFile() throws IOException {
        Path sheet = folder.resolve("new.toml");
        assertThat(answer(sheet, "Coil")).isEqualTo(2);
        assertThat(printed()).contains("nothing was written");
        assertThat(sheet).doesNotExist();
        Files.writeString(sheet, "mine");
        assertThat(answer(sheet, "Coil")).isEqualTo(2);
        assertThat(sheet).hasContent("mine");
    }
}
