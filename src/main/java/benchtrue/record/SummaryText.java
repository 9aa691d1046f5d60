package benchtrue.record;

import benchtrue.alarm.Alarm;
import benchtrue.run.Closing;
import java.util.List;
import java.util.stream.Collectors;
import org.jspecify.annotations.Nullable;

/** summary.txt: the closing summary as a page that can be printed and signed. */
public final class SummaryText {
    static final String NAME = "summary.txt";

    /** How the first line of the page begins. */
    static final String FIRST_WORDS = "TEST RECORD";

    private final TextPage page = new TextPage();
    private final Closing closing;

    private SummaryText(Closing closing) {
        this.closing = closing;
    }

    /** The whole page, lines to sign included. */
    public static String of(Closing closing) {
        SummaryText text = new SummaryText(closing);
        text.outcome();
        text.provenance();
        text.instruments();
        text.cautions();
        text.signature();
        return text.page.toString();
    }

    /** What a terminal shows after a run: the page without cautions and lines to sign. */
    public static String brief(Closing closing) {
        SummaryText text = new SummaryText(closing);
        text.outcome();
        return text.page.toString();
    }

    private void outcome() {
        head();
        readings();
        for (Closing.Relation relation : closing.relations()) {
            new RelationText(page, relation).write();
        }
        results();
        verdicts();
        alarms();
        list("Notes of the operator", closing.marks());
        list("Be careful", closing.careful());
    }

    private void head() {
        page.title(FIRST_WORDS + "  " + closing.sheetTitle());
        TextTable head = new TextTable("ll");
        head.row("Item", closing.item().isEmpty() ? "not named in the sheet" : closing.item());
        head.row(
                "Recorded start",
                closing.startedUtc() == null
                        ? "not recorded (times are plain seconds)"
                        : closing.startedUtc() + " (UTC)");
        head.row("Outcome", closing.status() + ", " + closing.statusText());
        page.table(head);
    }

    private void readings() {
        Closing.Readings readings = closing.readings();
        page.heading("Readings");
        page.paragraph(String.format(
                "%d seen from %s to %s: %d used, %d held out, %d excluded. %d lines could not be read,"
                        + " %d readings lacked a value, %d gaps.",
                readings.seen(),
                Figures.seconds(readings.first()),
                Figures.seconds(readings.last()),
                readings.used(),
                readings.heldOut(),
                readings.excluded(),
                readings.malformed(),
                readings.missing(),
                readings.gaps()));
        closing.held().forEach(held -> page.item(held.count() + " left out: " + held.reason()));
    }

    private void results() {
        if (closing.results().isEmpty()) {
            return;
        }
        page.heading("Results");
        TextTable table = new TextTable("lrllll");
        table.row("", "value ± U", "unit", "k", "ν", "limits");
        for (Closing.Result result : closing.results()) {
            table.row(
                    result.name(),
                    Measured.text(result.value(), result.expandedUncertainty()),
                    result.unit(),
                    Figures.figure(result.coverageFactor(), 3),
                    Figures.figure(result.degreesOfFreedom(), 3),
                    Figures.limits(result.limits()));
        }
        page.table(table);
    }

    private void verdicts() {
        List<String> lines = Verdicts.lines(closing);
        if (lines.isEmpty()) {
            return;
        }
        page.heading("Conformity");
        page.items(lines);
    }

    private void alarms() {
        page.heading("Alarms");
        if (closing.alarms().isEmpty()) {
            page.paragraph("None.");
        }
        for (Alarm alarm : closing.alarms()) {
            page.item(AlarmText.line(alarm));
        }
    }

    private void list(String heading, List<String> lines) {
        if (!lines.isEmpty()) {
            page.heading(heading);
            page.items(lines);
        }
    }

    private void provenance() {
        page.heading("Where the numbers come from");
        TextTable table = new TextTable("ll");
        table.row("Program", Program.NAME + " " + Program.version());
        table.row("Source", closing.sourceKind() + ", " + closing.sourceName());
        table.row("SHA-256", hash(closing.sourceSha256()));
        table.row("Sheet", hash(closing.sheetSha256()));
        page.table(table);
    }

    private static String hash(@Nullable String sha256) {
        return sha256 == null ? "not known" : sha256;
    }

    private void instruments() {
        page.heading("Instruments");
        TextTable table = new TextTable("llll");
        table.row("channel", "unit", "due", "");
        for (Closing.Instrument instrument : closing.instruments()) {
            table.row(
                    instrument.channel(),
                    instrument.unit(),
                    instrument.due() == null ? "not stated" : instrument.due(),
                    instrument.dueNote());
        }
        page.table(table);
        String corrections = closing.instruments().stream()
                .filter(i -> i.correction() != null)
                .map(i -> i.channel() + " = " + i.correction())
                .collect(Collectors.joining("; "));
        if (!corrections.isEmpty()) {
            page.paragraph("Corrections applied (x is the indication): " + corrections + ".");
        }
    }

    private void cautions() {
        page.heading("Cautions");
        page.items(closing.cautions());
        page.items(Cautions.GENERAL);
    }

    private void signature() {
        page.heading("To sign");
        for (String line : List.of("As found", "As left", "Action", "Name", "Date", "Signature")) {
            page.space();
            page.paragraph(line + " ".repeat(12 - line.length()) + "_".repeat(64));
        }
    }
}
