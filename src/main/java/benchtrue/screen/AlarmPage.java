package benchtrue.screen;

import benchtrue.alarm.Alarm;
import java.util.ArrayList;
import java.util.List;
import java.util.Objects;

/** All of one alarm. */
final class AlarmPage {
    private AlarmPage() {}

    static Page of(Alarm alarm) {
        return new Page("Alarm " + alarm.id(), width -> lines(alarm, width));
    }

    private static List<String> lines(Alarm alarm, int width) {
        List<String> lines = new ArrayList<>();
        lines.add("kind      " + alarm.kind().word());
        lines.add("where     "
                + Objects.requireNonNullElse(alarm.channel(), Objects.requireNonNullElse(alarm.relation(), "the run")));
        lines.add("began     " + Texts.clock(alarm.onset()) + "  (between " + Texts.clock(alarm.onsetFrom()) + " and "
                + Texts.clock(alarm.onsetTo()) + ")");
        lines.add("raised    " + Texts.clock(alarm.raised()) + "  (reading " + alarm.raisedReading() + ")");
        lines.add("state     " + alarm.state().word() + ", " + alarm.priority().word() + ", spoke "
                + Texts.count(alarm.count(), "time"));
        if (!alarm.comment().isEmpty()) {
            lines.add("comment   " + alarm.comment());
        }
        lines.add("");
        lines.addAll(Texts.wrapped(alarm.text(), width));
        lines.add("");
        lines.addAll(Texts.wrapped(
                "A cause is a lead, not a finding. Make the rig safe before you open it: lock out, bleed, discharge, as the local"
                        + " rules say; leave to a licensed person what asks for one.",
                width));
        return lines;
    }
}
