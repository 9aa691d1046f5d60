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
            assertThat(run("rehearse", sheet.toString(), "--onto", near.toString(), "--pace", "max", "--garble", "1"))
                    .isZero();
            await().until(() -> Files.exists(received) && Files.size(received) >= 360);
            String sent = Files.readString(received, StandardCharsets.ISO_8859_1);
            assertThat(sent.substring(0, 180))
                    .startsWith("0,0;0,0\r\n0,1;0,2\r\n")
                    .endsWith("1,9;3,8\r\n");
            assertThat(sent).hasSize(360);
            for (int line = 0; line < 180; line += 9) {
                assertThat(sent.substring(180 + line, 189 + line)).isNotEqualTo(sent.substring(line, 9 + line));
            }
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

    @Test
    void optionsOfThePortAreRefusedWhereTheyMeanNothing() throws Exception {
        String run = folder.resolve("run").toString();
        assertThat(run("rehearse", RIG, "--out", run, "--pace", "2")).isEqualTo(2);
        assertThat(errors()).contains("--pace, --cut and --garble are for --onto PORT");
        assertThat(run("rehearse", RIG, "--onto", "none", "--pace", "0")).isEqualTo(2);
        assertThat(errors()).contains("--pace: \"0\" is neither a number above 0 nor max");
        assertThat(run("rehearse", RIG, "--onto", "none", "--cut", "5:60")).isEqualTo(2);
        assertThat(errors()).contains("--cut: \"5:60\" must be two numbers of seconds, the longer first, as in 60:5");
        assertThat(run("rehearse", RIG, "--onto", "none", "--cut", "5")).isEqualTo(2);
        assertThat(run("rehearse", RIG, "--onto", "none", "--garble", "1.1")).isEqualTo(2);
        assertThat(errors()).contains("--garble: \"1.1\" is no probability; give a number from 0 to 1");
        assertThat(folder.resolve("run")).doesNotExist();
    }

    @Test
    void aRigThatIsAskedNeedsAPace() throws Exception {
        Path sheet = Files.writeString(folder.resolve("asked.toml"), """
                title = "asked"
                [channels]
                x = { unit = "V", resolution = 0.1 }
                y = { unit = "V", resolution = 0.1 }
                [[relations]]
                equation = "y = a*x"
                [line]
                baud = 9600
                [poll]
                kind = "scpi"
                [poll.channels]
                x = { query = "X?" }
                y = { query = "Y?" }
                [rehearsal]
                rate = 10
                duration = 1
                [rehearsal.truth]
                a = 2
                [rehearsal.channels]
                x = { ramps = [[0, 0], [1, 2]] }
                """);
        assertThat(run("rehearse", sheet.toString(), "--onto", "none", "--pace", "max"))
                .isEqualTo(2);
        assertThat(errors()).contains("--pace max: a rig that is asked needs a pace; give a number");
    }
}
