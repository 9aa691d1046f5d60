package benchtrue.source;

import java.math.BigDecimal;

/**
 * From the times that a device gave its readings to the time of the run, which never goes back. A device that starts anew, or
 * whose clock is set back, goes on where it was, one usual interval later: how long it was away its own clock cannot tell.
 */
final class DeviceClock {
    enum Step {
        /** Later than the reading before. */
        ON,
        REPEATS,
        /** A little earlier: rows out of order. */
        BACK,
        /** Far back or far ahead: a restart or a gap if the next reading bears it out, else a slip in this one. */
        DOUBTFUL,
        /** So many rows in order behind the newest are no slips: the clock was set back a little. */
        SET_BACK
    }

    private static final double NANOS = 1e9;

    /** Rows that are out of order, or a logger's jitter, stay within it. */
    private static final long FEW_INTERVALS = 3;

    private static final long LITTLE = 1_000_000_000L;
    private static final int ROWS_IN_ORDER = 5;

    private boolean running;
    private long zero;
    private long newest;
    private long interval;
    private long behind;
    private int rowsBehind;

    /** @param nanos device time of a reading, in ns */
    Step judge(long nanos) {
        if (!running || isOn(nanos)) {
            return Step.ON;
        }
        if (nanos == newest) {
            return Step.REPEATS;
        }
        if (isFar(nanos)) {
            return Step.DOUBTFUL;
        }
        rowsBehind = rowsBehind > 0 && nanos > behind ? rowsBehind + 1 : 1;
        behind = nanos;
        return rowsBehind == ROWS_IN_ORDER ? Step.SET_BACK : Step.BACK;
    }

    private boolean isOn(long nanos) {
        return nanos > newest && !isFar(nanos);
    }

    private boolean isFar(long nanos) {
        return Math.abs((double) nanos - newest) > Math.max(LITTLE, FEW_INTERVALS * interval);
    }

    /** Whether the reading after a doubtful one goes on from it, not from the reading before it. */
    boolean bearsOut(long doubtful, long after) {
        return doubtful < newest ? after <= newest : after >= doubtful;
    }

    boolean isBack(long nanos) {
        return running && nanos < newest;
    }

    /** How far in seconds the time is from the newest, without sign. */
    BigDecimal distance(long nanos) {
        BigDecimal apart = BigDecimal.valueOf(nanos, 9).subtract(BigDecimal.valueOf(newest, 9));
        return apart.abs().stripTrailingZeros();
    }

    /** Takes a reading that goes on, and gives its time of the run in seconds. */
    double take(long nanos) {
        if (!running) {
            zero = nanos;
            running = true;
        } else if (!isFar(nanos) || interval == 0) {
            interval = nanos - newest;
        }
        return settle(nanos);
    }

    /** Takes the first reading after a restart or after a clock that was set back. */
    double restart(long nanos) {
        zero = nanos - (newest - zero + interval);
        return settle(nanos);
    }

    private double settle(long nanos) {
        newest = nanos;
        rowsBehind = 0;
        return (nanos - zero) / NANOS;
    }
}
