package benchtrue.screen;

import benchtrue.model.Interval;
import benchtrue.run.Snapshot;
import java.util.Arrays;

/**
 * The path of one estimate over the segment. Solid: the estimate; dotted: estimate ± U; long dashes: the reference; short
 * dashes: the limits. What lies outside of the drawn range is left out.
 */
final class PathPlot {
    private static final int LABELS = 11;
    /** The range is that of the band after this share of the path: before, it is still closing in. */
    private static final double SETTLED_SHARE = 0.3;
    /** A reference or limit farther away than so many ranges would squash the band. */
    private static final double FARTHEST = 2;

    private final Canvas canvas;
    private final Snapshot.UnknownView unknown;
    private final Dots dots;
    private double least = Double.POSITIVE_INFINITY;
    private double greatest = Double.NEGATIVE_INFINITY;

    PathPlot(Canvas canvas, Snapshot.UnknownView unknown) {
        this.canvas = canvas;
        this.unknown = unknown;
        dots = new Dots(canvas.width() - LABELS, canvas.height() - 1, canvas.ascii());
    }

    void draw() {
        if (dots.width() < 4 || dots.height() < 2) {
            return;
        }
        findRange();
        double[] path = unknown.path();
        double[] band = unknown.pathU();
        Interval limits = unknown.limits();
        if (limits != null) {
            across(limits.lower(), 4, 2, '=');
            across(limits.upper(), 4, 2, '=');
        }
        across(unknown.reference(), 8, 6, '-');
        int before = Integer.MIN_VALUE;
        for (int x = 0; x < dots.width(); x++) {
            int i = (int) Math.round((double) x / (dots.width() - 1) * (path.length - 1));
            if (x % 2 == 0 || canvas.ascii()) {
                dots.set(x, y(path[i] + band[i]), '.');
                dots.set(x, y(path[i] - band[i]), '.');
            }
            int y = y(path[i]);
            dots.join(x, before == Integer.MIN_VALUE || !inside(before) ? y : before, y, '*');
            before = y;
        }
        dots.draw(canvas, LABELS, 0);
        label();
    }

    private boolean inside(int y) {
        return y >= 0 && y < dots.height();
    }

    private void findRange() {
        double[] path = unknown.path();
        double[] band = unknown.pathU();
        for (int i = (int) (SETTLED_SHARE * path.length); i < path.length; i++) {
            if (Double.isFinite(band[i])) {
                include(path[i] - band[i]);
                include(path[i] + band[i]);
            }
        }
        if (!(greatest >= least)) {
            Arrays.stream(path).filter(Double::isFinite).forEach(this::include);
        }
        double reach = FARTHEST * (greatest - least);
        double low = least - reach;
        double high = greatest + reach;
        Interval limits = unknown.limits();
        double[] marks = limits == null
                ? new double[] {unknown.reference()}
                : new double[] {unknown.reference(), limits.lower(), limits.upper()};
        for (double mark : marks) {
            if (mark >= low && mark <= high) {
                include(mark);
            }
        }
        double margin = greatest > least ? 0.05 * (greatest - least) : Math.max(Math.abs(least), 1) * 1e-6;
        least -= margin;
        greatest += margin;
    }

    private void include(double value) {
        least = Math.min(least, value);
        greatest = Math.max(greatest, value);
    }

    private int y(double value) {
        if (!Double.isFinite(value)) {
            return Integer.MIN_VALUE;
        }
        return (int) Math.round((greatest - value) / (greatest - least) * (dots.height() - 1));
    }

    private void across(double value, int period, int on, char mark) {
        if (!(value >= least && value <= greatest)) {
            return;
        }
        for (int x = 0; x < dots.width(); x++) {
            if (x % period < on || canvas.ascii()) {
                dots.set(x, y(value), mark);
            }
        }
    }

    private void label() {
        int rows = canvas.height() - 1;
        int digits = digits();
        String[] written = new String[rows];
        Arrays.fill(written, "");
        written[0] = Texts.value(greatest, digits);
        written[rows - 1] = Texts.value(least, digits);
        mark(written, unknown.reference(), "reference");
        Interval limits = unknown.limits();
        if (limits != null) {
            mark(written, limits.lower(), "limit");
            mark(written, limits.upper(), "limit");
        }
        for (int row = 0; row < rows; row++) {
            canvas.putLeftOf(LABELS - 1, row, canvas.fitted(written[row], LABELS - 1), Style.PLAIN);
        }
        double[] times = unknown.pathTime();
        canvas.put(LABELS, rows, Texts.clock(times[0]));
        canvas.putLeftOf(canvas.width(), rows, Texts.clock(times[times.length - 1]), Style.PLAIN);
    }

    private void mark(String[] written, double value, String word) {
        int row = y(value) * (canvas.height() - 1) / dots.height();
        if (value >= least && value <= greatest && row >= 0 && row < written.length) {
            written[row] = word;
        }
    }

    /** Enough to tell the ends of the range apart, and two more. */
    private int digits() {
        double size = Math.max(Math.abs(least), Math.abs(greatest));
        double ratio = size / (greatest - least);
        return Math.max(3, Math.min(9, 2 + (int) Math.ceil(Math.log10(Math.max(1, ratio)))));
    }
}
