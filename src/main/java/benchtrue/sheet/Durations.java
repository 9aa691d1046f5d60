package benchtrue.sheet;

import java.util.Map;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** Durations as a sheet writes them. */
public final class Durations {
    private static final Pattern DURATION =
            Pattern.compile("\\s*([0-9]*\\.?[0-9]+(?:[eE][+-]?[0-9]+)?)\\s*([a-z]+)\\s*");
    private static final Map<String, Double> SECONDS =
            Map.of("ms", 1e-3, "s", 1.0, "min", 60.0, "h", 3600.0, "d", 86400.0);

    private Durations() {}

    /** Seconds of {@code "2 min"}; NaN where the text is no duration. */
    public static double seconds(String text) {
        Matcher matcher = DURATION.matcher(text);
        if (!matcher.matches() || !SECONDS.containsKey(matcher.group(2))) {
            return Double.NaN;
        }
        return Double.parseDouble(matcher.group(1)) * SECONDS.get(matcher.group(2));
    }
}
