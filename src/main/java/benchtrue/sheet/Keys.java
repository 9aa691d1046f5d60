package benchtrue.sheet;

import benchtrue.model.Interval;
import benchtrue.model.Unit;
import java.time.Instant;
import java.time.LocalDate;
import java.time.LocalDateTime;
import java.time.OffsetDateTime;
import java.time.ZoneOffset;
import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Set;
import org.jspecify.annotations.Nullable;
import org.tomlj.TomlArray;
import org.tomlj.TomlPosition;
import org.tomlj.TomlTable;

/**
 * One table of a sheet. Each getter answers with what stands at a key, or with what is assumed where it is absent or wrong; what
 * is wrong becomes a mistake with its place. {@link #done} reports the keys that nobody asked for.
 */
final class Keys {
    private final TomlTable table;
    private final String name;
    private final SheetText text;
    private final Set<String> asked = new LinkedHashSet<>();

    /** @param name as messages call it: {@code [channels]}, {@code channel dp} */
    Keys(TomlTable table, String name, SheetText text) {
        this.table = table;
        this.name = name;
        this.text = text;
    }

    String name() {
        return name;
    }

    SheetText sheet() {
        return text;
    }

    /** All keys, in the order of the file. */
    Set<String> all() {
        return table.keySet();
    }

    boolean has(String key) {
        asked.add(key);
        return table.contains(List.of(key));
    }

    boolean hasTable(String key) {
        return value(key) instanceof TomlTable;
    }

    private @Nullable Object value(String key) {
        asked.add(key);
        return table.get(List.of(key));
    }

    @Nullable
    TomlPosition place(String key) {
        return table.inputPositionOf(List.of(key));
    }

    void mistake(String key, String message, String remedy) {
        text.mistake(place(key), message, remedy);
    }

    private void wrong(String key, String wanted, String example) {
        mistake(key, key + " of " + name + " must be " + wanted, "write it as " + key + " = " + example);
    }

    /** Null where it is absent or no text. */
    @Nullable
    String text(String key) {
        Object value = value(key);
        if (value != null && !(value instanceof String)) {
            wrong(key, "a text in quotes", "\"…\"");
        }
        return value instanceof String string ? string : null;
    }

    String text(String key, String absent) {
        String value = text(key);
        return value == null ? absent : value;
    }

    /** A text that must be there; empty, with a mistake, where it is not. */
    String needed(String key, String example) {
        String value = text(key);
        if (value == null && !has(key)) {
            text.mistake(place(), name + " has no " + key, "add " + key + " = " + example);
        }
        return value == null ? "" : value;
    }

    /** Where the table begins, as far as it is known. */
    private @Nullable TomlPosition place() {
        return table.keySet().stream()
                .findFirst()
                .map(key -> table.inputPositionOf(List.of(key)))
                .orElse(null);
    }

    double number(String key, double absent) {
        Object value = value(key);
        if (value == null) {
            return absent;
        }
        if (value instanceof Long || value instanceof Double) {
            double number = ((Number) value).doubleValue();
            if (!Double.isNaN(number)) {
                return number;
            }
        }
        wrong(key, "a number", "1.5");
        return absent;
    }

    /** A number that must be at least 0 (or above 0). */
    double size(String key, double absent, boolean zeroAllowed) {
        double number = number(key, absent);
        if (has(key) && !(zeroAllowed ? number >= 0 : number > 0) && !Double.isNaN(number)) {
            wrong(key, zeroAllowed ? "a number that is not negative" : "a number above 0", "0.5");
            return absent;
        }
        return number;
    }

    boolean truth(String key) {
        Object value = value(key);
        if (value != null && !(value instanceof Boolean)) {
            wrong(key, "true or false", "true");
        }
        return value instanceof Boolean truth && truth;
    }

    /** {@code [lower, upper]}, a side without a limit being inf; null where it is absent or wrong. */
    @Nullable
    Interval interval(String key) {
        Object value = value(key);
        if (value == null) {
            return null;
        }
        if (value instanceof TomlArray array && array.size() == 2) {
            double lower = element(array, 0);
            double upper = element(array, 1);
            if (lower < upper) {
                return new Interval(lower, upper);
            }
        }
        wrong(key, "two numbers, the smaller one first", "[0, 250] or [16.0, inf]");
        return null;
    }

    private static double element(TomlArray array, int index) {
        Object value = array.get(index);
        return value instanceof Long || value instanceof Double ? ((Number) value).doubleValue() : Double.NaN;
    }

    @Nullable
    LocalDate date(String key) {
        Object value = value(key);
        if (value != null && !(value instanceof LocalDate)) {
            wrong(key, "a date without quotes", "2027-03-01");
        }
        return value instanceof LocalDate date ? date : null;
    }

