package benchtrue.cli;

import static org.assertj.core.api.Assertions.assertThat;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.stream.Stream;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.Timeout;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** The run screen in a real terminal. */
@Tag("end-to-end")
@Timeout(180)
final class TerminalTest {
    private static final String RIG =
            Path.of("replays", "gear-pump").toAbsolutePath().toString();

    @TempDir
    private Path folder;

    @BeforeAll
    static void needsTmux() {
        assumeTrue(Stream.of(System.getenv("PATH").split(":", -1)).anyMatch(p -> Files.exists(Path.of(p, "tmux"))));
    }

    private Tmux replay(int width, int height) throws IOException {
        return new Tmux(folder, width, height, "", "replay " + RIG);
    }

    @Test
    void theFirstRigFromStartToSummaryByKeysAlone() throws IOException {
        try (Tmux tmux = replay(120, 36)) {
            tmux.awaitText("R E P L A Y  ×20");
            tmux.type("n");
            tmux.awaitText("PAUSED 6:20.8");
            assertThat(tmux.screen()).contains("1 ALARM").contains("cause not separable yet");
            tmux.type("a");
            tmux.awaitText("Acknowledge alarm 1");
            tmux.type("gauge looked at");
            tmux.press("Enter");
            tmux.awaitText("[step]");
            tmux.type("+++++p");
            tmux.awaitText("ENDED 9:59.8");
            tmux.awaitText("Closing summary");
            tmux.press("Escape");
            tmux.awaitText("cause c");
            tmux.type("q");
            tmux.awaitText("exit=3");
            assertThat(tmux.printed())
                    .contains("Recursive beside batch QR")
                    .contains("They agree")
                    .contains("gauge looked at");
            assertThat(tmux.restored()).isTrue();
        }
    }

    @Test
    void everyKeyDoesWhatItsPageSays() throws IOException {
        try (Tmux tmux = replay(120, 36)) {
            tmux.awaitText("R E P L A Y");
            tmux.type("p");
            tmux.awaitText("PAUSED");
            tmux.type("?");
            String help = tmux.awaitText("Freeze the display");
            assertThat(help).contains("Shelve the chosen alarm");
            tmux.press("Escape");
            tmux.awaitNoText("Freeze the display");
            tmux.type("g");
            tmux.awaitText("Go to a time");
            tmux.type("300");
            tmux.press("Enter");
            tmux.awaitText("PAUSED 5:00.0");
            tmux.type(".");
            tmux.awaitText("PAUSED 5:00.2");
            tmux.type("+");
            tmux.awaitText("×50");
            tmux.type("-");
            tmux.awaitText("×20");
            tmux.type("u");
            tmux.awaitText("Path of c");
            tmux.type("v");
            tmux.awaitText("Bench sheet");
            tmux.press("Escape");
            tmux.awaitText("Path of c");
            tmux.type("m");
            tmux.awaitText("A mark in the record");
            tmux.type("oil warm");
            tmux.press("Enter");
            tmux.type("y");
            tmux.awaitText("Memory of the estimator");
            tmux.type("60 s");
            tmux.press("Enter");
            tmux.awaitText("memory 60 s");
            tmux.type("h");
            tmux.awaitText("estimates are held");
            tmux.type("h");
            tmux.awaitNoText("estimates are held");
            tmux.type("r");
            tmux.awaitText("your name");
            tmux.type("K. Ito");
            tmux.press("Enter");
            tmux.awaitText("reason");
            tmux.type("serviced");
            tmux.press("Enter");
            tmux.awaitNoText("Adopt the present model");
            tmux.type("b");
            tmux.awaitText("Begin a new segment");
            tmux.type("hose changed");
            tmux.press("Enter");
            tmux.awaitNoText("Begin a new segment");
            tmux.type(" ");
            tmux.awaitText("FROZEN");
            tmux.type(" ");
            tmux.awaitNoText("FROZEN");
            tmux.press("Tab", "Tab", "Enter");
            tmux.awaitNoText("Path of");
            tmux.press("Escape");
            tmux.awaitText("Path of c");
            tmux.press("BTab", "Down");
            tmux.awaitText("Path of q0");
            tmux.type("l");
            tmux.type("e");
            tmux.awaitText("Closing summary");
            tmux.press("PageDown", "Up", "Escape");
            tmux.type("n");
            tmux.awaitText("1 ALARM");
            tmux.type("z");
            tmux.awaitText("Shelve alarm");
            tmux.type("10 min");
            tmux.press("Enter");
            tmux.type("known");
            tmux.press("Enter");
            tmux.awaitText("shelved");
            tmux.type("0");
            tmux.awaitNoText("shelved");
            tmux.type("q");
            tmux.awaitText("exit=");
            assertThat(tmux.restored()).isTrue();
        }
    }

