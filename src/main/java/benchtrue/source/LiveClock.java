package benchtrue.source;

import benchtrue.reading.Reading;
import java.time.Instant;
import org.jspecify.annotations.Nullable;

/** Numbers and times of the readings of a live run, which goes on where its record ended. */
final class LiveClock {
    private static final long NANOS_PER_MICRO = 1000;
    private static final long MICROS = 1_000_000;

    private final DeviceClock clock = new DeviceClock();
    private final ArrivalClock arrivals;
    private long count;
    private @Nullable Instant started;

    LiveClock(Recorded before) {
        arrivals = new ArrivalClock(System.nanoTime(), Instant.now(), before.lastUtcMicros() + 1);
        count = before.readings();
        started = before.started();
        if (started != null) {
            clock.take((started.getEpochSecond() * MICROS + started.getNano() / NANOS_PER_MICRO) * NANOS_PER_MICRO);
        }
    }

    /** For the thread at the line. */
    ArrivalClock arrivals() {
        return arrivals;
    }

    /** Fills in number and time of a reading that arrived. */
    void take(long utcMicros, Reading into) {
        if (started == null) {
            started = Instant.ofEpochSecond(
                    Math.floorDiv(utcMicros, MICROS), Math.floorMod(utcMicros, MICROS) * NANOS_PER_MICRO);
        }
        into.number = ++count;
        into.time = clock.take(utcMicros * NANOS_PER_MICRO);
    }

    @Nullable
    Instant started() {
        return started;
    }
}
