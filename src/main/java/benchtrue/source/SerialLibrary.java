package benchtrue.source;

import com.fazecast.jSerialComm.SerialPort;
import java.io.File;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.stream.Stream;
import org.jspecify.annotations.Nullable;

/**
 * Loads the native part of the serial library when a port is really wanted, from a fresh folder that only the user can enter: by
 * itself the library unpacks into a shared temporary folder, where somebody could have planted another.
 */
final class SerialLibrary {
    private static final String TEMPORARY = "java.io.tmpdir";

    private static boolean loaded;
    private static volatile boolean ending;

    private SerialLibrary() {}

    /** @throws IOException where it cannot be unpacked or does not run on this machine */
    static synchronized void load() throws IOException {
        if (loaded) {
            return;
        }
        Path folder = Files.createTempDirectory("benchtrue-serial");
        String shared = System.setProperty(TEMPORARY, folder.toString());
        try {
            SerialPort.getVersion(); // the first use of the class unpacks and loads
            loaded = true;
            SerialPort.addShutdownHook(new Thread(() -> ending = true, "serial library"));
        } catch (LinkageError e) {
            throw new IOException("the serial library does not run on this machine (" + e.getMessage() + ")", e);
        } finally {
            restore(shared);
            deleteOnExit(folder);
        }
    }

    /** Whether the program is ending: then the library takes all ports away by itself, and none of them is gone. */
    static boolean isEnding() {
        return ending;
    }

    private static void restore(@Nullable String shared) {
        if (shared != null) {
            System.setProperty(TEMPORARY, shared);
        }
    }

    /** Folders are registered before what is in them: on exit the last is deleted first. */
    private static void deleteOnExit(Path folder) throws IOException {
        try (Stream<Path> made = Files.walk(folder)) {
            made.map(Path::toFile).forEach(File::deleteOnExit);
        }
    }
}
