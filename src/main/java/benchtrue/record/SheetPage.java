package benchtrue.record;

import benchtrue.run.MemoryWords;
import benchtrue.sheet.BenchSheet;
import benchtrue.sheet.Channel;
import benchtrue.sheet.Derived;
import benchtrue.sheet.Group;
import benchtrue.sheet.PollSpec;
import benchtrue.sheet.RelationSpec;
import benchtrue.sheet.Result;
import benchtrue.sheet.UnknownSpec;

/** A bench sheet as it was understood, for people. */
public final class SheetPage {
    private SheetPage() {}

    public static String of(BenchSheet sheet) {
        TextPage page = new TextPage();
        page.title(sheet.title() + (sheet.item().isEmpty() ? "" : "  (" + sheet.item() + ")"));
        for (Group group : sheet.groups()) {
            group(page, group);
        }
        page.heading("Channels");
        TextTable channels = new TextTable("lllrrl");
        channels.row("", "unit", "interval", "resolution", "u other", "");
        for (Channel channel : sheet.channels()) {
            channels.row(
                    channel.name(),
                    unit(channel.unit().symbol()),
                    Figures.limits(channel.interval()),
                    Figures.exact(channel.resolution()),
                    channel.otherUncertainty() == 0 ? "-" : Figures.exact(channel.otherUncertainty()),
                    more(channel));
        }
        for (Derived derived : sheet.derived()) {
            channels.row(
                    derived.name(),
                    unit(derived.expression().unit().symbol()),
                    "",
                    "",
                    "",
                    "= " + derived.expression().text());
        }
        page.table(channels);
        PollSpec poll = sheet.poll();
        if (poll != null) {
            PollText.write(page, sheet, poll);
        }
        results(page, sheet);
        page.paragraph("Decision rule: "
                + (sheet.rule() == null
                        ? "none chosen, so no verdict is given"
                        : sheet.rule().word()) + ".");
        return page.toString();
    }

    private static void group(TextPage page, Group group) {
        for (RelationSpec relation : group.relations()) {
            page.heading(relation.relation().text());
        }
        page.paragraph("Memory " + MemoryWords.of(group.forgetting().memory()) + ".");
        TextTable table = new TextTable("lllllr");
        table.row("unknown", "unit", "plausible", "wanted U", "limits", "u other");
        for (UnknownSpec unknown : group.unknowns()) {
            table.row(
                    unknown.name(),
                    unit(unknown.unit().symbol()),
                    Figures.limits(unknown.plausible()),
                    Figures.exact(unknown.wanted()),
                    Figures.limits(unknown.limits()),
                    unknown.otherUncertainty() == 0 ? "-" : Figures.exact(unknown.otherUncertainty()));
        }
        page.table(table);
    }

    private static void results(TextPage page, BenchSheet sheet) {
        if (sheet.results().isEmpty()) {
            return;
        }
        page.heading("Results");
        TextTable table = new TextTable("llll");
        for (Result result : sheet.results()) {
            table.row(
                    result.name(), unit(result.unit().symbol()), Figures.limits(result.limits()), "= " + result.text());
        }
        page.table(table);
    }

    private static String more(Channel channel) {
        StringBuilder more = new StringBuilder();
        if (channel.correction() != null) {
            more.append("corrected: ").append(channel.correction().text()).append("; ");
        }
        if (channel.adjustable()) {
            more.append(
                    channel.operate() == null ? "adjustable; " : "operate " + Figures.limits(channel.operate()) + "; ");
        }
        if (channel.due() != null) {
            more.append("due ").append(channel.due()).append("; ");
        }
        return more.length() == 0 ? "" : more.substring(0, more.length() - 2);
    }

    private static String unit(String symbol) {
        return symbol.isEmpty() ? "1" : symbol;
    }
}
