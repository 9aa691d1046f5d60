package benchtrue.record;

import benchtrue.run.Closing;
import java.util.List;
import java.util.function.Function;

/** One relation of the closing summary: estimates, the batch fit beside them, budget, residual tests, segments. */
final class RelationText {
    private final TextPage page;
    private final Closing.Relation relation;

    RelationText(TextPage page, Closing.Relation relation) {
        this.page = page;
        this.relation = relation;
    }

    void write() {
        page.heading(relation.equation());
        page.paragraph("Memory " + relation.memory() + ". " + residual() + " with ν = "
                + Figures.figure(relation.degreesOfFreedom(), 3) + "; "
                + Figures.figure(relation.effectiveReadings(), 3) + " effective readings; condition index "
                + Figures.figure(relation.conditionIndex(), 3) + ".");
        inseparable();
        unknowns(relation.unknowns());
        batch();
        budget();
        tests();
        segments();
    }

    /** Of a single reading where all weigh the same: what its noise can be compared with. */
    private String residual() {
        double s = relation.residualStandardDeviation();
        double weight = relation.weight();
        String ofWeightOne = Figures.figure(s, 3) + unit(relation.unit());
        if (weight == 1) {
            return "s = " + ofWeightOne;
        }
        return weight > 0
                ? "s = " + Figures.figure(s / Math.sqrt(weight), 3) + unit(relation.unit()) + " for a reading ("
                        + ofWeightOne + " for one of weight 1)"
                : "s = " + ofWeightOne + " for a reading of weight 1";
    }

    private void inseparable() {
        for (List<String> names : relation.inseparable()) {
            page.paragraph("Not separable from each other: " + String.join(", ", names) + ".");
        }
    }

    private void unknowns(List<Closing.Unknown> unknowns) {
        TextTable table = new TextTable("lrllll");
        table.row("", "estimate ± U", "unit", "k", "ν", "");
        for (Closing.Unknown unknown : unknowns) {
            table.row(
                    unknown.name(),
                    unknown.determined()
                            ? Measured.text(unknown.estimate(), unknown.expandedUncertainty())
                            : "not determined",
                    unknown.unit(),
                    Figures.figure(unknown.coverageFactor(), 3),
                    Figures.figure(unknown.degreesOfFreedom(), 3),
                    state(unknown));
        }
        page.table(table);
    }

    private static String state(Closing.Unknown unknown) {
        String settled = unknown.settled() ? "settled" : unknown.determined() ? "not settled" : "";
        boolean tooWide = unknown.expandedUncertainty() > unknown.wanted();
        return tooWide ? settled + ", wanted U " + Figures.exact(unknown.wanted()) : settled;
    }

    private void batch() {
        Closing.Batch batch = relation.batch();
        if (batch == null) {
            page.paragraph("No batch fit beside it: there are too few rows to determine the unknowns.");
            return;
        }
        page.space();
        page.paragraph("Recursive beside batch QR over the recorded rows:");
        TextTable table = new TextTable("lrrrrr");
        table.row("", "recursive", "u", "batch", "u", "difference/u");
        for (int i = 0; i < batch.unknowns().size(); i++) {
            Closing.Fitted fitted = batch.unknowns().get(i);
            Closing.Unknown unknown = relation.unknowns().get(i);
            table.row(
                    fitted.name(),
                    Figures.figure(unknown.estimate(), 8),
                    Figures.figure(unknown.standardUncertainty(), 2),
                    Figures.figure(fitted.estimate(), 8),
                    Figures.figure(fitted.standardUncertainty(), 2),
                    Figures.figure(fitted.differenceInU(), 2));
        }
        page.table(table);
        page.paragraph((batch.agrees() ? "They agree. " : "They do not agree: do not rely on these results. ")
                + batch.judgement());
    }

    private void budget() {
        if (relation.unknowns().stream().allMatch(u -> u.budget().isEmpty())) {
            return;
        }
        page.space();
        page.paragraph("Uncertainty budget (standard uncertainties, in the unknown's unit):");
        TextTable table = new TextTable("llrr");
        table.row("", "from", "u", "ν");
        for (Closing.Unknown unknown : relation.unknowns()) {
            String name = unknown.name();
            for (Closing.Contribution part : unknown.budget()) {
                table.row(
                        name,
                        part.name(),
                        Figures.figure(part.standardUncertainty(), 2),
                        Figures.figure(part.degreesOfFreedom(), 3));
                name = "";
            }
        }
        page.table(table);
    }

    private void tests() {
        if (!relation.residualTests().isEmpty()) {
            page.space();
            page.paragraph("Residuals:");
            page.items(relation.residualTests());
        }
    }

    private void segments() {
        if (relation.segments().size() < 2) {
            return;
        }
        page.space();
        page.paragraph("Segments, never pooled in a verdict:");
        TextTable table = new TextTable("l" + "r".repeat(relation.segments().size()));
        table.row(cells("", s -> Figures.seconds(s.from()) + " to " + Figures.seconds(s.to())));
        for (int i = 0; i < relation.unknowns().size(); i++) {
            int place = i;
            table.row(cells(relation.unknowns().get(i).name(), s -> estimate(s, place)));
        }
        page.table(table);
        for (Closing.Segment segment : relation.segments()) {
            page.item("from " + Figures.seconds(segment.from()) + ": " + segment.reason());
        }
    }

    private String[] cells(String first, Function<Closing.Segment, String> cell) {
        String[] cells = new String[relation.segments().size() + 1];
        cells[0] = first;
        for (int i = 1; i < cells.length; i++) {
            cells[i] = cell.apply(relation.segments().get(i - 1));
        }
        return cells;
    }

    private static String estimate(Closing.Segment segment, int place) {
        Closing.Unknown unknown = segment.unknowns().get(place);
        return unknown.determined()
                ? Measured.text(unknown.estimate(), unknown.expandedUncertainty())
                : "not determined";
    }

    private static String unit(String unit) {
        return unit.isEmpty() ? "" : " " + unit;
    }
}
