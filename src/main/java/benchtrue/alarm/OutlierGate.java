package benchtrue.alarm;

import java.util.Arrays;

/**
 * The sample test of one relation: a standardised innovation beyond its bound is an outlier and held out; eight in a row on
 * one side are a step and are let in again; three in twenty that are no such row are an intermittent connection, and then
 * the estimates are held. Where the readings between the outliers are as wide as the outliers themselves, the noise has
 * grown, and holding out would only hide it.
 *
 * <p>Five of eight on one side would mistake a loose lead for a step in 12 % of its readings in 9 runs of 100.
 */
final class OutlierGate {
    static final int ROW = 8;
    private static final int SHORT_ROW = 5;
    static final int WINDOW = 20;
    private static final int BURST = 3;
    /** Mean square of standardised readings between outliers above which the noise itself has grown; 1 when it has not. */
    private static final double NOISY = 2.5;

    private static final double SMALL_SAMPLE = 6;
    /** An outlier beyond so many bounds is never explained by more noise. */
    private static final double GROSS = 3;

    private static final Decision USE = new Decision.Use();
    private static final Decision OUTLIER = new Decision.HoldOut("outlier");
    private static final Decision INTERMITTENT = new Decision.HoldOut("intermittent");
    private static final Decision STEP = new Decision.Readmit(ROW);

    private final boolean holdsOut;
    private final byte[] sides = new byte[WINDOW];
    private final double[] squares = new double[WINDOW];
    private int next;
    private int row;
    private int rowSide;
    private boolean gross;
    private long outliers;
    private boolean intermittent;
    private boolean confirmed;

    /** @param holdsOut whether outliers are held out, or used and only counted */
    OutlierGate(boolean holdsOut) {
        this.holdsOut = holdsOut;
    }

    /**
     * @param t the standardised innovation; NaN counts as untested
     * @param bound of |t|; NaN: not tested
     */
    Decision judge(double t, double bound) {
        if (!(Math.abs(t) <= Double.MAX_VALUE) || Double.isNaN(bound)) {
            row = 0;
            return USE;
        }
        int side = Math.abs(t) > bound ? (t > 0 ? 1 : -1) : 0;
        remember(side, t);
        row = side == 0 ? 0 : side == rowSide ? row + 1 : 1;
        rowSide = side;
        gross = side != 0 && (row == 1 || gross) && Math.abs(t) > GROSS * bound;
        confirmed = row >= ROW;
        if (confirmed) {
            clear();
            return holdsOut ? STEP : USE;
        }
        intermittent = isIntermittent();
        if (!holdsOut) {
            return USE;
        }
        if (intermittent) {
            return INTERMITTENT;
        }
        return side == 0 || (Math.abs(t) <= GROSS * bound && noisy()) ? USE : OUTLIER;
    }

    private void remember(int side, double t) {
        sides[next] = (byte) side;
        squares[next] = t * t;
        next = next + 1 == WINDOW ? 0 : next + 1;
        if (side != 0) {
            outliers++;
        }
    }

    /** Three in twenty, with good readings between them, and those no wider than they should be. */
    private boolean isIntermittent() {
        int out = count();
        return out >= BURST && out > row && !noisy();
    }

    /**
     * Whether the good readings since the first outlier are themselves too wide: mean square above 2.5, and above that by
     * chance in less than 1 % where there are few.
     */
    private boolean noisy() {
        double sum = 0;
        int good = 0;
        boolean since = false;
        for (int i = 0; i < WINDOW; i++) {
            int at = (next + i) % WINDOW;
            since |= sides[at] != 0;
            if (since && sides[at] == 0) {
                sum += squares[at];
                good++;
            }
        }
        return sum > NOISY * good + SMALL_SAMPLE && good > 0;
    }

    private int count() {
        int out = 0;
        for (byte side : sides) {
            out += side == 0 ? 0 : 1;
        }
        return out;
    }

    /** Forgets the last readings, as at the beginning of a segment; the count of outliers stays. */
    void clear() {
        Arrays.fill(sides, (byte) 0);
        Arrays.fill(squares, 0);
        row = 0;
        intermittent = false;
    }

    /** Length of the row of outliers on one side that ends with the last reading. */
    int row() {
        return row;
    }

    /**
     * Whether a row of outliers is open that may be a loose connection as well as a change: five on one side are a change, but
     * of very large ones eight.
     */
    boolean unresolved() {
        return row > 0 && row < (gross ? ROW : SHORT_ROW);
    }

    boolean intermittent() {
        return intermittent;
    }

    /** Whether the last reading confirmed a step. */
    boolean confirmedStep() {
        return confirmed;
    }

    /** Whether the last reading was beyond its bound. */
    boolean out() {
        return row > 0;
    }

    long outliers() {
        return outliers;
    }
}
