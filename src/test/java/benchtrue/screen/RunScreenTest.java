package benchtrue.screen;

import static org.assertj.core.api.Assertions.assertThat;

import benchtrue.run.Closing;
import benchtrue.run.Control;
import benchtrue.run.Desk;
import benchtrue.run.EstimateRow;
import benchtrue.run.Event;
import benchtrue.run.Options;
import benchtrue.run.RunListener;
import benchtrue.run.Runner;
import benchtrue.run.Setup;
import benchtrue.run.Shots;
import benchtrue.run.SourceMaker;
import benchtrue.run.TimedAct;
import benchtrue.source.Opened;
import benchtrue.source.ReplaySource;
import com.googlecode.lanterna.TerminalSize;
import com.googlecode.lanterna.input.KeyStroke;
import com.googlecode.lanterna.input.KeyType;
import com.googlecode.lanterna.screen.TerminalScreen;
import com.googlecode.lanterna.terminal.virtual.DefaultVirtualTerminal;
import java.io.IOException;
import java.nio.file.Path;
import java.time.Duration;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Locale;
import java.util.concurrent.FutureTask;
import org.awaitility.Awaitility;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.Timeout;

/** The keys, on the library's terminal without a window, with a real replay behind it. */
@Timeout(120)
final class RunScreenTest {
    private static final Path READINGS = Path.of("replays", "gear-pump", "readings.csv");

    private final DefaultVirtualTerminal terminal = new DefaultVirtualTerminal(new TerminalSize(120, 36));
    private final Desk desk = new Desk();
    private final List<TimedAct> acts = Collections.synchronizedList(new ArrayList<>());
    private FutureTask<Closing> run;
    private TerminalScreen screen;
    private RunScreen panes;

    @BeforeEach
    void startTheReplay() throws IOException {
        Locale.setDefault(Locale.ROOT);
        screen = new TerminalScreen(terminal);
        screen.startScreen();
        panes = new RunScreen(screen, desk, false, "Bench sheet of the pump", c -> "Summary of " + c.sheetTitle());
        Setup setup = new Setup(
                Shots.sheet("gear-pump"), false, "replay", "gear-pump", null, Collections.singletonList(null));
        SourceMaker maker = () -> ((Opened.Ready) ReplaySource.open(READINGS, Shots.sheet("gear-pump"))).source();
        Runner runner = new Runner(setup, maker, maker, new Options(20, true, List.of()), new Recorder(), desk);
        run = new FutureTask<>(runner::run);
        new Thread(run, "run").start();
        awaitText("R E P L A Y");
    }

    @AfterEach
    void stop() throws Exception {
        desk.send(new Control.Close());
        run.get();
        screen.stopScreen();
    }

    private final class Recorder implements RunListener {
        @Override
        public void reading(EstimateRow row) {}

        @Override
        public void event(Event event) {}

        @Override
        public void act(TimedAct act) {
            acts.add(act);
        }

        @Override
        public void closed(Closing closing) {}
    }

    private void type(String keys) {
        keys.chars().forEach(c -> terminal.addInput(new KeyStroke((char) c, false, false)));
    }

    private void press(KeyType key) {
        terminal.addInput(new KeyStroke(key));
    }

    private String text() {
        StringBuilder text = new StringBuilder();
        TerminalSize size = terminal.getTerminalSize();
        for (int y = 0; y < size.getRows(); y++) {
            for (int x = 0; x < size.getColumns(); x++) {
                text.append(terminal.getCharacter(x, y).getCharacterString());
            }
            text.append('\n');
        }
        return text.toString();
    }

    private void awaitText(String words) {
        Awaitility.await()
                .atMost(Duration.ofSeconds(20))
                .pollInterval(Duration.ofMillis(20))
                .until(() -> {
                    panes.turn(System.nanoTime());
                    return text().contains(words);
                });
    }

    private void awaitNoText(String words) {
        Awaitility.await()
                .atMost(Duration.ofSeconds(20))
                .pollInterval(Duration.ofMillis(20))
                .until(() -> {
                    panes.turn(System.nanoTime());
                    return !text().contains(words);
                });
    }

    private void goTo(String time) {
        type("g");
        awaitText("Go to a time");
        type(time);
        press(KeyType.Enter);
    }

    @Test
    void goesToATimeOnToTheAlarmAndBackToTheStart() {
        goTo("6:15");
        awaitText("PAUSED 6:15.0");
        type("n");
        awaitText("PAUSED 6:20.8");
        awaitText("1 ALARM");
        type("0");
        awaitNoText("PAUSED");
        type("p");
        awaitText("PAUSED 0:");
        awaitText("no alarm");
    }

