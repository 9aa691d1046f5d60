package benchtrue.source;

import benchtrue.sheet.PollSpec;
import java.math.BigDecimal;
import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.Locale;
import org.jspecify.annotations.Nullable;

/** Answers the sheet's queries; what it does not know it leaves without an answer, as instruments do. */
final class ScpiInstrument implements Instrument {
    private static final String NOT_A_NUMBER = "9.91E37";
    private static final int LONGEST = 4096;

    private final List<String> queries;
    private final String terminator;
    private final StringBuilder received = new StringBuilder();

    ScpiInstrument(PollSpec.Scpi scpi) {
        queries = scpi.queries().stream()
                .map(query -> query.strip().toUpperCase(Locale.ROOT))
                .toList();
        terminator = scpi.terminator();
    }

    @Override
    public byte[] answer(byte[] bytes, int length, @Nullable BigDecimal[] cells) {
        received.append(new String(bytes, 0, length, StandardCharsets.ISO_8859_1));
        StringBuilder answers = new StringBuilder();
        for (int end = received.indexOf(terminator); end >= 0; end = received.indexOf(terminator)) {
            String query = received.substring(0, end).strip().toUpperCase(Locale.ROOT);
            received.delete(0, end + terminator.length());
            int channel = queries.indexOf(query);
            if (channel >= 0) {
                BigDecimal cell = cells[channel];
                answers.append(cell == null ? NOT_A_NUMBER : cell.toPlainString())
                        .append(terminator);
            }
        }
        if (received.length() > LONGEST) {
            received.setLength(0);
        }
        return answers.toString().getBytes(StandardCharsets.US_ASCII);
    }

    /** A message may come in pieces, typed by hand. */
    @Override
    public void silence() {}
}
