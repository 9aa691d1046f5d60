package benchtrue.source;

import benchtrue.sheet.LineSpec;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.util.concurrent.TimeUnit;

/** Plays the lines of the simulated rig out to a port, each when it is due. */
public final class LinePlayer {
    private static final String END = "\r\n";

    /** Closing a port throws away what its other end has not yet taken. */
    private static final long TAKEN_MILLIS = 250;

    private LinePlayer() {}

    /** Whether nothing but another program can hang on the port. */
    public static boolean isPseudoTerminal(String port) {
        return PortLink.isPseudoTerminal(port);
    }

    /**
     * Returns when the last line is sent.
     *
     * @param line baud and frame of the port; a pseudo-terminal takes any
     * @return how many lines were sent
     * @throws IOException where the port cannot be opened, or is gone
     */
    public static long play(RehearsedLines lines, String port, LineSpec line) throws IOException, InterruptedException {
        try (PortLink link = PortLink.open(port, line)) {
            long start = System.nanoTime();
            long count = 0;
            while (lines.next()) {
                long due = start + (long) (lines.seconds() * 1e9);
                TimeUnit.NANOSECONDS.sleep(due - System.nanoTime());
                byte[] bytes = (lines.text() + END).getBytes(StandardCharsets.UTF_8);
                link.write(bytes, bytes.length);
                count++;
            }
            TimeUnit.MILLISECONDS.sleep(TAKEN_MILLIS);
            return count;
        }
    }
}
