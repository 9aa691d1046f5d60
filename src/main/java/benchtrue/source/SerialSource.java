package benchtrue.source;

import benchtrue.reading.Reading;
import benchtrue.sheet.BenchSheet;
import benchtrue.sheet.LineSpec;
import java.io.IOException;
import java.time.Instant;
import java.util.Objects;
import org.jspecify.annotations.Nullable;

/**
 * Readings from a serial line, live. What is recorded of them gives, replayed, the same readings to the last bit: the times of
 * both are whole microseconds since the first.
 */
public final class SerialSource implements Source {
    private static final long WAIT_MILLIS = 20;

    private final String port;
    private final Recording recording;
    private final SerialReader reader;
    private final LineParser parser;
    private final LiveClock clock;
    private boolean gone;
    private String problem = "";

    private SerialSource(
            String port, BenchSheet sheet, LineSpec spec, PortLink link, Recorded before, Recording recording) {
        this.port = port;
        this.recording = recording;
        parser = new LineParser(sheet);
        clock = new LiveClock(before);
        reader = new SerialReader(port, spec, link, clock.arrivals(), recording);
        Thread thread = new Thread(reader, "line " + port);
        thread.setDaemon(true);
        thread.start();
    }

    /**
     * Opens the port; from then on lines are recorded.
     *
     * @param sheet has a line
     * @param before what was recorded of the run already
     * @throws IOException with a message in words, where the port cannot be opened
     */
    public static SerialSource open(String port, BenchSheet sheet, Recorded before, Recording recording)
            throws IOException {
        LineSpec spec = Objects.requireNonNull(sheet.line());
        return new SerialSource(port, sheet, spec, PortLink.open(port, spec), before, recording);
    }

    @Override
    public Outcome next(Reading into) {
        try {
            Arrival arrival = reader.poll(WAIT_MILLIS);
            if (arrival == null) {
                return gone ? Outcome.LOST : Outcome.WAITING;
            }
            byte[] line = arrival.line();
            if (line == null) {
                gone = !arrival.why().isEmpty();
                problem = port + ": " + arrival.why();
                return gone ? Outcome.LOST : Outcome.WAITING;
            }
            gone = false;
            return line(line, arrival, into);
        } catch (InterruptedException e) {
            Thread.currentThread().interrupt();
            return Outcome.END;
        }
    }

    private Outcome line(byte[] line, Arrival arrival, Reading into) {
        if (LineParser.isBlank(line)) {
            return Outcome.WAITING;
        }
        String wrong = parser.parse(line, 0, line.length, into);
        if (wrong.isEmpty() && !arrival.whole() && !parser.provesItself()) {
            wrong = "the first line after opening may be a part of one, and nothing in it proves that it is whole";
        }
        if (!wrong.isEmpty()) {
            recording.unread(arrival.utcMicros());
            problem = port + ": " + wrong;
            return Outcome.MALFORMED;
        }
        recording.reading(arrival.utcMicros(), into.values);
        clock.take(arrival.utcMicros(), into);
        return Outcome.READING;
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
