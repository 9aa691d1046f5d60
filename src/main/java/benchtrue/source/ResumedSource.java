package benchtrue.source;

import benchtrue.reading.Reading;
import java.io.IOException;
import java.time.Instant;
import org.jspecify.annotations.Nullable;

/** First what was recorded of a run, then its line. */
public final class ResumedSource implements Source {
    private final Source record;
    private final Source line;
    private Source now;

    /** @param line numbers and times its readings on from the record's */
    public ResumedSource(Source record, Source line) {
        this.record = record;
        this.line = line;
        now = record;
    }

    @Override
    public Outcome next(Reading into) {
        Outcome outcome = now.next(into);
        if (outcome == Outcome.END && now.equals(record)) {
            now = line;
            return Outcome.WAITING;
        }
        return outcome;
    }

    @Override
    public String problem() {
        return now.problem();
    }

    @Override
    public @Nullable Instant startedUtc() {
        return now.startedUtc();
    }

    @Override
    public double progress() {
        return Double.NaN;
    }

    @Override
    public long lost() {
        return line.lost();
    }

    @Override
    public int queued() {
        return line.queued();
    }

    @Override
    public void close() throws IOException {
        try (record) {
            line.close();
        }
    }
}
