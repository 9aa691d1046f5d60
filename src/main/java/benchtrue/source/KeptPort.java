package benchtrue.source;

import benchtrue.sheet.LineSpec;
import java.io.Closeable;
import java.io.IOException;
import java.util.concurrent.TimeUnit;
import org.jspecify.annotations.Nullable;

/** A port that is opened again whenever it is gone, until it is closed. Used by one thread, and closed by any. */
final class KeptPort implements Closeable {
    private static final long FIRST_PAUSE_MILLIS = 100;
    private static final long LONGEST_PAUSE_MILLIS = 1000;

    /** Told by the thread that uses the port. */
    interface Listener {
        /** @param why not empty; told once as long as it stays the same */
        void gone(String why);

        void back();
    }

    private final String port;
    private final LineSpec spec;
    private final Listener listener;
    private volatile @Nullable PortLink link;
    private volatile boolean closed;

    /** @param link open */
    KeptPort(String port, LineSpec spec, PortLink link, Listener listener) {
        this.port = port;
        this.spec = spec;
        this.link = link;
        this.listener = listener;
    }

    boolean isClosed() {
        return closed || SerialLibrary.isEnding();
    }

    /** Waits while the port is gone; null once this is closed. */
    @Nullable
    PortLink open() {
        PortLink open = link;
        return isClosed() ? null : open == null ? reopened() : open;
    }

    /** Gives up a port that is gone. */
    void lost() {
        PortLink open = link;
        link = null;
        if (open != null) {
            open.close();
        }
        if (!isClosed()) {
            listener.gone("the line is gone");
        }
    }

    /** A fresh port for each attempt: an old one may hang on a name that now means another device. */
    private @Nullable PortLink reopened() {
        long pause = FIRST_PAUSE_MILLIS;
        String told = "";
        while (!isClosed()) {
            try {
                TimeUnit.MILLISECONDS.sleep(pause);
                PortLink fresh = PortLink.open(port, spec);
                link = fresh;
                if (isClosed()) {
                    fresh.close();
                    return null;
                }
                listener.back();
                return fresh;
            } catch (IOException e) {
                String why = String.valueOf(e.getMessage());
                if (!why.equals(told)) {
                    told = why;
                    listener.gone(why);
                }
                pause = Math.min(2 * pause, LONGEST_PAUSE_MILLIS);
            } catch (InterruptedException e) {
                closed = true;
            }
        }
        return null;
    }

    @Override
    public void close() {
        closed = true;
        PortLink open = link;
        if (open != null) {
            open.close();
        }
    }
}
