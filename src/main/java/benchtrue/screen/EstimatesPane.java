package benchtrue.screen;

import benchtrue.run.Snapshot;
import java.util.ArrayList;
import java.util.List;

/** The unknowns as a table, as many columns as there is room for; below, what each relation's estimate rests on. */
final class EstimatesPane implements Pane {
    private static final int LONGEST_UNIT = 14;
    private static final int LONGEST_NAME = 16;

    @Override
    public String title(Shown shown) {
        String item = shown.snapshot().item();
        return "Estimates ± U (95 %)  " + shown.snapshot().title() + (item.isEmpty() ? "" : ", " + item);
    }

    /** How many rows show everything. */
    static int rows(Shown shown) {
        return 1 + shown.unknowns().size() + shown.snapshot().relations().size();
    }

    @Override
    public void draw(Canvas canvas, Shown shown) {
        List<Snapshot.UnknownView> unknowns = shown.unknowns();
        List<Line> rows = new Table(canvas, shown, unknowns).lines();
        boolean headed = canvas.height() > unknowns.size();
        if (headed) {
            rows.get(0).draw(canvas, 0);
        }
        int top = headed ? 1 : 0;
        List<Line> body = new ArrayList<>(rows.subList(1, rows.size()));
        shown.snapshot().relations().forEach(r -> body.addAll(foundation(canvas, shown, r)));
        int chosen = shown.look().unknown - (canvas.height() - top) + 1;
        Line.draw(
                canvas.part(0, top, canvas.width(), canvas.height() - top),
                body,
                Math.max(shown.look().from(PaneKind.ESTIMATES), chosen));
    }

    private static List<Line> foundation(Canvas canvas, Shown shown, Snapshot.RelationView relation) {
        StringBuilder text = new StringBuilder("  " + relation.label() + ": ");
        if (!relation.inseparable().isEmpty()) {
            relation.inseparable()
                    .forEach(g -> text.append(String.join(" and ", g)).append(" not separable; "));
        }
        text.append("s ")
                .append(Texts.value(relation.residualStandardDeviation(), 3))
                .append(relation.unit().isEmpty() ? "" : " " + relation.unit())
                .append(", ν ")
                .append(Texts.value(relation.degreesOfFreedom(), 4))
                .append(", ")
                .append(Texts.value(relation.effectiveReadings(), 4))
                .append(" effective readings, condition index ")
                .append(Texts.value(relation.conditionIndex(), 3))
                .append(", memory ")
                .append(relation.memory());
        return shown.look().opened
                ? Line.wrapped(text.toString(), canvas.width(), 4)
                : List.of(Line.of(text.toString()));
    }

    /** Columns in the order of their weight; those that do not fit are left out. */
    private static final class Table {
        private final Canvas canvas;
        private final Shown shown;
        private final List<Snapshot.UnknownView> unknowns;
        private final List<StringBuilder> rows = new ArrayList<>();

        Table(Canvas canvas, Shown shown, List<Snapshot.UnknownView> unknowns) {
            this.canvas = canvas;
            this.shown = shown;
            this.unknowns = unknowns;
            rows.add(new StringBuilder("  "));
            for (int i = 0; i < unknowns.size(); i++) {
                rows.add(new StringBuilder(i == shown.look().unknown ? (canvas.ascii() ? "> " : "▸ ") : "  "));
            }
        }

        List<Line> lines() {
            add(
                    "",
                    LONGEST_NAME,
                    unknowns.stream().map(Snapshot.UnknownView::name).toList());
            add("value ± U", 32, values());
            add(
                    "unit",
                    LONGEST_UNIT,
                    unknowns.stream().map(Snapshot.UnknownView::unit).toList());
            add("state", 14, unknowns.stream().map(Snapshot.UnknownView::state).toList());
            add("verdict", 16, unknowns.stream().map(Wording::verdict).toList());
            add("wanted U", 20, unknowns.stream().map(Wording::wanted).toList());
            add(
                    "from reference",
                    24,
                    unknowns.stream().map(Wording::fromReference).toList());
            add(
                    "limits",
                    24,
                    unknowns.stream().map(u -> Wording.limits(u.limits())).toList());
            List<Line> lines = new ArrayList<>();
            for (int i = 0; i < rows.size(); i++) {
                boolean chosen = i - 1 == shown.look().unknown;
                lines.add(Line.of(rows.get(i).toString().stripTrailing(), chosen ? Style.STRONG : Style.PLAIN));
            }
            return lines;
        }

        /** So that the signs of all rows stand below each other. */
        private List<String> values() {
            List<String[]> halves = unknowns.stream()
                    .map(u -> Wording.value(shown.look().decimals(), u).split(" ± ", 2))
                    .toList();
            int before = halves.stream().mapToInt(h -> h[0].length()).max().orElse(0);
            return halves.stream()
                    .map(h -> " ".repeat(before - h[0].length()) + h[0] + (h.length > 1 ? " ± " + h[1] : ""))
                    .toList();
        }

        private void add(String heading, int longest, List<String> cells) {
            if (cells.stream().allMatch(String::isEmpty)) {
                return;
            }
            int width = Math.max(
                    canvas.width(heading),
                    Math.min(
                            longest,
                            cells.stream().mapToInt(canvas::width).max().orElse(0)));
            if (canvas.width(rows.get(0).toString()) + width > canvas.width()) {
                return;
            }
            rows.get(0).append(Columns.left(canvas, heading, width)).append("  ");
            for (int i = 0; i < cells.size(); i++) {
                rows.get(i + 1)
                        .append(Columns.left(canvas, cells.get(i), width))
                        .append("  ");
            }
        }
    }
}
