package benchtrue.source;

import benchtrue.sheet.PollSpec;
import java.math.BigDecimal;
import java.nio.charset.StandardCharsets;
import java.util.ArrayDeque;
import java.util.Deque;
import java.util.List;
import java.util.Locale;
import java.util.Objects;
import org.jspecify.annotations.Nullable;

/** Answers the sheet's queries; what it does not know it leaves without an answer, as instruments do, and reports as an error. */
final class ScpiInstrument implements Instrument {
    private static final String NOT_A_NUMBER = "9.91E37";
    private static final String NO_ERROR = "0,\"No error\"";
    private static final String UNDEFINED_HEADER = "-113,\"Undefined header\"";
    private static final int MOST_ERRORS = 10;
    private static final int LONGEST = 4096;

    private final List<String> queries;
    private final String terminator;
    private final String errors;
    private final Deque<String> reported = new ArrayDeque<>();
    private final StringBuilder received = new StringBuilder();

    ScpiInstrument(PollSpec.Scpi scpi) {
        queries = scpi.queries().stream()
                .map(query -> query.strip().toUpperCase(Locale.ROOT))
                .toList();
        terminator = scpi.terminator();
        errors = Objects.requireNonNullElse(scpi.errors(), "").strip().toUpperCase(Locale.ROOT);
    }

    @Override
    public byte[] answer(byte[] bytes, int length, @Nullable BigDecimal[] cells) {
        received.append(new String(bytes, 0, length, StandardCharsets.ISO_8859_1));
        StringBuilder answers = new StringBuilder();
        for (int end = received.indexOf(terminator); end >= 0; end = received.indexOf(terminator)) {
            String query = received.substring(0, end).strip().toUpperCase(Locale.ROOT);
            received.delete(0, end + terminator.length());
            answer(query, cells, answers);
        }
        if (received.length() > LONGEST) {
            received.setLength(0);
        }
        return answers.toString().getBytes(StandardCharsets.US_ASCII);
    }

    private void answer(String query, @Nullable BigDecimal[] cells, StringBuilder answers) {
        int channel = queries.indexOf(query);
        if (channel >= 0) {
            BigDecimal cell = cells[channel];
            answers.append(cell == null ? NOT_A_NUMBER : cell.toPlainString()).append(terminator);
        } else if (query.equals(errors) && !errors.isEmpty()) {
            String error = reported.poll();
            answers.append(error == null ? NO_ERROR : error).append(terminator);
        } else if (!query.isEmpty() && reported.size() < MOST_ERRORS) {
            reported.add(UNDEFINED_HEADER);
        }
    }

    /** A message may come in pieces, typed by hand. */
    @Override
    public void silence() {}
}
