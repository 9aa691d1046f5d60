package benchtrue.source;

import benchtrue.model.Conversion;
import benchtrue.sheet.Channel;
import benchtrue.source.Source.Outcome;
import java.io.IOException;
import java.util.List;

/** Turns the rows of readings.csv into device times and values in the units of the sheet. */
final class RowReader implements Rows {
    private final CsvRows rows;
    private final Columns columns;
    private final List<Channel> channels;
    private final boolean decimalComma;
    private final TimeCells times;
    private final long size;
    private boolean any;
    private boolean dated;

    /** @param size of the file in bytes; 0 where it is not known */
    RowReader(CsvRows rows, Columns columns, List<Channel> channels, boolean decimalComma, long size) {
        this.rows = rows;
        this.columns = columns;
        this.channels = channels;
        this.decimalComma = decimalComma;
        this.size = size;
        times = new TimeCells(columns.timeDecimals());
    }

    @Override
    public boolean isDated() {
        return dated;
    }

    @Override
    public void next(ReplayRow into) {
        try {
            switch (rows.next()) {
                case ROW -> row(into);
                case TOO_LONG -> malformed(into, "longer than " + CsvRows.LONGEST + " bytes");
                case BADLY_QUOTED -> malformed(into, "a quotation mark is not closed, or text follows a closing one");
                case END -> into.is(Outcome.END, rows.line(), "");
            }
        } catch (IOException e) {
            into.is(Outcome.FAILED, rows.line(), "could not be read on: " + Failure.words(e));
        }
    }

    private void malformed(ReplayRow into, String problem) {
        into.is(Outcome.MALFORMED, rows.line(), problem);
    }

    private void row(ReplayRow into) {
        if (rows.cells() != columns.count()) {
            malformed(into, countProblem());
        } else if (readTime(into) && readValues(into)) {
            into.is(Outcome.READING, rows.line(), "");
        }
    }

    private String countProblem() {
        String counted =
                rows.cells() + (rows.cells() == 1 ? " cell" : " cells") + " where the header has " + columns.count();
        return rows.cells() > columns.count()
                ? counted + "; a number with a decimal comma takes two: quote it, or write a point"
                : counted;
    }

    private boolean readTime(ReplayRow into) {
        byte[] bytes = rows.bytes();
        int from = rows.start(0);
        int to = rows.end(0);
        while (from < to && Decimals.isBlank(bytes[from])) {
            from++;
        }
        while (to > from && Decimals.isBlank(bytes[to - 1])) {
            to--;
        }
        boolean date = TimeCells.isDated(bytes, from, to);
        if (any && date != dated && from < to) {
            malformed(
                    into,
                    "time: " + quoted(0)
                            + (dated
                                    ? " is no date as in the rows before"
                                    : " is a date, and no number as in the rows before"));
            return false;
        }
        into.nanos = date ? times.dated(bytes, from, to) : times.decimal(bytes, from, to, point(0));
        if (into.nanos == TimeCells.UNREADABLE) {
            malformed(into, from == to ? "time is missing" : "time: " + quoted(0) + " is no time");
            return false;
        }
        any = true;
        dated = date;
        return true;
    }

    private boolean readValues(ReplayRow into) {
        for (int channel = 0; channel < into.values.length; channel++) {
            int cell = columns.column()[channel];
            double value = Decimals.parse(rows.bytes(), rows.start(cell), rows.end(cell), point(cell));
            if (Double.isInfinite(value)) {
                malformed(into, channels.get(channel).name() + ": " + quoted(cell) + " is no number" + commaHint(cell));
                return false;
            }
            Conversion conversion = columns.conversion()[channel];
            into.values[channel] = conversion == null ? value : conversion.apply(value);
        }
        return true;
    }

    /** A decimal comma can only stand within quotes; there it may where the line has one. */
    private char point(int cell) {
        return decimalComma && rows.isQuoted(cell) && hasComma(cell) ? ',' : '.';
    }

    private boolean hasComma(int cell) {
        for (int at = rows.start(cell); at < rows.end(cell); at++) {
            if (rows.bytes()[at] == ',') {
                return true;
            }
        }
        return false;
    }

    private String commaHint(int cell) {
        return !decimalComma && rows.isQuoted(cell) && hasComma(cell)
                ? ": the sheet declares no decimal comma (decimal_comma = true under [line])"
                : "";
    }

    private String quoted(int cell) {
        return '"' + CellText.shown(rows.bytes(), rows.start(cell), rows.end(cell)) + '"';
    }

    @Override
    public double progress() {
        return size > 0 ? Math.min(1, (double) rows.consumed() / size) : Double.NaN;
    }

    @Override
    public void close() throws IOException {
        rows.close();
    }
}
