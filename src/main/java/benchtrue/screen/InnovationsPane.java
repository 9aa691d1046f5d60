package benchtrue.screen;

import benchtrue.run.Snapshot;
import java.util.List;
import java.util.Locale;

/** The standardised innovations of each relation with their bounds, and how far the CUSUM arms are filled. */
final class InnovationsPane implements Pane {
    private static final int LEAST_ROWS = 3;
    private static final int ARMS = 2;

    @Override
    public String title(Shown shown) {
        return "Innovations, in their sd";
    }

    @Override
    public void draw(Canvas canvas, Shown shown) {
        List<Snapshot.RelationView> relations = shown.snapshot().relations();
        int each = Math.max(LEAST_ROWS + ARMS, canvas.height() / Math.max(1, relations.size()));
        int from = shown.look().from(PaneKind.INNOVATIONS);
        int first = Math.min(from, Math.max(0, relations.size() - canvas.height() / each));
        for (int k = first; k < relations.size(); k++) {
            int top = (k - first) * each;
            if (top + LEAST_ROWS > canvas.height()) {
                return;
            }
            draw(canvas.part(0, top, canvas.width(), each), relations.get(k), relations.size() > 1);
        }
    }

    private static void draw(Canvas canvas, Snapshot.RelationView relation, boolean named) {
        int arms =
                canvas.height() >= LEAST_ROWS + 2 * ARMS + 2 ? 2 * ARMS : Math.min(ARMS, canvas.height() - LEAST_ROWS);
        Canvas strip = canvas.part(0, 0, canvas.width(), canvas.height() - arms);
        if (relation.tested() || relation.strip().length > 0) {
            new StripPlot(strip, relation).draw();
        }
        String label = (named ? relation.label() + " " : "") + (relation.tested() ? "" : relation.untestedWhy());
        if (!label.isEmpty()) {
            List<String> words = Texts.wrapped(label, strip.width());
            for (int i = 0; i < Math.min(words.size(), strip.height() - 1); i++) {
                strip.put(0, i, words.get(i));
            }
        }
        Canvas below = canvas.part(0, canvas.height() - arms, canvas.width(), arms);
        if (arms == 2 * ARMS) {
            arm(below, 0, "live ▲", relation.live().up());
            arm(below, 1, "live ▼", relation.live().down());
            arm(below, 2, "reference ▲", relation.reference().up());
            arm(below, 3, "reference ▼", relation.reference().down());
        } else {
            arm(below, 0, "live", larger(relation.live()));
            arm(below, 1, "reference", larger(relation.reference()));
        }
    }

    private static double larger(Snapshot.Arms arms) {
        return Math.max(arms.up(), arms.down());
    }

    /** A bar that is full at the limit. */
    private static void arm(Canvas canvas, int y, String label, double share) {
        int labels = 12;
        String figure = Double.isNaN(share) ? "none yet" : String.format(Locale.ROOT, "%.0f %%", 100 * share);
        int room = canvas.width() - labels - 9;
        canvas.put(0, y, label);
        if (room > 4 && !Double.isNaN(share)) {
            int full = (int) Math.round(Math.max(0, Math.min(1, share)) * room);
            canvas.put(labels, y, "█".repeat(full) + (canvas.ascii() ? "." : "·").repeat(room - full) + "▏");
        }
        canvas.putLeftOf(canvas.width(), y, figure, share >= 1 ? Style.REVERSE : Style.PLAIN);
    }
}
