package benchtrue.screen;

import java.util.ArrayList;
import java.util.List;

/** What the keys do and what the marks mean. */
final class HelpPage {
    private static final List<String> MARKS = List.of(
            "Estimates: the value ± U, which covers about 95 %, rounded together.",
            "not determined: the readings do not tell this unknown apart. weak: they hardly do. settling: U still falls, or the"
                    + " residuals are not steady. settled: neither.",
            "Path: solid the estimate, dotted ± U, long dashes the reference, short dashes the limits.",
            "Innovations: reading minus prediction in its own standard deviation; dashes are the bounds; × held out;"
                    + " ▲ ▼ beyond what is drawn.",
            "live, reference: how far the CUSUM arms are filled; an alarm at 100 %. live: against the present model;"
                    + " reference: against the adopted one.",
            "Alarms: reverse video not acknowledged; [acknowledged]; ·returned to normal. The size has the unit of the cause.",
            "A cause is a lead, not a finding: make the rig safe before you open it, follow the local rules, and leave to a"
                    + " licensed person what asks for one.");

    private HelpPage() {}

    static Page page() {
        return new Page("Help", HelpPage::lines);
    }

    private static List<String> lines(int width) {
        List<String> lines = new ArrayList<>();
        lines.add("Tab, Shift-Tab  the next pane, the one before");
        lines.add("↑ ↓ PgUp PgDn   choose or scroll in the pane or page");
        lines.add("Enter           open the pane, or the chosen alarm; Esc goes back");
        for (Command command : Command.values()) {
            lines.add(String.format("%-16s%s", command.key(), command.help()));
        }
        for (String mark : MARKS) {
            lines.add("");
            lines.addAll(Texts.wrapped(mark, width));
        }
        return lines;
    }
}
