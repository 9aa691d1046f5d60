package benchtrue.screen;

import benchtrue.run.Closing;
import benchtrue.run.Desk;
import com.googlecode.lanterna.screen.TerminalScreen;
import java.io.IOException;
import java.util.function.BooleanSupplier;
import java.util.function.Function;

/**
 * The terminal while it shows panes, from opening to restoring it. To be opened, shown and closed by one thread; whoever ends
 * the program in the meantime waits for that thread.
 */
public final class Panes implements AutoCloseable {
    private final TerminalScreen terminal;
    private final RunScreen screen;

    private Panes(TerminalScreen terminal, RunScreen screen) {
        this.terminal = terminal;
        this.screen = screen;
    }

    /** @throws IOException where the terminal cannot be used */
    public static Panes open(Desk desk, boolean ascii, String sheetText, Function<Closing, String> closingText)
            throws IOException {
        Tty tty = new Tty(ascii);
        TerminalScreen terminal = new TerminalScreen(tty);
        terminal.startScreen();
        tty.keepKeys();
        terminal.setCursorPosition(null);
        return new Panes(terminal, new RunScreen(terminal, desk, ascii, sheetText, closingText));
    }

    /** Something could not be done: shown until it was seen. May be called by any thread. */
    public void trouble(String words) {
        screen.trouble(words);
    }

    /**
     * Shows the run until it is over.
     *
     * @throws IOException where the terminal is gone
     */
    public void show(BooleanSupplier over) throws IOException, InterruptedException {
        screen.show(over);
    }

    @Override
    public void close() throws IOException {
        terminal.stopScreen();
        terminal.getTerminal().close();
    }
}
