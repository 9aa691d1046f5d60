package benchtrue.alarm;

import java.util.Arrays;

/**
 * The last 8192 readings as sums over stretches of 4, 8, 16, … 1024 readings, three or four of each length: the beginnings of
 * the stretches are the onsets that are considered, spaced geometrically, some 36 in all. Old stretches merge as new ones
 * come, so nothing accumulates rounding for longer than it is kept, and nothing is allocated.
 */
final class Onsets {
    /** Readings of the shortest stretch. */
    static final int SHORTEST = 4;

    private static final int LENGTHS = 9;
    private static final int EACH = 4;

    /** Newest first within each length, and one to spare. */
    private final Sums[][] stretches = new Sums[LENGTHS][EACH + 1];

    private final int[] filled = new int[LENGTHS];
    /** A reading beyond so many standard deviations after one within begins a stretch of its own: a large step is sharp. */
    private static final double FAR = 4;

    private boolean lastFar;
    private final Sums[] list = new Sums[LENGTHS * EACH + 1];
    private Sums open;
    private double kept = Double.NaN;

    Onsets(int regressors) {
        for (Sums[] row : stretches) {
            for (int i = 0; i < row.length; i++) {
                row[i] = new Sums(regressors);
            }
        }
        open = new Sums(regressors);
    }

    void add(double[] phi, double root, double error, double z, double time, long number) {
        boolean far = Math.abs(z) > FAR;
        if (far && !lastFar && open.count > 0) {
            open = push(0, open);
        }
        lastFar = far;
        if (open.count == 0) {
            open.clear(time, number);
        }
        open.add(phi, root, error, z, time);
        if (open.count == SHORTEST) {
            open = push(0, open);
        }
    }

    /** Puts a stretch in front of those of its length, and merges the two oldest where there are too many. */
    private Sums push(int length, Sums stretch) {
        Sums[] row = stretches[length];
        Sums spare = row[EACH];
        System.arraycopy(row, 0, row, 1, EACH);
        row[0] = stretch;
        if (++filled[length] > EACH) {
            merge(length);
        }
        spare.count = 0;
        return spare;
    }

    private void merge(int length) {
        Sums[] row = stretches[length];
        if (length + 1 == LENGTHS) {
            filled[length] = EACH;
        } else if (row[EACH - 1].start == kept) {
            filled[length] = EACH;
            row[EACH] = push(length + 1, row[EACH]);
        } else {
            filled[length] = EACH - 1;
            Sums both = row[EACH - 1];
            both.reach(row[EACH]);
            row[EACH - 1] = row[EACH];
            row[EACH] = push(length + 1, both);
        }
    }

    /** From now on stretches are not merged over this onset, in s. */
    void keep(double onset) {
        kept = onset;
    }

    void clear() {
        Arrays.fill(filled, 0);
        open.count = 0;
        kept = Double.NaN;
    }

    /** Forgets the stretches that reach beyond this time; each ends where the next newer one starts. */
    void forgetSince(double time) {
        double end = open.count > 0 ? open.start : Double.POSITIVE_INFINITY;
        open.count = 0;
        for (int length = 0; length < LENGTHS; length++) {
            int from = 0;
            while (from < filled[length] && end > time) {
                end = stretches[length][from].start;
                from++;
            }
            drop(length, from);
            if (filled[length] > 0) {
                return;
            }
        }
    }

    private void drop(int length, int newest) {
        Sums[] row = stretches[length];
        for (int i = newest; i < filled[length]; i++) {
            Sums kept = row[i];
            row[i] = row[i - newest];
            row[i - newest] = kept;
        }
        filled[length] -= newest;
    }

    /** Lists all stretches, newest first; the one being filled leads. */
    int list() {
        int n = 0;
        if (open.count > 0) {
            list[n++] = open;
        }
        for (int length = 0; length < LENGTHS; length++) {
            for (int i = 0; i < filled[length]; i++) {
                list[n++] = stretches[length][i];
            }
        }
        return n;
    }

    /** The k-th newest stretch of the last {@link #list}. */
    Sums listed(int k) {
        return list[k];
    }

    static int most() {
        return LENGTHS * EACH + 1;
    }
}
