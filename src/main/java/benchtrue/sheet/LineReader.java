package benchtrue.sheet;

import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import org.jspecify.annotations.Nullable;

/** How readings come over the line. */
final class LineReader {
    private LineReader() {}

    /**
     * Null where the sheet has no [line].
     *
     * @param channels names of the sheet's channels
     */
    static @Nullable LineSpec read(Keys sheet, List<String> channels) {
        Keys keys = sheet.table("line", "[line]");
        if (keys == null) {
            return null;
        }
        Map<String, String> words = new HashMap<>();
        Keys table = keys.table("words", "words");
        if (table != null) {
            for (String meaning : table.all()) {
                words.put(meaning, Objects.requireNonNullElse(table.text(meaning), ""));
            }
        }
        LineSpec line = new LineSpec(
                keys.text("port"),
                (int) keys.size("baud", 9600, false),
                keys.word("frame", "8N1", List.of("8N1", "8E1", "8O1", "8N2", "7E1", "7O1", "7N1", "7E2", "7O2")),
                separator(keys),
                keys.truth("decimal_comma"),
                words,
                new DialectReader(keys, channels).read());
        keys.done();
        return line;
    }

    private static String separator(Keys keys) {
        String separator = keys.text("separator", ",");
        if (separator.isEmpty()) {
            keys.mistake(
                    "separator", "the separator is empty", "write what stands between the fields, as \",\" or \" \"");
        } else if (separator.equals(",") && keys.truth("decimal_comma") && !keys.has("pattern")) {
            keys.mistake(
                    "decimal_comma",
                    "a comma cannot both separate fields and be the decimal mark",
                    "give another separator, as \";\", or a pattern");
        }
        return separator;
    }
}
