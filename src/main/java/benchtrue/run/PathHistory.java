package benchtrue.run;

import java.util.Arrays;

/**
 * The path of some quantities over a run of any length in a fixed space: when it is full, every other point is dropped and
 * from then on half as many are kept. Points stay evenly spaced in readings.
 */
final class PathHistory {
    private final double[][] columns;
    private int size;
    private long stride = 1;
    private long offered;

    /** @param capacity how many points at most; even */
    PathHistory(int quantities, int capacity) {
        columns = new double[quantities][capacity];
    }

    /** Whether the next point is to be kept; to be asked once for each reading, so that a dropped one costs nothing. */
    boolean wants() {
        return offered++ % stride == 0;
    }

    void set(int quantity, double value) {
        columns[quantity][size] = value;
    }

    /** Closes the point whose quantities were set. */
    void keep() {
        size++;
        if (size == columns[0].length) {
            halve();
        }
    }

    private void halve() {
        for (double[] column : columns) {
            for (int i = 0; i < size / 2; i++) {
                column[i] = column[2 * i];
            }
        }
        size /= 2;
        stride *= 2;
    }

    void clear() {
        size = 0;
        stride = 1;
        offered = 0;
    }

    /** A copy, oldest first. */
    double[] copy(int quantity) {
        return Arrays.copyOf(columns[quantity], size);
    }
}
