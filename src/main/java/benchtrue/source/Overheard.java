package benchtrue.source;

import benchtrue.sheet.LineSpec;
import java.io.IOException;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.concurrent.TimeUnit;

/** Listens to a port for a moment, to see what comes. */
public final class Overheard {
    private static final int MOST = 5;
    private static final int BUFFER = 1 << 12;

    private Overheard() {}

    /**
     * The first whole lines, at most five, as raw.log would have them; none where nothing came in time.
     *
     * @throws IOException with a message in words, where the port cannot be opened
     */
    public static List<String> on(String port, LineSpec spec, double seconds) throws IOException {
        List<String> lines = new ArrayList<>();
        Framer framer = new Framer(spec);
        byte[] buffer = new byte[BUFFER];
        long end = System.nanoTime() + (long) (seconds * TimeUnit.SECONDS.toNanos(1));
        try (PortLink link = PortLink.open(port, spec)) {
            while (System.nanoTime() < end && lines.size() <= MOST) {
                int count = link.read(buffer);
                if (count < 0) {
                    break;
                }
                framer.add(
                        buffer,
                        0,
                        count,
                        0,
                        (bytes, from, to, behind, nanos, cut) ->
                                lines.add(RawBytes.text(Arrays.copyOfRange(bytes, from, to))));
            }
        }
        // The first may be a part of one.
        return lines.size() < 2 ? List.of() : List.copyOf(lines.subList(1, Math.min(lines.size(), MOST + 1)));
    }
}
