package benchtrue.record;

import benchtrue.estimate.RunComparison;
import benchtrue.run.ComparedUnknown;
import java.util.List;

/** The same unknowns over several runs, as a page. */
public final class ComparisonText {
    private final TextPage page = new TextPage();

    private ComparisonText() {}

    public static String of(List<ComparedUnknown> unknowns) {
        ComparisonText text = new ComparisonText();
        text.page.title("RUNS COMPARED");
        unknowns.forEach(text::unknown);
        if (unknowns.isEmpty()) {
            text.page.paragraph("The runs have no unknown in common that was determined in the same unit.");
        }
        text.page.space();
        text.page.paragraph("E_n is the difference from the run before over the root of the sum of the squared expanded"
                + " uncertainties, both without what the runs share (instruments, declared uncertainty): beyond 1 they do not"
                + " agree.");
        return text.page.toString();
    }

    private void unknown(ComparedUnknown unknown) {
        page.heading(unknown.name() + (unknown.unit().isEmpty() ? "" : " [" + unknown.unit() + "]"));
        TextTable table = new TextTable("lrlrl");
        table.row("run", unknown.dated() ? "day" : "no.", "value ± U", "E_n", "");
        for (int i = 0; i < unknown.values().size(); i++) {
            ComparedUnknown.Value value = unknown.values().get(i);
            double agreement = unknown.comparison().agreement()[i];
            table.row(
                    value.run(),
                    unknown.dated() ? Figures.figure(value.time(), 4) : Integer.toString(i + 1),
                    Measured.text(value.unknown().estimate(), value.unknown().expandedUncertainty()),
                    Figures.figure(agreement, 2),
                    remark(unknown, i, agreement));
        }
        page.table(table);
        trend(unknown);
    }

    private static String remark(ComparedUnknown unknown, int i, double agreement) {
        double estimate = unknown.values().get(i).unknown().estimate();
        if (unknown.limits() != null && !unknown.limits().contains(estimate)) {
            return "outside " + Figures.limits(unknown.limits());
        }
        if (unknown.comparison().outlier()[i]) {
            return "stands apart from the others";
        }
        return Math.abs(agreement) > 1 ? "does not agree" : "";
    }

    private void trend(ComparedUnknown unknown) {
        RunComparison.Trend trend = unknown.comparison().trend();
        if (trend == null) {
            page.paragraph("A trend takes at least three runs at different times.");
            return;
        }
        String unit = (unknown.unit().isEmpty() ? "" : unknown.unit() + " ") + (unknown.dated() ? "a day" : "a run");
        page.paragraph("Trend " + Measured.text(trend.slope(), trend.slopeU()) + " " + unit
                + (trend.isClear() ? "." : ", which may be none.") + " The runs scatter "
                + Figures.figure(trend.scatter(), 2) + " times as much as their uncertainties say.");
        RunComparison.Reach reach = unknown.comparison().reaches();
        if (reach != null) {
            String when = unknown.dated() ? "day " : "run ";
            int shift = unknown.dated() ? 0 : 1;
            page.paragraph("At this rate it reaches the limit " + Figures.exact(reach.limit()) + " on " + when
                    + Figures.figure(reach.time() + shift, 4) + " (between "
                    + Figures.figure(reach.earliest() + shift, 4)
                    + " and " + Figures.figure(reach.latest() + shift, 4)
                    + "): a straight line drawn on, no promise.");
        }
    }
}
