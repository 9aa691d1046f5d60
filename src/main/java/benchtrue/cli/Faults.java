package benchtrue.cli;

import java.io.IOException;
import java.io.PrintWriter;
import java.io.StringWriter;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.nio.file.attribute.PosixFilePermissions;
import java.time.Instant;
import java.util.Map;

/** Faults of the program itself: one line for the user, the trace in a file that only the user can read. */
final class Faults {
    private Faults() {}

    /** The line to print. */
    static String record(Throwable fault, String version, Map<String, String> environment) {
        String what = fault.getClass().getSimpleName() + (fault.getMessage() == null ? "" : ": " + fault.getMessage());
        String line = "benchtrue: a fault of the program, not of your data (" + what + ").";
        try {
            Path log = logFile(environment);
            Files.createDirectories(
                    folderOf(log), PosixFilePermissions.asFileAttribute(PosixFilePermissions.fromString("rwx------")));
            StringWriter trace = new StringWriter();
            fault.printStackTrace(new PrintWriter(trace, true));
            String entry =
                    Instant.now() + " benchtrue " + version + ", Java " + Runtime.version() + "\n" + trace + "\n";
            Files.writeString(log, entry, StandardCharsets.UTF_8, StandardOpenOption.CREATE, StandardOpenOption.APPEND);
            return line + " Please report it with the last entry of " + log;
        } catch (IOException | UnsupportedOperationException e) {
            return line + " Please report it; its details could not be kept (" + e.getMessage() + ")";
        }
    }

    /** {@code $XDG_STATE_HOME/benchtrue/faults.log}, by default below {@code ~/.local/state}. */
    static Path logFile(Map<String, String> environment) {
        String state = environment.getOrDefault("XDG_STATE_HOME", "");
        Path base = state.isEmpty() ? Path.of(System.getProperty("user.home"), ".local", "state") : Path.of(state);
        return base.resolve("benchtrue").resolve("faults.log");
    }

    private static Path folderOf(Path log) {
        Path folder = log.getParent();
        return folder == null ? log : folder;
    }
}
