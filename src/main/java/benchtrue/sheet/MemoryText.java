package benchtrue.sheet;

import benchtrue.model.Memory;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.jspecify.annotations.Nullable;

/** A memory as sheets, the command line and the screen write it. */
public final class MemoryText {
    private static final Pattern READINGS = Pattern.compile("\\s*([0-9]+(?:\\.[0-9]+)?)\\s+readings?\\s*");

    private MemoryText() {}

    /** Of {@code "all"}, {@code "600 readings"}, {@code "120 s"}; null where the text is no memory. */
    public static @Nullable Memory parse(String text) {
        if (text.strip().equals("all")) {
            return new Memory.All();
        }
        Matcher readings = READINGS.matcher(text);
        if (readings.matches()) {
            double count = Double.parseDouble(readings.group(1));
            return count > 1 ? new Memory.Readings(count) : null;
        }
        double seconds = Durations.seconds(text);
        return seconds > 0 ? new Memory.Seconds(seconds) : null;
    }

    /** Of a factor above 0, at most 1; null for any other. */
    public static @Nullable Memory ofFactor(double factor) {
        if (factor == 1) {
            return new Memory.All();
        }
        return factor > 0 && factor < 1 ? Memory.Readings.ofFactor(factor) : null;
    }
}
