package benchtrue.sheet;

import java.util.Map;
import org.jspecify.annotations.Nullable;

/**
 * How readings come over a serial line.
 *
 * @param port null: to be given when the run starts
 * @param frame data bits, parity and stop bits, as "8N1"
 * @param separator between the fields of a line, ; a blank stands for any number of blanks and tabs
 * @param decimalComma whether numbers have a decimal comma; then a quoted cell of readings.csv may have one too
 * @param words what a status word of the instrument means, from meaning to word, as stable → "steady"
 */
public record LineSpec(
        @Nullable String port,
        int baud,
        String frame,
        String separator,
        boolean decimalComma,
        Map<String, String> words,
        Dialect dialect) {
    public LineSpec {
        words = Map.copyOf(words);
    }
}
