package benchtrue.source;

import benchtrue.sheet.LineSpec;
import java.io.IOException;
import java.util.concurrent.TimeUnit;

/** Plays the lines of the simulated rig out to a port, each when it is due. */
public final class LinePlayer {
    private static final double NANOS = 1e9;

    private LinePlayer() {}

    /** Whether nothing but another program can hang on the port. */
    public static boolean isPseudoTerminal(String port) {
        return PortLink.isPseudoTerminal(port);
    }

    /**
     * Returns when the last line is sent.
     *
     * @param line baud and frame of the port; a pseudo-terminal takes any
     * @param pace times real time; infinite: as fast as the port takes the lines
     * @return how many lines were sent, those that the cable lost included
     * @throws IOException where the port cannot be opened, or is gone
     */
    public static long play(
            RehearsedLines lines, String port, LineSpec line, double pace, CableFaults faults, long seed)
            throws IOException, InterruptedException {
        Cable cable = new Cable(faults, seed);
        try (PortLink link = PortLink.open(port, line)) {
            long start = System.nanoTime();
            long count = 0;
            while (!SerialLibrary.isEnding() && lines.next()) {
                TimeUnit.NANOSECONDS.sleep(start + (long) (lines.seconds() / pace * NANOS) - System.nanoTime());
                byte[] bytes = cable.carry(lines.bytes(), (System.nanoTime() - start) / NANOS);
                if (bytes.length > 0) {
                    link.write(bytes, bytes.length);
                }
                count++;
            }
            link.drain();
            return count;
        }
    }
}
