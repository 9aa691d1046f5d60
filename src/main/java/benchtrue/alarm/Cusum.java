package benchtrue.alarm;

/**
 * Two-sided tabular CUSUM (Page 1954; ISO 7870-4; NIST/SEMATECH e-Handbook 6.3.2.3):
 *
 * <pre>S⁺ ← max(0, S⁺ + z − k)   S⁻ ← max(0, S⁻ − z − k)</pre>
 */
final class Cusum {
    private double up;
    private double down;
    private long upSince;
    private long downSince;

    /** @param number of this reading, to remember since when an arm is off its stop */
    void step(double z, double slack, long number) {
        double rise = up + z - slack;
        double fall = down - z - slack;
        if (up == 0 && rise > 0) {
            upSince = number;
        }
        if (down == 0 && fall > 0) {
            downSince = number;
        }
        up = Math.max(0, rise);
        down = Math.max(0, fall);
    }

    void clear() {
        up = 0;
        down = 0;
    }

    double up() {
        return up;
    }

    double down() {
        return down;
    }

    boolean beyond(double limit) {
        return up > limit || down > limit;
    }

    /** Number of the reading at which the larger arm left its stop. */
    long since() {
        return up > down ? upSince : downSince;
    }
}
