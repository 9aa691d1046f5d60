package benchtrue.source;

import benchtrue.reading.Reading;
import java.io.IOException;
import java.time.Instant;
import java.util.Locale;
import org.jspecify.annotations.Nullable;

/**
 * Readings from rows: rows that cannot be read are told with their line and never end a run; a time that goes back a little is
 * such a row, a device clock that starts anew is a restart.
 */
final class RowSource implements Source {
    private static final long NANOS = 1_000_000_000L;

    private final String name;
    private final Rows rows;
    private final DeviceClock clock = new DeviceClock();
    private ReplayRow row;
    private ReplayRow ahead;
    private boolean hasAhead;
    private boolean restarted;
    private long count;
    private String problem = "";
    private @Nullable Instant started;

    /** @param name of the file, for messages */
    RowSource(String name, Rows rows, int channels) {
        this.name = name;
        this.rows = rows;
        row = new ReplayRow(channels);
        ahead = new ReplayRow(channels);
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
            rows.next(ahead);
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
            rows.next(row);
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
        problem = what.isEmpty() ? "" : name + ":" + row.line + ": " + what;
        return outcome;
    }

    private Outcome fill(Reading into, double time) {
        if (count == 0 && rows.isDated()) {
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
        return rows.progress();
    }

    @Override
    public void close() throws IOException {
        rows.close();
    }
}
