package benchtrue.source;

import benchtrue.reading.Reading;
import benchtrue.sheet.BenchSheet;
import benchtrue.sheet.Channel;
import benchtrue.sheet.Dialect;
import benchtrue.sheet.LineSpec;
import java.nio.charset.Charset;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.regex.Matcher;
import java.util.stream.IntStream;

/** Turns a line of an instrument into values of the channels, in the dialect that the sheet declares. */
final class LineParser {
    private static final int SKIPPED = -1;

    private final LineSpec spec;
    private final Dialect dialect;
    private final Charset charset;
    private final byte[] separator;
    private final boolean blanks;
    private final List<byte[]> words = new ArrayList<>();
    private final FieldValue[] readers;
    private final Map<String, Integer> channelOf = new HashMap<>();
    private final int[] order;
    private final double[] values;
    private int fields;
    private String problem = "";
    private boolean proven;

    /** A sheet without a line has fields between commas. */
    LineParser(BenchSheet sheet) {
        spec = Objects.requireNonNullElse(sheet.line(), RehearsedLines.PLAIN);
        dialect = spec.dialect();
        charset = dialect.latin1() ? StandardCharsets.ISO_8859_1 : StandardCharsets.UTF_8;
        separator = spec.separator().getBytes(charset);
        blanks = spec.separator().isBlank();
        List<Channel> channels = sheet.channels();
        readers = channels.stream().map(c -> new FieldValue(c, spec)).toArray(FieldValue[]::new);
        for (int i = 0; i < channels.size(); i++) {
            channelOf.put(channels.get(i).name(), i);
        }
        order = dialect.fields().isEmpty()
                ? IntStream.range(0, channels.size()).toArray()
                : dialect.fields().stream()
                        .mapToInt(f -> channelOf.getOrDefault(f, SKIPPED))
                        .toArray();
        values = new double[channels.size()];
        spec.words().forEach((meaning, word) -> {
            if (!meaning.equals("overload")) {
                words.add(word.getBytes(charset));
            }
        });
    }

    /** Whether there is nothing in the line. */
    static boolean isBlank(byte[] line) {
        for (byte b : line) {
            if (!Decimals.isBlank(b)) {
                return false;
            }
        }
        return true;
    }

    /** Whether something in the line that was parsed last proves that it is whole: its checksum, or the mark of its start. */
    boolean provesItself() {
        return proven;
    }

    /**
     * Reads one line without its end.
     *
     * @param into filled in where the line was understood
     * @return what is wrong; empty where nothing is
     */
    String parse(byte[] bytes, int from, int to, Reading into) {
        problem = "";
        proven = dialect.framed();
        Arrays.fill(values, Double.NaN);
        fields = 0;
        int end = withoutChecksum(bytes, from, to);
        // A sentence of NMEA 0183 begins with a mark that is no part of its first field.
        int start = dialect.checksum() == Dialect.Checksum.NMEA ? from + 1 : from;
        if (problem.isEmpty()) {
            if (dialect.pattern() != null) {
                matched(bytes, start, end);
            } else {
                separated(bytes, start, end);
            }
        }
        if (problem.isEmpty()) {
            System.arraycopy(values, 0, into.values, 0, values.length);
        }
        return problem;
    }

    private int withoutChecksum(byte[] bytes, int from, int to) {
        Dialect.Checksum kind = dialect.checksum();
        if (kind == Dialect.Checksum.NONE) {
            return to;
        }
        int digits = Checksums.digitsFrom(kind, bytes, from, to);
        if (digits < 0) {
            problem = "no checksum at the end of " + shown(bytes, from, to);
            return to;
        }
        long right = Checksums.of(kind, bytes, from, digits);
        if (Checksums.said(bytes, digits, to) != right) {
            problem = String.format(
                    "the checksum is %s, of these bytes it would be %0" + kind.digits() + "X",
                    new String(bytes, digits, to - digits, StandardCharsets.US_ASCII),
                    right);
        }
        proven = true;
        return kind == Dialect.Checksum.NMEA ? digits - 1 : withoutSeparator(bytes, from, digits);
    }

