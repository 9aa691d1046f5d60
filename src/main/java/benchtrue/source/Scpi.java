package benchtrue.source;

import benchtrue.sheet.PollSpec;
import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.Locale;
import java.util.regex.Pattern;
import org.jspecify.annotations.Nullable;

/**
 * Asks the sheet's queries, one in a message (IEEE 488.2-1992 for numbers and messages, SCPI-1999 volume 1, 7.2.1 for the numbers that
 * stand for overload and for none).
 */
final class Scpi implements Poller {
    /** NR1, NR2 and NR3. */
    private static final Pattern NUMBER = Pattern.compile("[+-]?(\\d+\\.?\\d*|\\.\\d+)(E[+-]?\\d+)?");

    private static final double OVERLOAD = 9.9e37;
    private static final double NOT_A_NUMBER = 9.91e37;
    private static final int LONGEST_QUOTE = 40;

    /** A value is some 16 characters long; what goes on and on is no answer. */
    private static final int LONGEST_ANSWER = 1024;

    /** As {@code -113,"Undefined header"}; 0 where there is none (SCPI-1999 volume 2, 21.8). */
    private static final Pattern NO_ERROR = Pattern.compile("[+-]?0+(,.*)?");

    private final List<String> queries;
    private final @Nullable String errors;
    private final String terminator;

    Scpi(PollSpec.Scpi scpi) {
        queries = scpi.queries();
        terminator = scpi.terminator();
        errors = scpi.errors();
    }

    @Override
    public int questions() {
        return queries.size();
    }

    @Override
    public int[] channels(int question) {
        return new int[] {question};
    }

    @Override
    public byte[] request(int question) {
        return message(queries.get(question));
    }

    private byte[] message(String query) {
        return (query + terminator).getBytes(StandardCharsets.US_ASCII);
    }

    @Override
    public byte @Nullable [] errorRequest() {
        return errors == null ? null : message(errors);
    }

    @Override
    public Reply error(byte[] bytes, int length) {
        String line = line(bytes, length, String.valueOf(errors));
        if (line == null) {
            return unfinished(length);
        }
        return Answer.of(NO_ERROR.matcher(line).matches() ? new Value(0) : new NoValue(shown(line)));
    }

    @Override
    public int instrument(int question) {
        return 0;
    }

    @Override
    public long silenceNanos() {
        return 0;
    }

    @Override
    public Reply reply(int question, byte[] bytes, int length) {
        String line = line(bytes, length, queries.get(question));
        return line == null ? unfinished(length) : Answer.of(result(line));
    }

    private static Reply unfinished(int length) {
        return length < LONGEST_ANSWER ? new Unfinished() : new Garbled("bytes without end, no answer");
    }

    /** The first whole line that says something; null: it is still to come. */
    private @Nullable String line(byte[] bytes, int length, String query) {
        String text = new String(bytes, 0, length, StandardCharsets.ISO_8859_1);
        int from = 0;
        for (int end = text.indexOf(terminator); end >= 0; end = text.indexOf(terminator, from)) {
            String line = text.substring(from, end).strip();
            from = end + terminator.length();
            // An end that was left over from the answer before, or an instrument that echoes.
            if (!line.isEmpty() && !line.equals(query)) {
                return line;
            }
        }
        return null;
    }

    private static Result result(String line) {
        String text = line.toUpperCase(Locale.ROOT);
        if (!NUMBER.matcher(text).matches()) {
            return new NoValue("it answers \"" + shown(line) + "\", which is not one number");
        }
        double number = Double.parseDouble(text);
        if (number == NOT_A_NUMBER) {
            return new NoValue("it answers 9.91E37: not a number");
        }
        if (Math.abs(number) == OVERLOAD) {
            return new NoValue(number > 0 ? "it answers 9.9E37: overload" : "it answers -9.9E37: overload");
        }
        return Double.isInfinite(number) ? new NoValue("it answers a number beyond all bounds") : new Value(number);
    }

    /** What an instrument sends may do nothing to a terminal. */
    private static String shown(String line) {
        String start = line.length() <= LONGEST_QUOTE ? line : line.substring(0, LONGEST_QUOTE) + "…";
        return start.replaceAll("[^ -~…]", "?");
    }
}
