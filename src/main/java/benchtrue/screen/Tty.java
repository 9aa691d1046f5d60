package benchtrue.screen;

import com.googlecode.lanterna.TerminalSize;
import com.googlecode.lanterna.terminal.ansi.UnixTerminal;
import java.io.BufferedOutputStream;
import java.io.FileDescriptor;
import java.io.FileOutputStream;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import org.jspecify.annotations.Nullable;

/**
 * The terminal that the program was started in. Its output is buffered, so that a frame is one write; its size is asked of the
 * system, since the library's own question would wait in that buffer.
 */
final class Tty extends UnixTerminal {
    private static final int BUFFER = 1 << 16;
    private static final TerminalSize USUAL = new TerminalSize(80, 24);

    /** Null only while the library's constructor runs. */
    private final @Nullable Thread owner;

    Tty(boolean ascii) throws IOException {
        super(
                System.in,
                new BufferedOutputStream(new FileOutputStream(FileDescriptor.out), BUFFER),
                ascii ? StandardCharsets.US_ASCII : StandardCharsets.UTF_8,
                CtrlCBehaviour.TRAP);
        owner = Thread.currentThread();
        getInputDecoder().setTimeoutUnits(1);
    }

    /** The library's shutdown hook would restore the terminal while its owner still draws. */
    private boolean strange() {
        return owner != null && Thread.currentThread() != owner;
    }

    @Override
    public void exitPrivateMode() throws IOException {
        if (!strange()) {
            super.exitPrivateMode();
        }
    }

    @Override
    protected void restoreTerminalSettings() throws IOException {
        if (!strange()) {
            super.restoreTerminalSettings();
        }
    }

    @Override
    protected void keyStrokeSignalsEnabled(boolean enabled) throws IOException {
        if (!strange()) {
            super.keyStrokeSignalsEnabled(enabled);
        }
    }

    @Override
    public void close() throws IOException {
        try {
            super.close();
        } catch (IllegalStateException e) {
            // The program is being ended by a signal: the hook cannot be taken back, the terminal is restored by then.
        }
    }

    /** Leaves Ctrl-Z, Ctrl-\ and Ctrl-Y to the program: a suspended program would leave its panes on the terminal. */
    void keepKeys() throws IOException {
        runSTTYCommand("susp", "undef", "quit", "undef");
    }

    @Override
    protected TerminalSize findTerminalSize() throws IOException {
        String[] size = runSTTYCommand("size").trim().split(" ", -1);
        try {
            int rows = Integer.parseInt(size[0]);
            int columns = Integer.parseInt(size[1]);
            return rows > 0 && columns > 0 ? new TerminalSize(columns, rows) : USUAL;
        } catch (NumberFormatException | ArrayIndexOutOfBoundsException e) {
            return USUAL; // what has no size of its own, such as a serial console
        }
    }
}
