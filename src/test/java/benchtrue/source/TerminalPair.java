package benchtrue.source;

import static org.awaitility.Awaitility.await;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;

/** Two pseudo-terminals joined by socat: what goes into one comes out of the other. */
public final class TerminalPair implements AutoCloseable {
    private static final Path SOCAT = Path.of("/usr/bin/socat");

    private final Process process;
    private final Path near;
    private final Path far;

    /** Skips the test where there is no socat. */
    public TerminalPair(Path folder) throws IOException {
        assumeTrue(Files.isExecutable(SOCAT), "needs socat to make pseudo-terminals");
        near = folder.resolve("near");
        far = folder.resolve("far");
        process = new ProcessBuilder(SOCAT.toString(), "pty,raw,echo=0,link=" + near, "pty,raw,echo=0,link=" + far)
                .start();
        await().until(() -> Files.exists(near) && Files.exists(far));
    }

    public String near() {
        return near.toString();
    }

    public String far() {
        return far.toString();
    }

    @Override
    public void close() {
        pull();
    }

    /** As pulling the cable: both terminals vanish. */
    void pull() {
        process.destroy();
        process.onExit().join();
    }
}
