package benchtrue.sheet;

import java.util.Comparator;

/**
 * Something in a file that is not right, or (as a notice) deserves a look.
 *
 * @param file as the user named it
 * @param line counts from 1; 0 where the mistake is in no line, as when there is no such file
 * @param column counts characters from 1; 0 where there is none
 * @param message what is wrong
 * @param remedy what to do; may be empty
 */
public record Mistake(String file, int line, int column, String message, String remedy) implements Comparable<Mistake> {
    private static final Comparator<Mistake> ORDER = Comparator.comparing(Mistake::file)
            .thenComparingInt(Mistake::line)
            .thenComparingInt(Mistake::column)
            .thenComparing(Mistake::message);

    @Override
    public int compareTo(Mistake other) {
        return ORDER.compare(this, other);
    }

    /** {@code sheet.toml:12:7: message; remedy}, as a terminal can open it. */
    @Override
    public String toString() {
        String place = line == 0 ? "" : ":" + line + (column == 0 ? "" : ":" + column);
        return file + place + ": " + message + (remedy.isEmpty() ? "" : "; " + remedy);
    }
}