    @Test
    void withoutAFolderItOffersWhatThereIs() throws IOException {
        try (Tmux tmux = new Tmux(folder, 100, 30, "", "replay")) {
            tmux.awaitText("Which (1 to 8)?");
            String list = tmux.screen();
            int number = list.substring(0, list.indexOf("replays/gear-pump"))
                            .lines()
                            .toList()
                            .size()
                    - 1;
            tmux.type("99");
            tmux.press("Enter");
            tmux.type(Integer.toString(number));
            tmux.press("Enter");
            tmux.awaitText("R E P L A Y");
            tmux.awaitText("Gear-pump");
            tmux.type("q");
            tmux.awaitText("exit=");
        }
    }

    @Test
    void followsTheWindow() throws IOException {
        try (Tmux tmux = replay(120, 36)) {
            tmux.awaitText("R E P L A Y");
            tmux.resize(80, 24);
            tmux.awaitText("Estimates");
            tmux.resize(50, 12);
            tmux.awaitText("The run goes on");
            tmux.resize(160, 50);
            tmux.awaitText("g go to");
            tmux.type("q");
            tmux.awaitText("exit=");
            assertThat(tmux.restored()).isTrue();
        }
    }

    @ParameterizedTest
    @ValueSource(strings = {"TERM", "HUP", "INT"})
    void aSignalEndsItAsItsOwnKeyDoes(String signal) throws Exception {
        try (Tmux tmux = replay(100, 30)) {
            tmux.awaitText("settl");
            tmux.signal(signal);
            tmux.awaitText("exit=");
            assertThat(tmux.printed()).contains("TEST RECORD").contains("Recursive beside batch QR");
            assertThat(tmux.restored()).isTrue();
        }
    }

    @Test
    void ctrlCClosesAndCtrlZDoesNotSuspend() throws IOException {
        try (Tmux tmux = replay(100, 30)) {
            tmux.awaitText("SETTL");
            tmux.press("C-z");
            tmux.type("p");
            tmux.awaitText("PAUSED");
            tmux.press("C-c");
            tmux.awaitText("exit=");
            assertThat(tmux.printed()).contains("TEST RECORD");
            assertThat(tmux.restored()).isTrue();
        }
    }

    @Test
    void whenTheRecordIsTakenAwayTheTerminalIsStillRestored() throws IOException {
        Path run = Files.createDirectory(folder.resolve("run"));
        for (String file : new String[] {"sheet.toml", "readings.csv"}) {
            Files.copy(Path.of(RIG, file), run.resolve(file));
        }
        try (Tmux tmux = new Tmux(folder, 100, 30, "", "replay " + run)) {
            tmux.awaitText("SETTL");
            Files.delete(run.resolve("readings.csv"));
            tmux.type("0");
            tmux.awaitText("exit=5");
            assertThat(tmux.printed()).contains("readings.csv");
            assertThat(tmux.restored()).isTrue();
        }
    }

    @Test
    void drawsInAsciiWhereTheLocaleHasNothingElse() throws IOException {
        try (Tmux tmux = new Tmux(folder, 100, 30, "LC_ALL=C", "replay " + RIG)) {
            String screen = tmux.awaitText("R E P L A Y  x20");
            assertThat(screen.chars()).allMatch(c -> c < 128);
            tmux.type("q");
            tmux.awaitText("exit=");
        }
    }

    @ParameterizedTest
    @ValueSource(strings = {"TERM=dumb", "TERM="})
    void plainLinesWherePanesCannotBeDrawn(String environment) throws IOException {
        try (Tmux tmux = new Tmux(folder, 100, 50, environment, "replay " + RIG)) {
            tmux.awaitText("exit=3");
            assertThat(tmux.printed()).contains("RAISED step").contains("TEST RECORD");
        }
    }

    @Test
    void aClosedTerminalEndsTheRunAndItsFilesAreWhole() throws Exception {
        Path out = folder.resolve("out");
        Tmux tmux = new Tmux(folder, 100, 30, "", "replay " + RIG + " --out " + out);
        tmux.awaitText("SETTL");
        long pid = tmux.pid();
        tmux.close();
        ProcessHandle.of(pid).ifPresent(p -> p.onExit().join());
        assertThat(out.resolve("summary.json")).isNotEmptyFile();
        assertThat(Files.readString(out.resolve("estimates.csv"))).endsWith("\n");
    }
}
