package benchtrue.cli;

import benchtrue.source.Failure;
import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * The first lines of readings, cut into fields.
 *
 * @param separator {@code " "} stands for any number of blanks and tabs
 * @param fields at least one
 * @param hasHeads whether the first line named the fields
 */
record Sample(List<String> lines, String separator, List<Field> fields, boolean hasHeads) {
    private static final int LINES = 3;
    private static final int MOST_BYTES = 1 << 16;
    private static final Pattern NUMBER = Pattern.compile("[-+\u2212]? *[0-9.,]*[0-9][0-9.,]*([eE][-+]?[0-9]+)?");
    private static final Pattern HEAD = Pattern.compile("(.*?)\\s*\\[([^\\[\\]]*)]");
    private static final Pattern NAMED = Pattern.compile("\\s*([^=]+?)\\s*=(.*)");
    private static final Pattern DATE = Pattern.compile("\\d{4}-\\d\\d-\\d\\d[T ].*");

    /**
     * @param name as the head or the line itself has it; may be empty
     * @param unit the same
     * @param example the first value; may be empty
     */
    record Field(String name, String unit, String example) {}

    /** Of a file of readings. */
    static Sample of(Path file) throws Refusal {
        try (InputStream in = Files.newInputStream(file)) {
            String text = new String(in.readNBytes(MOST_BYTES), StandardCharsets.UTF_8);
            List<String> lines = (text.startsWith("\uFEFF") ? text.substring(1) : text)
                    .lines()
                    .filter(l -> !l.isBlank())
                    .limit(LINES)
                    .toList();
            if (lines.isEmpty()) {
                throw new Refusal(file + ": the file is empty; name one that has readings");
            }
            return of(lines, lines.size() > 1 && isHeader(lines.get(0)));
        } catch (IOException e) {
            throw new Refusal(file + ": cannot be read (" + Failure.words(e) + ")");
        }
    }

    /**
     * Of an instrument.
     *
     * @param lines at least one, none blank
     */
    static Sample ofLines(List<String> lines) {
        return of(lines, false);
    }

    private static boolean isHeader(String line) {
        return split(line, separator(line)).stream()
                .noneMatch(f -> isValue(f) || NAMED.matcher(f).matches());
    }

    private static Sample of(List<String> lines, boolean hasHeads) {
        String separator = separator(lines.get(0));
        List<String> first = split(lines.get(0), separator);
        List<String> values = hasHeads ? split(lines.get(1), separator) : first;
        List<Field> fields = new ArrayList<>();
        for (int i = 0; i < first.size(); i++) {
            String value = i < values.size() ? values.get(i) : "";
            fields.add(hasHeads ? headed(first.get(i), value) : named(value));
        }
        return new Sample(lines, separator, fields, hasHeads);
    }

    private static Field headed(String head, String value) {
        Matcher matcher = HEAD.matcher(head);
        return matcher.matches()
                ? new Field(matcher.group(1), matcher.group(2).strip(), value)
                : new Field(head, "", value);
    }

    private static Field named(String text) {
        Matcher matcher = NAMED.matcher(text);
        return matcher.matches()
                ? new Field(matcher.group(1), "", matcher.group(2).strip())
                : new Field("", "", text);
    }

    private static String separator(String line) {
        for (String candidate : List.of(";", "\t", ",")) {
            if (line.contains(candidate) && !(candidate.equals(",") && isDecimalComma(line))) {
                return candidate;
            }
        }
        return line.strip().matches(".*\\s.*") ? " " : ",";
    }

    /** Whether commas stand only within the numbers of a line whose fields are parted by blanks. */
    private static boolean isDecimalComma(String line) {
        List<String> parts = split(line, " ");
        return parts.size() > 1 && parts.stream().allMatch(p -> p.matches("[-+]?\\d+,\\d+"));
    }

    private static List<String> split(String line, String separator) {
        String[] parts = separator.equals(" ") ? line.strip().split("\\s+", -1) : line.split(separator, -1);
        return Arrays.stream(parts)
                .map(String::strip)
                .map(p -> p.length() > 1 && p.startsWith("\"") && p.endsWith("\"") ? p.substring(1, p.length() - 1) : p)
                .toList();
    }

    private static boolean isValue(String text) {
        return text.isEmpty()
                || NUMBER.matcher(text).matches()
                || DATE.matcher(text).matches();
    }

    /** Whether numbers have a decimal comma, as far as these lines tell. */
    boolean decimalComma() {
        return !separator.equals(",")
                && fields.stream().anyMatch(f -> f.example().matches("[-+]?\\d+,\\d+"));
    }

    /** Whether each field is {@code name=value}. */
    boolean named() {
        return !hasHeads && fields.stream().noneMatch(f -> f.name().isEmpty());
    }
}
