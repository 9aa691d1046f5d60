package benchtrue.record;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.util.Objects;
import java.util.Properties;

/** How the program names itself in records and on the command line. */
public final class Program {
    public static final String NAME = "benchtrue";

    private Program() {}

    /** The version that the build gave this jar. */
    public static String version() {
        try (InputStream in = Program.class.getResourceAsStream("/benchtrue/version.properties")) {
            Properties properties = new Properties();
            properties.load(Objects.requireNonNull(in, "version.properties is missing from the jar"));
            return Objects.requireNonNull(properties.getProperty("version"), "version");
        } catch (IOException e) {
            throw new UncheckedIOException("reading version.properties", e);
        }
    }
}