    @Test
    void stepsOneReadingAtATime() {
        goTo("100");
        awaitText("PAUSED 1:40.0");
        type(".");
        awaitText("PAUSED 1:40.2");
        type(".");
        awaitText("PAUSED 1:40.4");
    }

    @Test
    void changesThePace() {
        type("+");
        awaitText("×50");
        type("--");
        awaitText("×10");
    }

    @Test
    void acknowledgesWithAComment() {
        goTo("381");
        awaitText("1 ALARM");
        type("a");
        awaitText("Acknowledge alarm 1");
        type("gauge lookedx");
        press(KeyType.Backspace);
        press(KeyType.Enter);
        awaitText("[1 alarm]");
        press(KeyType.Tab);
        press(KeyType.Tab);
        press(KeyType.Tab);
        press(KeyType.Tab);
        press(KeyType.Enter);
        awaitText("comment   gauge looked ".stripTrailing());
        press(KeyType.Escape);
        awaitNoText("comment   gauge");
    }

    @Test
    void everyActIsToldWithItsReading() {
        goTo("200");
        awaitText("PAUSED 3:20.0");
        type("m");
        awaitText("A mark in the record");
        type("oil at 40 degC");
        press(KeyType.Enter);
        type("y");
        awaitText("Memory of the estimator");
        type("sixty");
        press(KeyType.Enter);
        awaitText("(a memory is");
        type("60 s");
        press(KeyType.Enter);
        awaitText("memory 60 s");
        type("h");
        awaitText("estimates are held");
        type("h");
        awaitNoText("estimates are held");
        type("b");
        awaitText("Begin a new segment");
        type("hose changed");
        press(KeyType.Enter);
        type("r");
        awaitText("your name");
        type("K. Ito");
        press(KeyType.Enter);
        type("after the service");
        press(KeyType.Enter);
        Awaitility.await().until(() -> {
            panes.turn(System.nanoTime());
            return acts.size() == 6;
        });
        assertThat(acts).allSatisfy(act -> assertThat(act.reading()).isEqualTo(1001));
        assertThat(acts.stream().map(a -> a.act().getClass().getSimpleName()))
                .containsExactly("Mark", "ChangeMemory", "Hold", "Release", "NewSegment", "Adopt");
    }

    @Test
    void escapeLeavesAQuestionUnanswered() {
        type("m");
        awaitText("A mark in the record");
        press(KeyType.Escape);
        awaitNoText("A mark in the record");
        assertThat(acts).isEmpty();
    }

    @Test
    void showsHelpSheetAndSummaryOverThePanes() {
        type("?");
        awaitText("Freeze the display");
        press(KeyType.Escape);
        awaitNoText("Freeze the display");
        type("v");
        awaitText("Bench sheet of the pump");
        press(KeyType.Escape);
        goTo("60");
        awaitText("PAUSED 1:00.0");
        type("e");
        awaitText("Summary of Gear-pump slip");
    }

    @Test
    void opensPanesAndChoosesTheLargeUnknown() {
        goTo("60");
        awaitText("Path of D");
        type("u");
        awaitText("Path of c");
        press(KeyType.ArrowDown);
        awaitText("Path of q0");
        press(KeyType.ReverseTab);
        press(KeyType.Enter);
        awaitNoText("Path of");
        awaitText("Next");
        press(KeyType.Escape);
        awaitText("Path of q0");
    }

    @Test
    void freezesTheDisplayUntilANewAlarm() {
        goTo("370");
        awaitText("PAUSED 6:10.0");
        type(" ");
        awaitText("FROZEN");
        type("n");
        awaitText("PAUSED 6:20.8");
        awaitNoText("FROZEN");
    }

    @Test
    void followsTheSizeOfTheTerminal() {
        terminal.setTerminalSize(new TerminalSize(80, 24));
        awaitText("R E P L A Y");
        assertThat(text().lines()).hasSize(24);
        terminal.setTerminalSize(new TerminalSize(40, 10));
        awaitText("The run goes on");
        terminal.setTerminalSize(new TerminalSize(200, 60));
        awaitText("Estimates");
    }

    @Test
    void troubleStaysUntilItWasSeen() {
        panes.trouble("events.csv: cannot be written (disk full)");
        awaitText("disk full");
        press(KeyType.Escape);
        awaitNoText("disk full");
    }

    @Test
    void closesTheReplay() throws Exception {
        goTo("60");
        awaitText("PAUSED 1:00.0");
        type("q");
        Awaitility.await().until(() -> {
            panes.turn(System.nanoTime());
            return run.isDone();
        });
        assertThat(run.get().readings().seen()).isEqualTo(301);
    }
}
