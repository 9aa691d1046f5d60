package benchtrue.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.ByteArrayOutputStream;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class RehearseCommandTest {
    private static final String RIG = "replays/prt-self-heating/sheet.toml";

    @TempDir
    Path folder;

    private final ByteArrayOutputStream out = new ByteArrayOutputStream();
    private final ByteArrayOutputStream err = new ByteArrayOutputStream();

    private int run(String... args) {
        return Main.run(args, new Output(new PrintStream(out), new PrintStream(err), false), Map.of());
    }

    private String errors() {
        return err.toString(StandardCharsets.UTF_8);
    }

    @Test
    void aShippedRunIsMadeAgainFromItsSheet() {
        Path made = folder.resolve("run");
        assertThat(run("rehearse", RIG, "--out", made.toString())).isZero();
        assertThat(made.resolve("readings.csv"))
                .hasSameBinaryContentAs(Path.of("replays/prt-self-heating/readings.csv"));
        assertThat(out.toString(StandardCharsets.UTF_8)).startsWith("900 readings with seed 86 in ");
        assertThat(run("rehearse", RIG, "--seed", "7", "--out", made.toString()))
                .isEqualTo(2);
        assertThat(errors()).contains("the folder holds other readings");
    }

    @Test
    void aSheetWithoutRehearsalIsRefusedWithWhatToDo() throws Exception {
        Path sheet = Files.writeString(folder.resolve("plain.toml"), """
                title = "plain"
                [channels]
                x = { unit = "V" }
                y = { unit = "V" }
                [[relations]]
                equation = "y = a*x"
                """);
        assertThat(run(
                        "rehearse",
                        sheet.toString(),
                        "--out",
                        folder.resolve("run").toString()))
                .isEqualTo(2);
        assertThat(errors()).contains("has no [rehearsal]; add one");
        assertThat(folder.resolve("run")).doesNotExist();
    }
}
