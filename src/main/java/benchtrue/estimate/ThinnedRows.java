package benchtrue.estimate;

import java.util.Arrays;

/**
 * An even thinning of rows in bounded memory: those of every 2ᵏ-th reading are kept, k growing whenever the room is full. Which
 * are kept depends on nothing but their number. Rows are stored multiplied by √w, so that all have the same variance.
 */
public final class ThinnedRows {
    /** Enough for a robust fit to a third of a percent of a standard deviation. */
    private static final int MOST = 100_000;
    /** With more unknowns fewer rows are kept, so that a fit takes no longer. */
    private static final int UNKNOWNS_OF_MOST = 8;

    private final int p;
    private final int most;
    private double[][] rows = new double[64][];
    private long[] readings = new long[64];
    private int size;
    private long reading = -1;
    private long stride = 1;

    public ThinnedRows(int unknowns) {
        this(unknowns, (int) (MOST * Math.min(1, Math.pow(UNKNOWNS_OF_MOST / (double) unknowns, 2))));
    }

    ThinnedRows(int unknowns, int most) {
        p = unknowns;
        this.most = most;
    }

    /** The rows that follow are of the next reading. */
    public void next() {
        reading++;
    }

    /** φ is copied. */
    public void add(double[] phi, double y, double w) {
        while (reading % stride == 0 && size == most) {
            halve();
        }
        if (reading % stride != 0) {
            return;
        }
        if (size == rows.length) {
            rows = Arrays.copyOf(rows, Math.min(most, 2 * size));
            readings = Arrays.copyOf(readings, rows.length);
        }
        double root = Math.sqrt(w);
        double[] row = new double[p + 1];
        for (int j = 0; j < p; j++) {
            row[j] = root * phi[j];
        }
        row[p] = root * y;
        readings[size] = reading;
        rows[size++] = row;
    }

    private void halve() {
        stride *= 2;
        int kept = 0;
        for (int i = 0; i < size; i++) {
            if (readings[i] % stride == 0) {
                readings[kept] = readings[i];
                rows[kept++] = rows[i];
            }
        }
        Arrays.fill(rows, kept, size, null);
        size = kept;
    }

    int unknowns() {
        return p;
    }

    public int size() {
        return size;
    }

    /** Every how many-th reading was kept. */
    public long stride() {
        return stride;
    }

    /** √w·φ with √w·y behind it; kept, not to be written. */
    double[] row(int i) {
        return rows[i];
    }

    /** √w·(y − φᵀθ). */
    double residual(int i, double[] theta) {
        double[] row = rows[i];
        double residual = row[p];
        for (int j = 0; j < p; j++) {
            residual -= row[j] * theta[j];
        }
        return residual;
    }
}
