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
    private static final long NANOS_PER_MICRO = 1000;
    private static final long MICROS = 1_000_000;
    private static final long WAIT_MILLIS = 20;

    private final String port;
    private final Recording recording;
    private final SerialReader reader;
    private final LineParser parser;
    private final DeviceClock clock = new DeviceClock();
    private long count;
    private boolean gone;
    private String problem = "";
    private @Nullable Instant started;

    private SerialSource(
            String port, BenchSheet sheet, LineSpec spec, PortLink link, Recorded before, Recording recording) {
        this.port = port;
        this.recording = recording;
        parser = new LineParser(sheet);
        ArrivalClock stamps = new ArrivalClock(System.nanoTime(), Instant.now(), before.lastUtcMicros() + 1);
        reader = new SerialReader(port, spec, link, stamps, recording);
        count = before.readings();
        started = before.started();
        if (started != null) {
            clock.take(micros(started) * NANOS_PER_MICRO);
        }
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

    private static long micros(Instant instant) {
        return instant.getEpochSecond() * MICROS + instant.getNano() / NANOS_PER_MICRO;
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
        if (parser.isBlank(line)) {
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
        if (started == null) {
            started = Instant.ofEpochSecond(
                    Math.floorDiv(arrival.utcMicros(), MICROS),
                    Math.floorMod(arrival.utcMicros(), MICROS) * NANOS_PER_MICRO);
        }
        into.number = ++count;
        into.time = clock.take(arrival.utcMicros() * NANOS_PER_MICRO);
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
