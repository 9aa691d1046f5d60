package benchtrue.record;

import benchtrue.source.Failure;
import java.io.Closeable;
import java.io.IOException;
import java.io.OutputStream;
import java.nio.file.Files;
import java.nio.file.OpenOption;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.util.function.Consumer;

/**
 * A file that grows with a run. A full disk or a vanished folder must not end the run: the first failure is told once, what
 * follows is dropped, and what was written stays.
 */
final class GrowingFile implements Closeable {
    private final Path path;
    private final Consumer<String> trouble;
    private OutputStream out;

    /** Begins the file afresh. */
    GrowingFile(Path path, Consumer<String> trouble) {
        this(path, trouble, StandardOpenOption.CREATE, StandardOpenOption.TRUNCATE_EXISTING, StandardOpenOption.WRITE);
    }

    /** Goes on behind what is in the file. */
    static GrowingFile goingOn(Path path, Consumer<String> trouble) {
        return new GrowingFile(path, trouble, StandardOpenOption.CREATE, StandardOpenOption.APPEND);
    }

    private GrowingFile(Path path, Consumer<String> trouble, OpenOption... options) {
        this.path = path;
        this.trouble = trouble;
        try {
            out = Files.newOutputStream(path, options);
        } catch (IOException e) {
            out = giveUp(e);
        }
    }

    void write(byte[] bytes, int length) {
        try {
            out.write(bytes, 0, length);
        } catch (IOException e) {
            closeAfterFailure();
            out = giveUp(e);
        }
    }

    @Override
    public void close() {
        try {
            out.close();
        } catch (IOException e) {
            giveUp(e);
        }
    }

    /** The failure that led here has been told; a second one of the same stream says nothing more. */
    private void closeAfterFailure() {
        try {
            out.close();
        } catch (IOException e) {
            out = OutputStream.nullOutputStream();
        }
    }

    private OutputStream giveUp(IOException e) {
        trouble.accept(
                path + ": cannot be written (" + Failure.words(e)
                        + "). The run goes on and this file ends here. Free space or bring the folder back, then replay the run.");
        return OutputStream.nullOutputStream();
    }
}
