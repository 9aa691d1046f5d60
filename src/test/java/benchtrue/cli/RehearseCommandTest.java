package benchtrue.cli;

import static org.assertj.core.api.Assertions.assertThat;
import static org.awaitility.Awaitility.await;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.InputStream;
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

    @Test
    void linesComeOutOfAPseudoTerminalAsRawLogHasThem() throws Exception {
        assumeTrue(Files.isExecutable(Path.of("/usr/bin/socat")), "needs socat to make pseudo-terminals");
        Path sheet = Files.writeString(folder.resolve("quick.toml"), """
                title = "quick"
                [channels]
                x = { unit = "V", resolution = 0.1 }
                y = { unit = "V", resolution = 0.1 }
                [[relations]]
                equation = "y = a*x"
                [line]
                separator = ";"
                decimal_comma = true
                [rehearsal]
                rate = 100
                duration = 0.2
                [rehearsal.truth]
                a = 2
                [rehearsal.channels]
                x = { ramps = [[0, 0], [0.2, 2]] }
                """);
        Path near = folder.resolve("near");
        Path received = folder.resolve("received");
        Process pair = new ProcessBuilder(
                        "socat", "-u", "pty,raw,echo=0,link=" + near, "open:" + received + ",creat,append")
                .start();
        try {
            await().until(() -> Files.exists(near));
            long start = System.nanoTime();
            assertThat(run("rehearse", sheet.toString(), "--onto", near.toString()))
                    .isZero();
            assertThat(System.nanoTime() - start).as("real pace").isGreaterThan(190_000_000L);
            await().until(() -> Files.exists(received) && Files.size(received) >= 180);
            assertThat(Files.readString(received))
                    .startsWith("0,0;0,0\r\n0,1;0,2\r\n")
                    .endsWith("1,9;3,8\r\n");
        } finally {
            pair.destroy();
            pair.waitFor();
        }
    }

    @Test
    void aRealPortWantsAYes() {
        InputStream before = System.in;
        System.setIn(new ByteArrayInputStream("no\n".getBytes(StandardCharsets.UTF_8)));
        try {
            assertThat(run("rehearse", RIG, "--onto", "/dev/ttyS77")).isEqualTo(2);
        } finally {
            System.setIn(before);
        }
        assertThat(out.toString(StandardCharsets.UTF_8)).contains("may obey these lines as commands");
        assertThat(errors()).contains("nothing was sent");
        assertThat(run("rehearse", RIG, "--onto", "/dev/ttyS77", "--yes")).isEqualTo(5);
        assertThat(errors()).contains("/dev/ttyS77: there is no such port");
    }
}
