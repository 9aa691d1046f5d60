package benchtrue.record;

import benchtrue.source.WholeLines;
import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.channels.FileChannel;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.util.concurrent.TimeUnit;

/**
 * A file of lines that only grows. While it cannot be written, lines are dropped and counted; each second another attempt is
 * made, which begins on a line of its own.
 */
final class AppendedFile {
    /** What the last call changed. */
    enum Change {
        NONE,
        FAILED,
        BACK
    }

    private static final long AGAIN = TimeUnit.SECONDS.toNanos(1);

    /** Makes an unreadable row of one that was torn. */
    private static final String TORN = ",torn\n";

    private final Path path;
    private final StringBuilder waiting = new StringBuilder();
    private FileChannel channel;
    private IOException failure = new IOException("nothing failed");
    private boolean failing;
    private boolean torn;
    private long lines;
    private long missing;
    private long failedAt;

    /** Goes on behind what is there; a last line that was torn is cut off. */
    AppendedFile(Path path) throws IOException {
        this.path = path;
        channel = open();
        long whole = WholeLines.length(path);
        if (whole < channel.size()) {
            channel.truncate(whole);
        }
        channel.position(whole);
    }

    private FileChannel open() throws IOException {
        return FileChannel.open(path, StandardOpenOption.CREATE, StandardOpenOption.WRITE, StandardOpenOption.READ);
    }

    boolean isEmpty() throws IOException {
        return channel.size() == 0;
    }

    /** A line with its end. */
    void add(String line) {
        lines++;
        waiting.append(line);
    }

    /** Hands the lines that wait to the system, which keeps them even if this process is killed now. */
    Change write() {
        if (waiting.isEmpty() || (failing && System.nanoTime() - failedAt < AGAIN)) {
            if (failing) {
                drop();
            }
            return Change.NONE;
        }
        try {
            if (!Files.exists(path)) {
                throw new IOException("the file is gone");
            }
            append(StandardCharsets.UTF_8.encode((torn ? TORN : "") + waiting));
            lines = 0;
            waiting.setLength(0);
            boolean back = failing;
            failing = false;
            return back ? Change.BACK : Change.NONE;
        } catch (IOException e) {
            return failed(e);
        }
    }

    /** A row of which only a part fits would read as another number: it is taken back, or else spoilt by what follows. */
    private void append(ByteBuffer bytes) throws IOException {
        long before = channel.position();
        try {
            while (bytes.hasRemaining()) {
                channel.write(bytes);
            }
            torn = false;
        } catch (IOException e) {
            torn = true;
            channel.truncate(before);
            torn = false;
            throw e;
        }
    }

    private Change failed(IOException e) {
        boolean news = !failing;
        if (news) {
            missing = 0;
        }
        failure = e;
        failing = true;
        failedAt = System.nanoTime();
        drop();
        return news ? Change.FAILED : Change.NONE;
    }

    private void drop() {
        missing += lines;
        lines = 0;
        waiting.setLength(0);
    }

    /** Onto the disk. */
    Change force() {
        if (failing) {
            return Change.NONE;
        }
        try {
            channel.force(false);
            return Change.NONE;
        } catch (IOException e) {
            return failed(e);
        }
    }

    Path path() {
        return path;
    }

    IOException failure() {
        return failure;
    }

    /** Lines that were dropped while it could not be written. */
    long missing() {
        return missing;
    }

    void close() {
        try {
            channel.close();
        } catch (IOException e) {
            failure = e; // all was written before; nobody is left to be told
        }
    }
}
