package benchtrue.screen;

import benchtrue.run.Snapshot;
import java.util.Locale;

/** The last standardised innovations: a dot each, × held out, ▲ ▼ beyond what is drawn; the bounds dashed. */
final class StripPlot {
    private static final int LABELS = 6;
    /** How far beyond the bound is drawn. */
    private static final double MORE = 1.4;

    private static final double BOUND_WHILE_UNTESTED = 4;

    private final Canvas canvas;
    private final Snapshot.RelationView relation;
    private final Dots dots;
    private final double bound;

    StripPlot(Canvas canvas, Snapshot.RelationView relation) {
        this.canvas = canvas;
        this.relation = relation;
        bound = relation.bound() > 0 && Double.isFinite(relation.bound()) ? relation.bound() : BOUND_WHILE_UNTESTED;
        dots = new Dots(canvas.width() - LABELS, canvas.height(), canvas.ascii());
    }

    void draw() {
        int width = dots.width();
        if (width < 4 || dots.height() < 3) {
            return;
        }
        for (int x = 0; x < width; x++) {
            if (x % 6 < 3) {
                dots.set(x, y(bound), '-');
                dots.set(x, y(-bound), '-');
            }
            if (x % 4 == 0) {
                dots.set(x, y(0), '-');
            }
        }
        double[] strip = relation.strip();
        int from = Math.max(0, strip.length - width);
        for (int i = from; i < strip.length; i++) {
            if (Math.abs(strip[i]) <= MORE * bound && !relation.heldOut()[i]) {
                dots.set(width - strip.length + i, y(strip[i]), '*');
            }
        }
        dots.draw(canvas, LABELS, 0);
        for (int i = from; i < strip.length; i++) {
            mark(i, width - strip.length + i);
        }
        canvas.putLeftOf(LABELS - 1, row(bound), label(bound), Style.PLAIN);
        canvas.putLeftOf(LABELS - 1, row(0), "0", Style.PLAIN);
        canvas.putLeftOf(LABELS - 1, row(-bound), label(-bound), Style.PLAIN);
    }

    private static String label(double bound) {
        return String.format(Locale.ROOT, "%+.1f", bound);
    }

    /** What is held out or beyond the drawn range gets a sign of its own. */
    private void mark(int i, int x) {
        double value = relation.strip()[i];
        boolean beyond = Math.abs(value) > MORE * bound;
        if (Double.isNaN(value) || !(beyond || relation.heldOut()[i])) {
            return;
        }
        int row = Math.max(0, Math.min(canvas.height() - 1, row(value)));
        String sign = relation.heldOut()[i] ? "×" : value > 0 ? "▲" : "▼";
        canvas.put(LABELS + (canvas.ascii() ? x : x / 2), row, sign, Style.STRONG);
    }

    private int y(double value) {
        return (int) Math.round((1 - value / (MORE * bound)) / 2 * (dots.height() - 1));
    }

    private int row(double value) {
        double clamped = Math.max(-MORE * bound, Math.min(MORE * bound, value));
        return canvas.ascii() ? y(clamped) : y(clamped) / 4;
    }
}
