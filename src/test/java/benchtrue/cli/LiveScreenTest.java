package benchtrue.cli;

import static org.assertj.core.api.Assertions.assertThat;

import benchtrue.source.TerminalPair;
import java.io.IOException;
import java.io.OutputStream;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.concurrent.Executors;
import java.util.concurrent.ScheduledExecutorService;
import java.util.concurrent.TimeUnit;
import java.util.concurrent.atomic.AtomicInteger;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.Timeout;
import org.junit.jupiter.api.io.TempDir;

/** A live run in panes: a real terminal on one side, a real pseudo-terminal pair on the other. */
@Tag("end-to-end")
@Timeout(180)
final class LiveScreenTest {
    @TempDir
    private Path folder;

    @Test
    @SuppressWarnings({"try", "FutureReturnValueIgnored"}) // the cable is pulled in the middle
    void fromTheSetUpToTheClosedRun() throws Exception {
        Path sheet = Files.writeString(folder.resolve("resistor.toml"), Bench.SHEET + POINTS);
        Path run = folder.resolve("run");
        ScheduledExecutorService instrument = Executors.newSingleThreadScheduledExecutor();
        try (TerminalPair pair = new TerminalPair(folder);
                OutputStream far = Files.newOutputStream(Path.of(pair.far()));
                Tmux tmux =
                        new Tmux(folder, 120, 36, "", "watch " + sheet + " --port " + pair.near() + " --out " + run)) {
            AtomicInteger line = new AtomicInteger();
            instrument.scheduleAtFixedRate(() -> send(far, line), 0, 20, TimeUnit.MILLISECONDS);
            tmux.awaitText("Set-up: warm-up");
            assertThat(tmux.screen()).contains("L I V E").contains("AGO");
            tmux.press("Enter");
            tmux.awaitText("Set-up: zero");
            tmux.type("s");
            tmux.awaitText("Skip the check: zero");
            tmux.type("no zero on this bench");
            tmux.press("Enter");
            tmux.awaitText("Set-up: sign");
            tmux.press("Enter");
            tmux.awaitText("I ");
            tmux.awaitText(" s");
            tmux.press("Enter");
            tmux.awaitText("Set-up: quiet minute");
            tmux.press("Enter");
            tmux.awaitText("of 60 s");
            tmux.awaitText("V noise");
            tmux.type("s");
            tmux.awaitText("Skip the check: quiet minute");
            tmux.type("in a hurry");
            tmux.press("Enter");
            tmux.awaitText("Set-up: points");
            tmux.awaitText("[x] I = 1 A");
            assertThat(tmux.screen()).contains("[ ] I = 9 A");
            tmux.press("Enter");
            tmux.awaitText("planned next: I = 9 A");
            tmux.type("m");
            tmux.awaitText("A mark in the record");
            tmux.type("all well");
            tmux.press("Enter");
            tmux.type("q");
            tmux.awaitText("Close the live run?");
            tmux.type("no");
            tmux.press("Enter");
            tmux.awaitNoText("Close the live run?");
            instrument.shutdownNow();
            pair.close();
            tmux.awaitText("LINE LOST");
            tmux.type("q");
            tmux.awaitText("Close the live run?");
            tmux.type("yes");
            tmux.press("Enter");
            tmux.awaitText("exit=5");
            assertThat(tmux.printed()).contains("TEST RECORD").contains("all well");
            assertThat(tmux.restored()).isTrue();
        } finally {
            instrument.shutdownNow();
        }
        assertThat(run.resolve("acts.csv"))
                .content()
                .contains("set-up,warm-up,")
                .contains("set-up,zero skipped,no zero on this bench")
                .contains("set-up,quiet minute skipped,in a hurry")
                .contains("mark,,all well");
        Path again = folder.resolve("again");
        Bench.run(folder.resolve("replay.txt"), "replay", run.toString(), "--out", again.toString());
        assertThat(again.resolve("estimates.csv")).hasSameBinaryContentAs(run.resolve("estimates.csv"));
        assertThat(again.resolve("acts.csv")).hasSameBinaryContentAs(run.resolve("acts.csv"));
    }

    private static final String POINTS = """

            [[points]]
            set = { I = 1 }
            dwell = "1 s"

            [[points]]
            set = { I = 9 }
            dwell = "1 s"
            """;

    private static void send(OutputStream far, AtomicInteger line) {
        try {
            int i = line.getAndIncrement();
            far.write(Bench.lines(i, i + 1));
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }
}
