package benchtrue.source;

/** How long an instrument that does not answer is left alone: longer after each failure in a row. */
final class BackOff {
    private static final long LONGEST_NANOS = 5_000_000_000L;

    private int failures;
    private long until;

    /** @param nanos until the instrument may be asked again after the first failure; doubled after each further one */
    long failed(long nanos, long now) {
        long longest = Math.max(LONGEST_NANOS, nanos);
        // 2^failures times as long: no more than the limit, whatever the count.
        long wait = failures < Integer.SIZE && nanos << failures <= longest ? nanos << failures : longest;
        failures++;
        until = now + wait;
        return wait;
    }

    boolean hasFailed() {
        return failures > 0;
    }

    void answered() {
        failures = 0;
    }

    /** Nanoseconds until it may be asked again; not positive where it may. */
    long left(long now) {
        return failures == 0 ? 0 : until - now;
    }
}
