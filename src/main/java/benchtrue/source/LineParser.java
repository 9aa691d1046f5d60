package benchtrue.source;

import benchtrue.reading.Reading;
import benchtrue.sheet.BenchSheet;
import benchtrue.sheet.Channel;
import benchtrue.sheet.LineSpec;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.Collection;
import java.util.List;
import java.util.Map;

/** Turns a line of an instrument into values: status words, then the channels of the sheet in their order. */
final class LineParser {
    private static final LineSpec PLAIN = new LineSpec(null, 9600, "8N1", ",", false, Map.of());

    private final List<Channel> channels;
    private final byte[] separator;
    private final char point;
    private final List<byte[]> words = new ArrayList<>();
    private final double[] values;

    LineParser(BenchSheet sheet) {
        LineSpec spec = sheet.line() == null ? PLAIN : sheet.line();
        channels = sheet.channels();
        separator = spec.separator().getBytes(StandardCharsets.UTF_8);
        point = spec.decimalComma() ? ',' : '.';
        Collection<String> declared = spec.words().values();
        declared.forEach(word -> words.add(word.getBytes(StandardCharsets.UTF_8)));
        values = new double[channels.size()];
    }

    /** Whether there is nothing in the line. */
    boolean isBlank(byte[] line) {
        for (byte b : line) {
            if (!Decimals.isBlank(b)) {
                return false;
            }
        }
        return true;
    }

    /** @return what is wrong, or empty: then the values are filled in */
    String parse(byte[] bytes, int from, int to, Reading into) {
        int channel = 0;
        int at = from;
        while (true) {
            int end = endOfField(bytes, at, to);
            if (!isWord(bytes, at, end)) {
                if (channel == values.length) {
                    return "more fields than the " + values.length + " channels of the sheet: "
                            + shown(bytes, from, to);
                }
                double value = Decimals.parse(bytes, at, end, point);
                if (Double.isInfinite(value)) {
                    return channels.get(channel).name() + ": " + shown(bytes, at, end) + " is no number";
                }
                values[channel++] = value;
            }
            if (end == to) {
                break;
            }
            at = end + separator.length;
        }
        if (channel < values.length) {
            return channel + " fields where the sheet has " + values.length + " channels: " + shown(bytes, from, to);
        }
        System.arraycopy(values, 0, into.values, 0, values.length);
        return "";
    }

    /** Whether something in the line that was parsed last proves that it is whole. */
    boolean provesItself() {
        return false;
    }

    private static String shown(byte[] bytes, int from, int to) {
        return '"' + CellText.shown(bytes, from, to) + '"';
    }

    private int endOfField(byte[] bytes, int from, int to) {
        for (int at = from; at + separator.length <= to; at++) {
            if (matches(bytes, at, separator)) {
                return at;
            }
        }
        return to;
    }

    private boolean isWord(byte[] bytes, int from, int to) {
        int start = from;
        int end = to;
        while (start < end && Decimals.isBlank(bytes[start])) {
            start++;
        }
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
