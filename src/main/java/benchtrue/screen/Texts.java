package benchtrue.screen;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;

/** Numbers and sentences as the panes write them. */
final class Texts {
    static final String UNKNOWN = "-";

    private Texts() {}

    /** A reading: as many significant digits as stand still, without an exponent between 1e-4 and 1e7. */
    static String value(double value, int digits) {
        if (Double.isNaN(value)) {
            return UNKNOWN;
        }
        if (Double.isInfinite(value)) {
            return value > 0 ? "inf" : "-inf";
        }
        double size = Math.abs(value);
        if (size == 0) {
            return "0";
        }
        if (size < 1e-4 || size >= 1e7) {
            return String.format(Locale.ROOT, "%." + (digits - 1) + "e", value);
        }
        int before = (int) Math.floor(Math.log10(size)) + 1;
        return String.format(Locale.ROOT, "%." + Math.max(0, digits - before) + "f", value);
    }

    /** As it was declared: all its digits and none more. */
    static String exact(double value) {
        return Double.toString(value).replaceFirst("\\.0$", "");
    }

    /** How long ago or how long yet: {@code 0.4 s}, {@code 38 s}, {@code 12 min}, {@code 3 h 20 min}, {@code 2 d 4 h}. */
    static String span(double seconds) {
        if (Double.isNaN(seconds)) {
            return UNKNOWN;
        }
        if (Double.isInfinite(seconds) || seconds > 3.2e9) {
            return "never";
        }
        if (seconds < 9.95) {
            return String.format(Locale.ROOT, "%.1f s", seconds);
        }
        long whole = Math.round(seconds);
        if (whole < 120) {
            return whole + " s";
        }
        long minutes = Math.round(seconds / 60);
        if (minutes < 60) {
            return minutes + " min";
        }
        return minutes < 48 * 60
                ? minutes / 60 + " h " + minutes % 60 + " min"
                : minutes / 1440 + " d " + minutes / 60 % 24 + " h";
    }

    /** A time of the run as a clock: {@code 6:20.8}, {@code 1:02:33}. */
    static String clock(double seconds) {
        if (!Double.isFinite(seconds)) {
            return UNKNOWN;
        }
        long tenths = Math.round(seconds * 10);
        long whole = tenths / 10;
        return whole >= 3600
                ? String.format(Locale.ROOT, "%d:%02d:%02d", whole / 3600, whole / 60 % 60, whole % 60)
                : String.format(Locale.ROOT, "%d:%02d.%d", whole / 60, whole % 60, tenths % 10);
    }

    /** Broken into lines of at most so many characters, at spaces where there are some. */
    static List<String> wrapped(String text, int width) {
        List<String> lines = new ArrayList<>();
        int room = Math.max(1, width);
        StringBuilder line = new StringBuilder();
        for (String word : text.split(" ", -1)) {
            String rest = word;
            if (line.length() > 0 && line.length() + 1 + rest.length() > room) {
                lines.add(line.toString());
                line.setLength(0);
            }
            while (rest.length() > room) {
                lines.add(rest.substring(0, room));
                rest = rest.substring(room);
            }
            line.append(line.length() > 0 ? " " : "").append(rest);
        }
        lines.add(line.toString());
        return lines;
    }

    /** {@code 1 reading}, {@code 2 readings}. */
    static String count(long count, String noun) {
        return count + " " + noun + (count == 1 ? "" : "s");
    }
}
