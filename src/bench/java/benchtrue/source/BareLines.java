package benchtrue.source;

import benchtrue.sheet.Dialect;
import benchtrue.sheet.LineSpec;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.Map;
import java.util.function.DoubleConsumer;

/** A loop that only reads lines and tells the number before their first comma. */
public final class BareLines {
    private BareLines() {}

    public static void read(String port, DoubleConsumer told) {
        LineSpec spec = new LineSpec(port, 9600, "8N1", ",", false, Map.of(), Dialect.PLAIN);
        byte[] buffer = new byte[1 << 13];
        StringBuilder line = new StringBuilder();
        try (PortLink link = PortLink.open(port, spec)) {
            for (int count = link.read(buffer); count >= 0; count = link.read(buffer)) {
                line.append(new String(buffer, 0, count, StandardCharsets.US_ASCII));
                for (int end = line.indexOf("\n"); end >= 0; end = line.indexOf("\n")) {
                    told.accept(Double.parseDouble(line.substring(0, line.indexOf(","))));
                    line.delete(0, end + 1);
                }
            }
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }
}
