package benchtrue.run;

import org.jspecify.annotations.Nullable;

/** The last rows of one group, so that those held out can be let in again when they turn out to be a step. */
final class RowRing {
    private final Row[][] rows;
    private final long[] readings;
    private final double[] times;
    private final double[] elapsed;
    private final @Nullable String[][] held;
    private int next;
    private int size;

    RowRing(int capacity, int relations, int unknowns) {
        rows = new Row[capacity][relations];
        for (Row[] reading : rows) {
            for (int k = 0; k < relations; k++) {
                reading[k] = new Row(unknowns);
            }
        }
        held = new @Nullable String[capacity][relations];
        readings = new long[capacity];
        times = new double[capacity];
        elapsed = new double[capacity];
    }

    /** Copies the rows of a reading; those that must not be used come with {@code present} false. */
    void add(long reading, double time, double secondsSinceLast, Row[] from) {
        for (int k = 0; k < from.length; k++) {
            rows[next][k].copy(from[k]);
            held[next][k] = null;
        }
        readings[next] = reading;
        times[next] = time;
        elapsed[next] = secondsSinceLast;
        next = next + 1 == rows.length ? 0 : next + 1;
        size = Math.min(size + 1, rows.length);
    }

    /** The row of the reading last added is not to be used, come what may. */
    void bar(int relation) {
        rows[place(size - 1)][relation].present = false;
    }

    /** The row of the reading last added was held out by the sample test and may be let in again. */
    void hold(int relation, String reason) {
        held[place(size - 1)][relation] = reason;
    }

    /** Why the sample test held the row out; null where it did not. */
    @Nullable
    String held(int index, int relation) {
        return held[place(index)][relation];
    }

    int size() {
        return size;
    }

    /** @param index 0 is the oldest */
    long reading(int index) {
        return readings[place(index)];
    }

    double time(int index) {
        return times[place(index)];
    }

    double elapsed(int index) {
        return elapsed[place(index)];
    }

    Row row(int index, int relation) {
        return rows[place(index)][relation];
    }

    /** Index of the oldest of the last {@code count} present rows of a relation; 0 where the ring holds fewer. */
    int oldestOf(int relation, int count) {
        int left = count;
        for (int i = size - 1; i >= 0; i--) {
            if (row(i, relation).present && --left == 0) {
                return i;
            }
        }
        return 0;
    }

    void clear() {
        size = 0;
    }

    private int place(int index) {
        return (next - size + index + rows.length) % rows.length;
    }
}
