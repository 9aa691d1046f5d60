package benchtrue.screen;

import benchtrue.alarm.Alarm;
import benchtrue.run.Closing;
import benchtrue.run.Control;
import benchtrue.run.Desk;
import benchtrue.run.Snapshot;
import com.googlecode.lanterna.input.KeyStroke;
import com.googlecode.lanterna.input.KeyType;
import com.googlecode.lanterna.screen.Screen;
import com.googlecode.lanterna.screen.TerminalScreen;
import java.io.IOException;
import java.util.List;
import java.util.concurrent.ConcurrentLinkedQueue;
import java.util.concurrent.TimeUnit;
import java.util.function.BooleanSupplier;
import java.util.function.Function;
import org.jspecify.annotations.Nullable;

/**
 * The run in panes. Everything here but {@link #trouble} belongs to the thread that calls {@link #show}: it alone reads keys
 * and draws, at most 20 times a second, and never waits for the run.
 */
public final class RunScreen {
    private static final long FRAME = TimeUnit.MILLISECONDS.toNanos(50);
    private static final long LOOK_FOR_KEYS_MILLIS = 10;
    /** Ages and clocks move on without news from the run. */
    private static final long TICK = TimeUnit.MILLISECONDS.toNanos(500);

    private final Screen screen;
    private final Desk desk;
    private final boolean ascii;
    private final Function<Closing, String> closingText;
    private final Look look = new Look();
    private final Cells cells = new Cells();
    private final Operator operator;
    private final ConcurrentLinkedQueue<String> troubles = new ConcurrentLinkedQueue<>();

    private @Nullable Snapshot drawn;
    private @Nullable Snapshot frozen;
    private long frozenAt;
    private long drawnAt = Long.MIN_VALUE;
    private boolean stale = true;
    private @Nullable Closing closing;
    private int newestAlarm;

    /**
     * @param screen started
     * @param sheetText of the bench sheet, to be looked up
     * @param closingText what is shown of the closing summary
     */
    RunScreen(Screen screen, Desk desk, boolean ascii, String sheetText, Function<Closing, String> closingText) {
        this.screen = screen;
        this.desk = desk;
        this.ascii = ascii;
        this.closingText = closingText;
        operator = new Operator(desk, look, Page.of("Bench sheet", sheetText));
    }

    /** Something could not be done: shown until it was seen. May be called by any thread. */
    public void trouble(String words) {
        troubles.add(words);
    }

    /** Shows the run until it is over. */
    void show(BooleanSupplier over) throws IOException, InterruptedException {
        while (!over.getAsBoolean()) {
            turn(System.nanoTime());
            Thread.sleep(LOOK_FOR_KEYS_MILLIS);
        }
    }

    /** Takes the keys that came and draws if something is new. */
    void turn(long now) throws IOException {
        Snapshot latest = desk.snapshot();
        for (KeyStroke key = screen.pollInput(); key != null; key = screen.pollInput()) {
            if (latest != null) {
                take(key, shown(latest, now), now);
            } else if (asksToClose(key)) {
                desk.send(new Control.Close());
            }
            stale = true;
        }
        boolean resized = screen.doResizeIfNecessary() != null;
        if (latest == null || !(resized || due(latest, now))) {
            return;
        }
        notice(latest);
        Frame.draw(new Canvas(screen.newTextGraphics(), ascii, cells), shown(latest, now));
        screen.refresh(resized ? Screen.RefreshType.COMPLETE : Screen.RefreshType.DELTA);
        drawn = latest;
        drawnAt = now;
        stale = false;
    }

    @SuppressWarnings(
            "ReferenceEquality") // a new snapshot is news, whatever is in it; comparing all of it costs a frame
    private boolean due(Snapshot latest, long now) {
        if (drawnAt == Long.MIN_VALUE) {
            return true;
        }
        boolean news = stale || (latest != drawn && frozen == null);
        return (news && now - drawnAt >= FRAME) || now - drawnAt >= TICK;
    }

    private Shown shown(Snapshot latest, long now) {
        Snapshot seen = frozen == null ? latest : frozen;
        double since = frozen == null ? Double.NaN : (now - frozenAt) * 1e-9;
        String trouble = troubles.peek();
        return new Shown(seen, look, since, trouble == null ? "" : trouble);
    }

