package benchtrue.run;

/**
 * Ties run time to the clock of the machine: reading time × 1/pace. The clock decides only when a reading is taken, never
 * what it is.
 */
final class Pacer {
    /** A later change of pace, a pause or a jump starts a new stretch from here. */
    private double stretchTime;

    private long stretchNanos;
    private double pace;

    /** @param pace times real time, above 0; infinite: never waits */
    Pacer(double pace) {
        this.pace = pace;
    }

    double pace() {
        return pace;
    }

    void pace(double times, double runTime, long nowNanos) {
        pace = times;
        restart(runTime, nowNanos);
    }

    /** The reading at this run time is due now. */
    void restart(double runTime, long nowNanos) {
        stretchTime = runTime;
        stretchNanos = nowNanos;
    }

    /** Nanoseconds until the reading at this run time is due; not positive when it is due. */
    long wait(double runTime, long nowNanos) {
        if (Double.isInfinite(pace)) {
            return 0;
        }
        return stretchNanos + Math.round((runTime - stretchTime) / pace * 1e9) - nowNanos;
    }
}
