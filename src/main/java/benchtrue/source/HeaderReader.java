package benchtrue.source;

import benchtrue.model.Conversion;
import benchtrue.model.Parsed;
import benchtrue.model.Problem;
import benchtrue.model.Unit;
import benchtrue.sheet.Channel;
import benchtrue.sheet.Mistake;
import benchtrue.sheet.Nearest;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.stream.Collectors;
import org.jspecify.annotations.Nullable;

/** Reads the header row of readings.csv against the channels of a sheet. */
final class HeaderReader {
    private static final String TIME = "time";
    private static final Map<String, Integer> TIME_UNITS =
            Map.of("", 0, "s", 0, "ms", 3, "us", 6, "µs", 6, "μs", 6, "ns", 9);
    private static final int NAMED = 8;

    private final String file;
    private final List<Channel> channels;
    private final Set<String> names;
    private final int line;
    private final List<Head> heads = new ArrayList<>();
    private final List<Mistake> mistakes = new ArrayList<>();
    private final List<Mistake> notices = new ArrayList<>();

    /** @param place column of its first character in the line, from 1 */
    private record Head(String name, String unit, int place) {}

    HeaderReader(String file, CsvRows row, List<Channel> channels) {
        this.file = file;
        this.channels = channels;
        names = channels.stream().map(Channel::name).collect(Collectors.toCollection(LinkedHashSet::new));
        line = (int) row.line();
        int place = 1;
        for (int cell = 0; cell < row.cells(); cell++) {
            String text = text(row, cell);
            heads.add(head(text, place));
            place += text.length() + (row.isQuoted(cell) ? 3 : 1);
        }
    }

    private static String text(CsvRows row, int cell) {
        int start = row.start(cell);
        return new String(row.bytes(), start, row.end(cell) - start, StandardCharsets.UTF_8);
    }

    private static Head head(String text, int place) {
        String trimmed = text.strip();
        int bracket = trimmed.indexOf('[');
        if (bracket < 0 || !trimmed.endsWith("]")) {
            return new Head(trimmed, "", place);
        }
        String unit = trimmed.substring(bracket + 1, trimmed.length() - 1).strip();
        return new Head(trimmed.substring(0, bracket).strip(), unit, place);
    }

    /** @return null where there are {@link #mistakes()} */
    @Nullable
    Columns read() {
        int timeDecimals = time();
        int[] column = new int[channels.size()];
        @Nullable Conversion[] conversion = new Conversion[channels.size()];
        Map<String, Integer> columnOf = columnsByName();
        for (int channel = 0; mistakes.isEmpty() && channel < column.length; channel++) {
            Integer found = columnOf.get(channels.get(channel).name());
            column[channel] = found == null ? -1 : found;
            if (found != null) {
                conversion[channel] =
                        conversion(heads.get(found), channels.get(channel).unit());
            }
        }
        if (mistakes.isEmpty()) {
            nameMissing(column, columnOf);
            nameIgnored(column);
        }
        return mistakes.isEmpty() ? new Columns(heads.size(), column, conversion, timeDecimals, notices) : null;
    }

    List<Mistake> mistakes() {
        return mistakes;
    }

    private int time() {
        Head first = heads.get(0);
        if (!first.name().equals(TIME)) {
            mistake(first, "the first column is \"" + shown(first.name()) + "\", not time", timeRemedy(first));
            return 0;
        }
        Integer decimals = TIME_UNITS.get(first.unit());
        if (decimals == null) {
            mistake(first, "time in " + shown(first.unit()), "give it in s, ms, us or ns, or as ISO 8601");
            return 0;
        }
        return decimals;
    }

    private String timeRemedy(Head first) {
        if (heads.size() == 1 && first.name().contains(";")) {
            return "separate the columns with commas, not semicolons, and give numbers a decimal point";
        }
        if (heads.size() == 1 && first.name().contains("\t")) {
            return "separate the columns with commas, not tabs";
        }
        boolean elsewhere = heads.stream().anyMatch(head -> head.name().equals(TIME));
        return elsewhere
                ? "put the column time first"
                : "begin the file with a header row: time," + String.join(",", names);
    }

    /** Names of channels that come twice are mistakes; of other columns nobody asks. */
    private Map<String, Integer> columnsByName() {
        Map<String, Integer> columnOf = new HashMap<>();
        for (int i = 0; i < heads.size(); i++) {
            Head head = heads.get(i);
            Integer before = columnOf.putIfAbsent(head.name(), i);
            if (before != null && (names.contains(head.name()) || head.name().equals(TIME))) {
                mistake(
                        head,
                        "the column " + head.name() + " comes twice, as column " + (before + 1) + " and " + (i + 1),
                        "rename or remove one");
            }
        }
        return columnOf;
    }

    private @Nullable Conversion conversion(Head head, Unit wanted) {
        if (head.unit().isEmpty()) {
            return null;
        }
        Parsed<Unit> parsed = Unit.parse(head.unit());
        Unit unit = parsed.value();
        if (unit == null) {
            Problem problem = parsed.problems().get(0);
            boolean garbled = head.unit().indexOf('\uFFFD') >= 0;
            mistake(head, problem.message(), garbled ? "save the file as UTF-8" : problem.remedy());
            return null;
        }
        if (!unit.convertsTo(wanted)) {
            mistake(
                    head,
                    head.name() + " is in " + unit + " here and in " + wanted + " in the sheet",
                    "correct the unit in the brackets, or that of the sheet");
            return null;
        }
        return unit.equals(wanted) ? null : unit.conversionTo(wanted);
    }

    private void nameMissing(int[] column, Map<String, Integer> columnOf) {
        List<String> spare =
                columnOf.keySet().stream().filter(name -> !names.contains(name)).toList();
        for (int channel = 0; channel < column.length; channel++) {
            if (column[channel] < 0) {
                String name = channels.get(channel).name();
                String near = Nearest.to(name, spare);
                String remedy = near == null
                        ? "add the column, or take the channel out of the sheet"
                        : "rename the column " + shown(near) + " to " + name;
                Head at = near == null ? heads.get(0) : heads.get(columnOf.getOrDefault(near, 0));
                mistake(at, "there is no column for the channel " + name, remedy);
            }
        }
    }

    private void nameIgnored(int[] column) {
        boolean[] used = new boolean[heads.size()];
        used[0] = true;
        for (int index : column) {
            used[Math.max(0, index)] = true;
        }
        List<Head> ignored = new ArrayList<>();
        for (int i = 0; i < used.length; i++) {
            if (!used[i]) {
                ignored.add(heads.get(i));
            }
        }
        if (!ignored.isEmpty()) {
            String names = String.join(
                    ", ",
                    ignored.stream()
                            .limit(NAMED)
                            .map(head -> shown(head.name()))
                            .toList());
            String more = ignored.size() > NAMED ? " and " + (ignored.size() - NAMED) + " more" : "";
            String message = (ignored.size() == 1
                            ? "ignored, as the sheet does not name it: "
                            : "ignored, as the sheet does not name them: ")
                    + names
                    + more;
            notices.add(new Mistake(file, line, ignored.get(0).place(), message, ""));
        }
    }

    private static String shown(String text) {
        byte[] bytes = text.getBytes(StandardCharsets.UTF_8);
        return CellText.shown(bytes, 0, bytes.length);
    }

    private void mistake(Head head, String message, String remedy) {
        mistakes.add(new Mistake(file, line, head.place(), message, remedy));
    }
}