    /** New alarms ring once and thaw the display; a new closing summary opens by itself. */
    @SuppressWarnings("ReferenceEquality") // a summary that was computed again is another one
    private void notice(Snapshot latest) throws IOException {
        int newest = latest.alarms().stream().mapToInt(Alarm::id).max().orElse(0);
        if (newest > newestAlarm) {
            frozen = null;
            look.alarm = 0;
            if (look.bell && screen instanceof TerminalScreen terminal) {
                terminal.getTerminal().bell();
            }
        }
        newestAlarm = newest;
        if (drawn == null && latest.live() && latest.setUp().isEmpty()) {
            look.setUp = new SetUp(desk, look);
        }
        Closing last = latest.closing();
        if (last != null && last != closing) {
            look.open(Page.of("Closing summary", closingText.apply(last)));
        }
        closing = last;
    }

    private static boolean asksToClose(KeyStroke key) {
        return key.getKeyType() == KeyType.EOF
                || (key.getKeyType() == KeyType.Character
                        && (key.getCharacter() == 'q' || (key.isCtrlDown() && key.getCharacter() == 'c')));
    }

    private void take(KeyStroke key, Shown shown, long now) {
        if (key.getKeyType() == KeyType.EOF) {
            desk.send(new Control.Close());
        } else if (key.isCtrlDown()) {
            if (asksToClose(key)) {
                look.form = null;
                operator.obey(Command.CLOSE, shown);
            }
        } else if (look.form != null) {
            answer(look.form, key);
        } else if (look.setUp != null) {
            look.setUp.take(key, shown);
        } else {
            if (key.isAltDown()) {
                back(); // no Alt key is in use: this is Esc with the next key close behind
            }
            if (key.getKeyType() == KeyType.Character) {
                command(key.getCharacter(), shown, now);
            } else {
                move(key.getKeyType(), shown);
            }
        }
    }

    private void command(char typed, Shown shown, long now) {
        Command command = Command.of(typed);
        if (command == null || !command.works(shown)) {
            return;
        }
        if (command == Command.FREEZE) {
            frozen = frozen == null ? shown.snapshot() : null;
            frozenAt = now;
        }
        operator.obey(command, shown);
    }

    private void answer(Form form, KeyStroke key) {
        if (key.isAltDown()) {
            look.form = null;
            return;
        }
        switch (key.getKeyType()) {
            case Escape -> look.form = null;
            case Backspace -> form.rubOut();
            case Character -> form.type(key.getCharacter());
            case Enter -> {
                if (form.enter() && look.form == form) {
                    look.form = null;
                }
            }
            default -> {}
        }
    }

    private void move(KeyType key, Shown shown) {
        int page = Math.max(1, screen.getTerminalSize().getRows() / 2);
        switch (key) {
            case Tab -> focus(1);
            case ReverseTab -> focus(PaneKind.values().length - 1);
            case ArrowDown -> go(1, shown);
            case ArrowUp -> go(-1, shown);
            case PageDown -> go(page, shown);
            case PageUp -> go(-page, shown);
            case Enter -> open(shown);
            case Escape -> back();
            default -> {}
        }
    }

    private void focus(int steps) {
        if (look.page == null) {
            List<PaneKind> all = List.of(PaneKind.values());
            look.focus = all.get((all.indexOf(look.focus) + steps) % all.size());
        }
    }

    private void go(int lines, Shown shown) {
        if (look.page != null) {
            look.pageFrom += lines;
        } else if (look.focus == PaneKind.ESTIMATES || look.focus == PaneKind.LARGE) {
            look.unknown = within(look.unknown + lines, shown.unknowns().size());
        } else if (look.focus == PaneKind.ALARMS) {
            look.alarm = within(look.alarm + lines, shown.snapshot().alarms().size());
        } else {
            look.scroll(look.focus, lines);
        }
    }

    private static int within(int place, int count) {
        return Math.max(0, Math.min(place, count - 1));
    }

    private void open(Shown shown) {
        if (look.page != null) {
            return;
        }
        if (look.focus == PaneKind.ALARMS
                && look.alarm < shown.snapshot().alarms().size()) {
            look.open(AlarmPage.of(AlarmsPane.sorted(shown).get(look.alarm)));
        } else {
            look.opened = true;
        }
    }

    private void back() {
        if (!troubles.isEmpty()) {
            troubles.remove();
        } else if (look.page != null) {
            look.page = null;
        } else {
            look.opened = false;
        }
    }
}
