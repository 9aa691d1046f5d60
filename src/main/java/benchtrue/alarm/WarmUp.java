package benchtrue.alarm;

/**
 * Whether the innovations have leaned to one side since the run began, and lean less and less: then the rig, or an
 * instrument, was still warming up. Windows of 64 standardised innovations, whose lag-1
 * autocorrelation within the window is allowed for; the largest lean must be beyond 6 of its standard
 * deviations, lie in one of the first windows, and have fallen below half of it while staying on its side.
 */
final class WarmUp {
    private static final int WINDOW = 64;
    private static final double CLEAR = 6;
    private static final int FIRST = 4;
    private static final int FEWEST = 3;

    private double sum;
    private double squares;
    private double differences;
    private double last;
    private int inWindow;
    private int windows;
    private double peak;
    private int side;
    private boolean over;

    /** @return true once, when the lean has fallen to half of its largest */
    boolean add(double t) {
        if (over) {
            return false;
        }
        double clipped = Math.max(-Suspense.CLIP, Math.min(Suspense.CLIP, t));
        sum += clipped;
        squares += clipped * clipped;
        differences += inWindow == 0 ? 0 : (clipped - last) * (clipped - last);
        last = clipped;
        if (++inWindow < WINDOW) {
            return false;
        }
        double spread = squares - sum * sum / WINDOW;
        double same = Math.max(0, 1 - differences / (2 * spread));
        double lean = sum / Math.sqrt(WINDOW * (1 + same) / (1 - same));
        sum = 0;
        squares = 0;
        differences = 0;
        inWindow = 0;
        return close(lean);
    }

    private boolean close(double lean) {
        windows++;
        if (side == 0 && Math.abs(lean) > CLEAR) {
            side = lean > 0 ? 1 : -1;
        }
        double size = side * lean;
        if (side != 0 && size > peak && windows <= FIRST) {
            peak = size;
        } else if (windows > FEWEST && side != 0 && size > 0 && size < peak / 2) {
            over = true;
            return true;
        }
        over = (side == 0 && windows >= FIRST) || (side != 0 && size < 0);
        return false;
    }
}
