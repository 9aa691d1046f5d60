package benchtrue.source;

import benchtrue.sheet.BenchSheet;
import benchtrue.sheet.Dialect;
import benchtrue.sheet.LineSpec;
import benchtrue.sheet.Rehearsal;
import java.util.Map;

/** The lines of the simulated rig with the times at which they are due: those that {@link Rehearsing} writes to raw.log. */
public final class RehearsedLines {
    static final LineSpec PLAIN = new LineSpec(null, 9600, "8N1", ",", false, Map.of(), Dialect.PLAIN);

    private final LineSpec line;
    private final SimulatedRows rows;

    /**
     * A sheet without a line gets fields between commas.
     *
     * @param rehearsal the sheet's own
     */
    public RehearsedLines(BenchSheet sheet, Rehearsal rehearsal, long seed) {
        LineSpec own = sheet.line();
        line = own == null ? PLAIN : own;
        rows = new SimulatedRows(sheet, rehearsal, seed);
    }

    /** How the lines are sent. */
    public LineSpec line() {
        return line;
    }

    /** Goes to the next line; false after the last. */
    public boolean next() {
        return rows.advance();
    }

    /** When the line is due, in seconds since the start. */
    public double seconds() {
        return rows.seconds();
    }

    /** The line with its start and its end. */
    byte[] bytes() {
        return RawText.sent(line, rows);
    }
}
