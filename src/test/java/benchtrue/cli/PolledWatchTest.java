package benchtrue.cli;

import static org.assertj.core.api.Assertions.assertThat;

import benchtrue.source.TerminalPair;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Duration;
import java.util.concurrent.TimeUnit;
import org.awaitility.Awaitility;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Timeout;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** The finished jar at both ends of a line: one is the rig, the other watches it. */
@Tag("end-to-end")
@Timeout(120)
final class PolledWatchTest {
    private static final String SCPI = """
            [poll]
            kind = "scpi"
            period = 0.05
            [poll.channels]
            I = { query = "SENS:CURR:DATA?" }
            V = { query = "FETC?" }
            """;

    private static final String MODBUS = """
            [poll]
            kind = "modbus"
            period = 0.05
            [poll.channels]
            I = { address = 1, register = 107, type = "int16", scale = 0.001 }
            V = { address = 1, register = 108, type = "float32", order = "CDAB" }
            """;

    private static final String REHEARSAL = """
            [rehearsal]
            rate = 50
            duration = "5 min"
            [rehearsal.truth]
            R = 2
            V0 = 0.1
            [rehearsal.channels]
            I = { stairs = [1, 2, 3], dwell = "1 s", noise = 0.001 }
            V = { noise = 0.002 }
            """;

    @TempDir
    private Path folder;

    /** Without a poll the rig sends lines. */
    @ParameterizedTest
    @ValueSource(strings = {SCPI, MODBUS, ""})
    void aRunEndsSoundlyAndReplaysAsItWas(String poll) throws Exception {
        Path sheet = Files.writeString(folder.resolve("rig.toml"), Bench.SHEET + poll + REHEARSAL);
        Path run = folder.resolve("run");
        Path out = folder.resolve("out.txt");
        Path rigOut = folder.resolve("rig.txt");
        try (TerminalPair pair = new TerminalPair(folder)) {
            Process rig = Bench.start(rigOut, "rehearse", sheet.toString(), "--onto", pair.far());
            Process watch = Bench.start(
                    out, "watch", sheet.toString(), "--plain", "--port", pair.near(), "--out", run.toString());
            Awaitility.await()
                    .atMost(Duration.ofSeconds(60))
                    .until(() -> Files.exists(run.resolve("readings.csv"))
                            && Bench.recorded(run).size() > 100);
            interrupt(watch);
            interrupt(rig);
        }
        assertThat(Files.readString(out)).contains("ended, nothing found").doesNotContain("LOST");
        assertThat(Files.readString(rigOut)).doesNotContain("check the port");
        Path again = folder.resolve("again");
        Bench.run(folder.resolve("replay.txt"), "replay", run.toString(), "--out", again.toString(), "--yes");
        assertThat(again.resolve("estimates.csv")).hasSameBinaryContentAs(run.resolve("estimates.csv"));
    }

    /** As Ctrl-C. */
    private static void interrupt(Process process) throws Exception {
        new ProcessBuilder("kill", "-TERM", Long.toString(process.pid()))
                .start()
                .waitFor();
        assertThat(process.waitFor(60, TimeUnit.SECONDS)).isTrue();
    }
}
