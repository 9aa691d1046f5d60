package benchtrue.sheet;

import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import org.jspecify.annotations.Nullable;

/** How readings come over the line. */
final class LineReader {
    private LineReader() {}

    /** Null where the sheet has no [line]. */
    static @Nullable LineSpec read(Keys sheet) {
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
                keys.text("separator", ","),
                keys.truth("decimal_comma"),
                words);
        keys.done();
        return line;
    }
}
