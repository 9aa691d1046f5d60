package benchtrue.screen;

import benchtrue.run.Snapshot;
import java.util.ArrayList;
import java.util.List;

/** What to do next: the operating point that helps most, why the run is not done yet, and what the operator should know. */
final class NextPane implements Pane {
    @Override
    public String title(Shown shown) {
        Snapshot.AdviceView advice = shown.snapshot().advice();
        return advice == null || advice.unknown().isEmpty() ? "Next" : "Next, for " + advice.unknown();
    }

    @Override
    public void draw(Canvas canvas, Shown shown) {
        Line.draw(canvas, lines(canvas.width(), shown.snapshot()), shown.look().from(PaneKind.NEXT));
    }

    private static List<Line> lines(int width, Snapshot snapshot) {
        List<Line> lines = new ArrayList<>();
        Snapshot.AdviceView advice = snapshot.advice();
        if (advice != null && !advice.refusal().isEmpty()) {
            lines.addAll(Line.wrapped("no advice: " + advice.refusal(), width, 2));
        } else if (advice != null) {
            for (String words : advice.words()) {
                lines.addAll(Line.wrapped(words, width, 2));
            }
        }
        for (Snapshot.RelationView relation : snapshot.relations()) {
            for (List<String> group : relation.inseparable()) {
                lines.addAll(Line.wrapped(
                        String.join(" and ", group) + " cannot be told apart yet (condition index "
                                + Texts.value(relation.conditionIndex(), 3) + ")",
                        width,
                        2));
            }
        }
        snapshot.notices().forEach(n -> lines.addAll(Line.wrapped(n, width, 2)));
        if (snapshot.next().isEmpty() && snapshot.reading() > 0) {
            lines.add(Line.of("the run has enough: it may be closed", Style.STRONG));
        }
        snapshot.points().stream()
                .filter(p -> !p.visited())
                .findFirst()
                .ifPresent(p -> lines.addAll(Line.wrapped("planned next: " + p.text(), width, 2)));
        snapshot.next().forEach(reason -> lines.addAll(Line.wrapped("go on: " + reason, width, 2)));
        return lines;
    }
}
