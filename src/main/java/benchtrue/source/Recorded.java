package benchtrue.source;

import benchtrue.reading.Reading;
import benchtrue.sheet.BenchSheet;
import java.io.IOException;
import java.nio.file.Path;
import java.time.Instant;
import java.time.temporal.ChronoUnit;
import org.jspecify.annotations.Nullable;

/**
 * How far a recorded run has come.
 *
 * @param seconds time of its last reading
 * @param started null where it has no reading, or none with a date
 */
public record Recorded(
        long readings, double seconds, @Nullable Instant started) {
    public static final Recorded NOTHING = new Recorded(0, 0, null);

    /** Counts the readings of a file. */
    public static Recorded of(Path readingsCsv, BenchSheet sheet) throws IOException {
        if (!(ReplaySource.open(readingsCsv, sheet) instanceof Opened.Ready ready)) {
            return NOTHING;
        }
        try (Source source = ready.source()) {
            Reading reading = new Reading(sheet.channels().size());
            long count = 0;
            while (true) {
                switch (source.next(reading)) {
                    case END, FAILED -> {
                        return new Recorded(count, count == 0 ? 0 : reading.time, source.startedUtc());
                    }
                    case READING -> count++;
                    default -> {}
                }
            }
        }
    }

    /** µs since 1970 of the first reading; 0 where there is none. */
    public long firstUtcMicros() {
        return started == null ? 0 : ChronoUnit.MICROS.between(Instant.EPOCH, started);
    }

    /** µs since 1970 that the last reading cannot lie after. */
    long lastUtcMicros() {
        return started == null
                ? Long.MIN_VALUE / 2
                : ChronoUnit.MICROS.between(Instant.EPOCH, started) + (long) Math.ceil(seconds * 1e6);
    }
}
