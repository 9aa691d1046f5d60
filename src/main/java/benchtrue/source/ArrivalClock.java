package benchtrue.source;

import java.time.Instant;
import java.time.temporal.ChronoUnit;

/**
 * Stamps of what arrives: the monotonic clock, laid once on the time of day, so that a clock of the machine that is set during
 * the run moves nothing. No two stamps are equal.
 */
final class ArrivalClock {
    private static final long NANOS_PER_MICRO = 1000;

    private final long startNanos;
    private final long startMicros;
    private long last = Long.MIN_VALUE;

    /**
     * @param nanos of the monotonic clock now
     * @param utc time of day now
     * @param notBefore µs since 1970; where the time of day lies before it, stamps begin there
     */
    ArrivalClock(long nanos, Instant utc, long notBefore) {
        startNanos = nanos;
        startMicros = Math.max(ChronoUnit.MICROS.between(Instant.EPOCH, utc), notBefore);
    }

    /** @return µs since 1970-01-01T00:00Z */
    long stamp(long nanos) {
        last = Math.max(last + 1, startMicros + (nanos - startNanos) / NANOS_PER_MICRO);
        return last;
    }
}
