package benchtrue.source;

import benchtrue.reading.Reading;
import benchtrue.sheet.BenchSheet;
import benchtrue.source.PolledReader.Answers;
import benchtrue.source.PolledReader.Event;
import benchtrue.source.PolledReader.Gone;
import benchtrue.source.PolledReader.Trouble;
import java.io.IOException;
import java.time.Instant;
import java.util.Objects;
import org.jspecify.annotations.Nullable;

/**
 * Readings of instruments that are asked, live: one for each round of questions that had an answer, at the time of its first. A
 * question without one counts as a line that could not be read.
 */
public final class PolledSource implements Source {
    private static final long WAIT_MILLIS = 20;

    private final String port;
    private final Recording recording;
    private final LiveClock clock;
    private final PolledReader reader;
    private boolean gone;
    private String problem = "";

    private PolledSource(String port, BenchSheet sheet, PortLink link, Recorded before, Recording recording) {
        this.port = port;
        this.recording = recording;
        clock = new LiveClock(before);
        reader = new PolledReader(
                port,
                sheet,
                Objects.requireNonNull(sheet.poll()),
                Objects.requireNonNull(sheet.line()),
                link,
                clock.arrivals(),
                recording);
        Thread thread = new Thread(reader, "line " + port);
        thread.setDaemon(true);
        thread.start();
    }

    /**
     * Opens the port and begins to ask.
     *
     * @param sheet has a line and a poll
     * @param before what was recorded of the run already
     * @throws IOException with a message in words, where the port cannot be opened
     */
    public static PolledSource open(String port, BenchSheet sheet, Recorded before, Recording recording)
            throws IOException {
        PortLink link = PortLink.open(port, Objects.requireNonNull(sheet.line()));
        return new PolledSource(port, sheet, link, before, recording);
    }

    @Override
    public Outcome next(Reading into) {
        try {
            Event event = reader.next(WAIT_MILLIS);
            return event == null ? waiting() : outcome(event, into);
        } catch (InterruptedException e) {
            Thread.currentThread().interrupt();
            return Outcome.END;
        }
    }

    private Outcome waiting() {
        return gone ? Outcome.LOST : Outcome.WAITING;
    }

    private Outcome outcome(Event event, Reading into) {
        gone = event instanceof Gone;
        if (event instanceof Gone away) {
            problem = port + ": " + away.why();
        } else if (event instanceof Trouble trouble) {
            recording.unread(trouble.utcMicros());
            problem = port + ": " + trouble.problem();
            return Outcome.MALFORMED;
        } else if (event instanceof Answers answers) {
            recording.reading(answers.utcMicros(), answers.values());
            System.arraycopy(answers.values(), 0, into.values, 0, into.values.length);
            clock.take(answers.utcMicros(), into);
            return Outcome.READING;
        }
        return waiting();
    }

    @Override
    public String problem() {
        return problem;
    }

    @Override
    public @Nullable Instant startedUtc() {
        return clock.started();
    }

    @Override
    public double progress() {
        return Double.NaN;
    }

    @Override
    public long lost() {
        return reader.lost();
    }

    @Override
    public int queued() {
        return reader.queued();
    }

    @Override
    public void close() {
        reader.close();
    }
}
