package benchtrue.screen;

import benchtrue.run.Snapshot;
import java.util.ArrayList;
import java.util.List;
import org.jspecify.annotations.Nullable;

/** One unknown drawn large: its path with the ±U band closing in on it, the reference and the limits. */
final class LargePane implements Pane {
    @Override
    public String title(Shown shown) {
        Snapshot.UnknownView unknown = unknown(shown);
        return unknown == null
                ? "Path"
                : "Path of " + unknown.name() + " ± U" + (unknown.unit().isEmpty() ? "" : "  [" + unknown.unit() + "]");
    }

    private static Snapshot.@Nullable UnknownView unknown(Shown shown) {
        List<Snapshot.UnknownView> all = shown.unknowns();
        return all.isEmpty() ? null : all.get(Math.min(shown.look().unknown, all.size() - 1));
    }

    @Override
    public void draw(Canvas canvas, Shown shown) {
        Snapshot.UnknownView unknown = unknown(shown);
        if (unknown == null) {
            return;
        }
        List<Line> words = words(canvas, shown, unknown);
        int rows = Math.min(words.size(), shown.look().opened ? canvas.height() / 2 : Math.max(1, canvas.height() / 4));
        Line.draw(canvas.part(0, 0, canvas.width(), rows), words.subList(0, rows), 0);
        Canvas plot = canvas.part(0, rows, canvas.width(), canvas.height() - rows);
        if (unknown.path().length < 2) {
            plot.put(1, plot.height() / 2, unknown.state() + ": no path yet");
            return;
        }
        new PathPlot(plot, unknown).draw();
    }

    private static List<Line> words(Canvas canvas, Shown shown, Snapshot.UnknownView unknown) {
        List<Line> lines = new ArrayList<>();
        lines.add(Line.of(
                        unknown.name() + " = " + Wording.value(shown.look().decimals(), unknown) + " " + unknown.unit(),
                        Style.STRONG)
                .and("  " + unknown.state()));
        StringBuilder more = new StringBuilder();
        say(more, "", Wording.verdict(unknown));
        say(more, "wanted U ", Wording.wanted(unknown));
        say(more, "reference ", Wording.fromReference(unknown));
        say(more, "limits ", Wording.limits(unknown.limits()));
        say(more, "u ", Texts.value(unknown.standardUncertainty(), 2));
        say(more, "k ", Texts.value(unknown.coverageFactor(), 3));
        say(more, "ν ", Texts.value(unknown.degreesOfFreedom(), 3));
        lines.addAll(Line.wrapped(more.toString(), canvas.width(), 0));
        if (!unknown.neverWhy().isEmpty()) {
            lines.addAll(Line.wrapped("wanted U is never reached: " + unknown.neverWhy(), canvas.width(), 0));
        }
        if (unknown.verdictWithheld() != null) {
            lines.addAll(Line.wrapped("verdict withheld: " + unknown.verdictWithheld(), canvas.width(), 0));
        }
        return lines;
    }

    private static void say(StringBuilder to, String label, String text) {
        if (!text.isEmpty() && !text.equals(Texts.UNKNOWN)) {
            to.append(to.isEmpty() ? "" : "; ").append(label).append(text);
        }
    }
}