    /** A duration in s: {@code "120 s"}, {@code "2 min"}, {@code "8 h"}, {@code "3 d"}, or a number of seconds. */
    double seconds(String key, double absent) {
        Object value = value(key);
        if (value == null) {
            return absent;
        }
        double seconds = value instanceof String string
                ? Durations.seconds(string)
                : value instanceof Long || value instanceof Double ? ((Number) value).doubleValue() : Double.NaN;
        if (!(seconds >= 0)) {
            wrong(key, "a duration", "\"120 s\" (or min, h, d)");
            return absent;
        }
        return seconds;
    }

    /** A date with its time, in UTC where it names no zone; null where it is absent or something else. */
    @Nullable
    Instant instant(String key) {
        Object value = value(key);
        if (value instanceof OffsetDateTime zoned) {
            return zoned.toInstant();
        }
        return value instanceof LocalDateTime local ? local.toInstant(ZoneOffset.UTC) : null;
    }

    /** A unit; the plain number where it is absent or wrong. */
    Unit unit(String key) {
        String symbol = text(key);
        Unit unit = symbol == null ? null : parsedUnit(key, symbol);
        return unit == null ? Unit.ONE : unit;
    }

    /** A unit; null where it is absent or wrong. */
    @Nullable
    Unit optionalUnit(String key) {
        String symbol = text(key);
        return symbol == null ? null : parsedUnit(key, symbol);
    }

    private @Nullable Unit parsedUnit(String key, String symbol) {
        var parsed = Unit.parse(symbol);
        text.problems(place(key), symbol, parsed.problems());
        return parsed.value();
    }

    List<String> texts(String key) {
        Object value = value(key);
        List<String> texts = new ArrayList<>();
        if (value instanceof TomlArray array) {
            for (int i = 0; i < array.size(); i++) {
                if (array.get(i) instanceof String one) {
                    texts.add(one);
                } else {
                    wrong(key, "a list of texts", "[\"…\", \"…\"]");
                }
            }
        } else if (value != null) {
            wrong(key, "a list of texts", "[\"…\", \"…\"]");
        }
        return texts;
    }

    /** A matrix or list of numbers, row after row; null where it is absent or wrong. */
    double @Nullable [] numbers(String key) {
        Object value = value(key);
        if (value == null) {
            return null;
        }
        List<Double> numbers = new ArrayList<>();
        if (value instanceof TomlArray array) {
            collect(array, numbers);
        }
        if (numbers.isEmpty() || numbers.stream().anyMatch(n -> n.isNaN())) {
            wrong(key, "numbers in square brackets", "[[1e-4, 0], [0, 2e-6]]");
            return null;
        }
        return numbers.stream().mapToDouble(n -> n).toArray();
    }

    private static void collect(TomlArray array, List<Double> into) {
        for (int i = 0; i < array.size(); i++) {
            if (array.get(i) instanceof TomlArray inner) {
                collect(inner, into);
            } else {
                into.add(element(array, i));
            }
        }
    }

    /** A table at a key; null where it is absent or no table. */
    @Nullable
    Keys table(String key, String itsName) {
        Object value = value(key);
        if (value != null && !(value instanceof TomlTable)) {
            mistake(key, key + " must be a table", "write it as [" + key + "], or as " + key + " = { … }");
        }
        return value instanceof TomlTable inner ? new Keys(inner, itsName, text) : null;
    }

    /** The tables {@code [[key]]}, in the order of the file. */
    List<Keys> tables(String key) {
        Object value = value(key);
        List<Keys> tables = new ArrayList<>();
        if (value instanceof TomlArray array) {
            for (int i = 0; i < array.size(); i++) {
                if (array.get(i) instanceof TomlTable inner) {
                    tables.add(new Keys(inner, "[[" + key + "]]" + (array.size() > 1 ? " " + (i + 1) : ""), text));
                } else {
                    mistake(key, key + " must hold tables", "write each as [[" + key + "]]");
                }
            }
        } else if (value != null) {
            mistake(key, key + " must be a list of tables", "write it as [[" + key + "]]");
        }
        return tables;
    }

    /** One of some words; {@code absent} where it is absent or none of them. */
    String word(String key, String absent, List<String> words) {
        String value = text(key);
        if (value == null) {
            return absent;
        }
        if (!words.contains(value)) {
            mistake(key, "\"" + value + "\" is no " + key, Nearest.remedy(value, words));
            return absent;
        }
        return value;
    }

    /** Reports what nobody asked for. */
    void done() {
        for (String key : table.keySet()) {
            if (!asked.contains(key)) {
                mistake(key, "unknown key " + key + " in " + name, Nearest.remedy(key, asked));
            }
        }
    }
}