    /** The digits may be a field of their own. */
    private int withoutSeparator(byte[] bytes, int from, int to) {
        int before = to - separator.length;
        return before >= from && matches(bytes, before, separator) ? before : to;
    }

    private void matched(byte[] bytes, int from, int to) {
        String text = new String(bytes, from, to - from, charset);
        Matcher matcher = Objects.requireNonNull(dialect.pattern()).matcher(text);
        if (!matcher.find()) {
            problem = "the pattern does not fit " + shown(bytes, from, to);
            return;
        }
        for (int group = 1; group <= matcher.groupCount() && problem.isEmpty(); group++) {
            byte[] field = Objects.requireNonNullElse(matcher.group(group), "").getBytes(charset);
            take(field, 0, field.length);
        }
    }

    private void separated(byte[] bytes, int from, int to) {
        int at = blanks ? afterBlanks(bytes, from, to) : from;
        while (problem.isEmpty()) {
            int end = endOfField(bytes, at, to);
            if (dialect.named()) {
                named(bytes, at, end);
            } else if (!isWord(bytes, at, end)) {
                take(bytes, at, end);
            }
            int next = blanks ? afterBlanks(bytes, end, to) : end + separator.length;
            if (end == to || (blanks && next == to)) {
                break;
            }
            at = next;
        }
        int wanted = dialect.named() ? 1 : order.length;
        if (problem.isEmpty() && fields != wanted && !(dialect.named() && fields > 0)) {
            problem = dialect.named()
                    ? "no channel of the sheet is named in " + shown(bytes, from, to)
                    : counted() + " where " + order.length + " are declared: " + shown(bytes, from, to);
        }
    }

    private String counted() {
        return fields + (fields == 1 ? " field" : " fields");
    }

    /** The next field of the declared order; one too many is only counted. */
    private void take(byte[] bytes, int from, int to) {
        int channel = fields < order.length ? order[fields] : SKIPPED;
        fields++;
        if (channel != SKIPPED) {
            read(channel, bytes, from, to);
        }
    }

    private void named(byte[] bytes, int from, int to) {
        int equals = from;
        while (equals < to && bytes[equals] != '=') {
            equals++;
        }
        Integer channel = channelOf.get(new String(bytes, from, equals - from, charset).strip());
        if (equals < to && channel != null) {
            fields++;
            read(channel, bytes, equals + 1, to);
        }
    }

    private void read(int channel, byte[] bytes, int from, int to) {
        values[channel] = readers[channel].of(bytes, from, to);
        problem = readers[channel].problem();
    }

    private static String shown(byte[] bytes, int from, int to) {
        return '"' + CellText.shown(bytes, from, to) + '"';
    }

    private static int afterBlanks(byte[] bytes, int from, int to) {
        int at = from;
        while (at < to && Decimals.isBlank(bytes[at])) {
            at++;
        }
        return at;
    }

    private int endOfField(byte[] bytes, int from, int to) {
        for (int at = from; at + separator.length <= to; at++) {
            if (blanks ? Decimals.isBlank(bytes[at]) : matches(bytes, at, separator)) {
                return at;
            }
        }
        return to;
    }

    private boolean isWord(byte[] bytes, int from, int to) {
        if (words.isEmpty()) {
            return false;
        }
        int start = afterBlanks(bytes, from, to);
        int end = to;
        while (end > start && Decimals.isBlank(bytes[end - 1])) {
            end--;
        }
        for (byte[] word : words) {
            if (word.length == end - start && matches(bytes, start, word)) {
                return true;
            }
        }
        return false;
    }

    private static boolean matches(byte[] bytes, int at, byte[] text) {
        for (int i = 0; i < text.length; i++) {
            if (bytes[at + i] != text[i]) {
                return false;
            }
        }
        return true;
    }
}
