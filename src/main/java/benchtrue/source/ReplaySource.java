package benchtrue.source;

import benchtrue.reading.Reading;
import benchtrue.sheet.BenchSheet;
import benchtrue.sheet.Mistake;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.NoSuchFileException;
import java.nio.file.Path;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.jspecify.annotations.Nullable;

/**
 * Readings from a file readings.csv, in its order. Rows that cannot be read are told with their line and never end a run; a
 * time that goes back a little is such a row, a device clock that starts anew is a restart.
 */
public final class ReplaySource implements Source {
    private static final long NANOS = 1_000_000_000L;

    private final String file;
    private final long size;
    private final CsvRows rows;
    private final RowReader reader;
    private final DeviceClock clock = new DeviceClock();
    private ReplayRow row;
    private ReplayRow ahead;
    private boolean hasAhead;
    private boolean restarted;
    private long count;
    private String problem = "";
    private @Nullable Instant started;

    private ReplaySource(Path path, long size, CsvRows rows, RowReader reader, int channels) {
        file = path.toString();
        this.size = size;
        this.rows = rows;
        this.reader = reader;
        row = new ReplayRow(channels);
        ahead = new ReplayRow(channels);
    }

    /** Reads the header; the file stays open where it is ready. */
    public static Opened open(Path readingsCsv, BenchSheet sheet) {
        CsvRows rows = null;
        try {
            rows = new CsvRows(Files.newInputStream(readingsCsv));
            Opened opened = open(readingsCsv, sheet, rows);
            if (opened instanceof Opened.Refused) {
                rows.close();
            }
            return opened;
        } catch (IOException e) {
            return refused(readingsCsv, 0, reason(e), "check its path and whether you may read it");
        }
    }

    private static Opened open(Path path, BenchSheet sheet, CsvRows rows) throws IOException {
        CsvRows.Kind kind = rows.next();
        if (kind == CsvRows.Kind.END) {
            return refused(path, 0, "the file is empty", "it begins with a header row: time, then the channels");
        }
        if (kind != CsvRows.Kind.ROW) {
            return refused(
                    path, 1, "the header row cannot be read", "give each column a short name, separated by commas");
        }
        if (isUtf16(rows)) {
            return refused(path, 1, "the file is in UTF-16", "save it as UTF-8");
        }
        HeaderReader header = new HeaderReader(path.toString(), rows, sheet.channels());
        Columns columns = header.read();
        if (columns == null) {
            return new Opened.Refused(header.mistakes());
        }
        List<Mistake> notices = new ArrayList<>(columns.notices());
        if (rows.isLast()) {
            notices.add(new Mistake(path.toString(), (int) rows.line(), 0, "there is no reading below the header", ""));
        }
        boolean decimalComma = sheet.line() != null && sheet.line().decimalComma();
        RowReader reader = new RowReader(rows, columns, sheet.channels(), decimalComma);
        long size = Files.isRegularFile(path) ? Files.size(path) : 0;
        return new Opened.Ready(
                new ReplaySource(path, size, rows, reader, sheet.channels().size()), notices);
    }

    private static boolean isUtf16(CsvRows rows) {
        int first = rows.start(0);
        if (rows.end(0) - first < 2) {
            return false;
        }
        int mark = ((rows.bytes()[first] & 0xFF) << 8) | (rows.bytes()[first + 1] & 0xFF);
        return mark == 0xFFFE || mark == 0xFEFF;
    }

    private static Opened refused(Path path, int line, String message, String remedy) {
        return new Opened.Refused(List.of(new Mistake(path.toString(), line, 0, message, remedy)));
    }

    private static String reason(IOException e) {
        if (e instanceof NoSuchFileException) {
            return "there is no such file";
        }
        String why = e.getMessage();
        return "cannot be read" + (why == null ? "" : ": " + why);
    }

    @Override
    public Outcome next(Reading into) {
        if (restarted) {
            restarted = false;
            return fill(into, clock.restart(row.nanos));
        }
        read();
        if (row.outcome != Outcome.READING) {
            return tell(row.outcome, row.problem);
        }
        return switch (clock.judge(row.nanos)) {
            case ON -> fill(into, clock.take(row.nanos));
            case REPEATS -> tell(Outcome.MALFORMED, "its time is that of the reading before");
            case BACK ->
                tell(Outcome.MALFORMED, away("its time lies %s s before that of an earlier row: out of order"));
            case SET_BACK -> restart();
            case DOUBTFUL -> doubtful(into);
        };
    }

    /** The row after decides whether the clock really is where this row says. */
    private Outcome doubtful(Reading into) {
        if (!hasAhead) {
            reader.next(ahead);
            hasAhead = true;
        }
        if (ahead.outcome == Outcome.READING && !clock.bearsOut(row.nanos, ahead.nanos)) {
            return tell(
                    Outcome.MALFORMED, away("its time is %s s from that of the row before, and the next row is not"));
        }
        return clock.isBack(row.nanos) ? restart() : fill(into, clock.take(row.nanos));
    }

    private void read() {
        if (hasAhead) {
            ReplayRow used = row;
            row = ahead;
            ahead = used;
            hasAhead = false;
        } else {
            reader.next(row);
        }
    }

    private Outcome restart() {
        restarted = true;
        return tell(
                Outcome.RESTART,
                away("the device's time goes back by %s s: it started anew, or its clock was set; run time goes on"));
    }

    private String away(String text) {
        return String.format(Locale.ROOT, text, clock.distance(row.nanos).toPlainString());
    }

    private Outcome tell(Outcome outcome, String what) {
        problem = what.isEmpty() ? "" : file + ":" + row.line + ": " + what;
        return outcome;
    }

    private Outcome fill(Reading into, double time) {
        if (count == 0 && reader.isDated()) {
            started = Instant.ofEpochSecond(Math.floorDiv(row.nanos, NANOS), Math.floorMod(row.nanos, NANOS));
        }
        into.number = ++count;
        into.time = time;
        System.arraycopy(row.values, 0, into.values, 0, row.values.length);
        return Outcome.READING;
    }

    @Override
    public String problem() {
        return problem;
    }

    @Override
    public @Nullable Instant startedUtc() {
        return started;
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
