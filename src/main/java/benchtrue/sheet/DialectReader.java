package benchtrue.sheet;

import java.util.HashSet;
import java.util.List;
import java.util.Set;
import java.util.regex.Pattern;
import java.util.regex.PatternSyntaxException;
import org.jspecify.annotations.Nullable;

/** Reads what a line looks like from the table [line]. */
final class DialectReader {
    private final Keys keys;
    private final List<String> channels;

    /** @param channels names of the sheet's channels */
    DialectReader(Keys keys, List<String> channels) {
        this.keys = keys;
        this.channels = channels;
    }

    Dialect read() {
        boolean named = keys.truth("named");
        List<String> fields = fields(named);
        Pattern pattern = pattern(fields.isEmpty() ? channels.size() : fields.size());
        if (named && pattern != null) {
            keys.mistake("pattern", "a line is either named or has a pattern", "leave out named or pattern");
        }
        String end = keys.word("end", "line", List.of("line", "ETX"));
        List<Dialect.Checksum> sums = List.of(Dialect.Checksum.values());
        List<String> words = sums.stream().map(Dialect.Checksum::word).toList();
        String sum = keys.word("checksum", Dialect.Checksum.NONE.word(), words);
        return new Dialect(
                fields,
                named,
                pattern,
                end.equals("ETX"),
                keys.truth("grouping"),
                keys.texts("missing"),
                sums.get(words.indexOf(sum)),
                keys.word("encoding", "UTF-8", List.of("UTF-8", "Latin-1")).equals("Latin-1"));
    }

    private List<String> fields(boolean named) {
        List<String> fields = keys.texts("fields");
        if (named && !fields.isEmpty()) {
            keys.mistake("fields", "named fields come in any order", "leave out fields or named");
        }
        Set<String> seen = new HashSet<>();
        for (String field : fields) {
            if (!field.equals(Dialect.IGNORED) && !channels.contains(field)) {
                keys.mistake(
                        "fields",
                        "\"" + field + "\" in fields is no channel of the sheet",
                        Nearest.remedy(field, channels) + "; \"-\" stands for a field that is no channel");
            } else if (!field.equals(Dialect.IGNORED) && !seen.add(field)) {
                keys.mistake("fields", field + " comes twice in fields", "name each channel once");
            }
        }
        for (String channel : channels) {
            if (!fields.isEmpty() && !seen.contains(channel)) {
                keys.mistake("fields", "the channel " + channel + " is not in fields", "say which field it is");
            }
        }
        return fields;
    }

    private @Nullable Pattern pattern(int fields) {
        String text = keys.text("pattern");
        if (text == null) {
            return null;
        }
        try {
            Pattern pattern = Pattern.compile(text);
            int groups = pattern.matcher("").groupCount();
            if (groups != fields) {
                keys.mistake(
                        "pattern",
                        "the pattern has " + groups + " groups for " + fields + " fields",
                        "put each field, and nothing else, into parentheses; (?: ) groups without taking");
            }
            return pattern;
        } catch (PatternSyntaxException e) {
            keys.mistake(
                    "pattern",
                    "the pattern is no regular expression: " + e.getDescription(),
                    "write it as a regular expression in single quotes, as '(\\S+) V, (\\S+) A'");
            return null;
        }
    }
}
