package benchtrue.screen;

import benchtrue.alarm.Alarm;
import benchtrue.estimate.Rounded;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Objects;

/** The alarms, newest first; those that nobody acknowledged in reverse video, [acknowledged], ·returned. */
final class AlarmsPane implements Pane {
    private static final int INDENT = 4;
    private static final String NOT_SEPARABLE = "not separable";

    @Override
    public String title(Shown shown) {
        int count = shown.snapshot().alarms().size();
        return count == 0 ? "Alarms" : "Alarms  " + count;
    }

    /** Newest first, the ones that somebody must look at before the others of the same time. */
    static List<Alarm> sorted(Shown shown) {
        List<Alarm> alarms = new ArrayList<>(shown.snapshot().alarms());
        alarms.sort(Comparator.comparingLong(Alarm::raisedReading)
                .thenComparingInt(Alarm::id)
                .reversed());
        return alarms;
    }

    @Override
    public void draw(Canvas canvas, Shown shown) {
        List<Alarm> alarms = sorted(shown);
        if (alarms.isEmpty()) {
            canvas.put(1, 0, "none so far");
            return;
        }
        boolean focused = shown.look().focus == PaneKind.ALARMS;
        List<Line> lines = new ArrayList<>();
        int chosenFrom = 0;
        int chosenTo = 0;
        int words = canvas.height() >= 2 * alarms.size() ? Integer.MAX_VALUE : 2;
        for (int i = 0; i < alarms.size(); i++) {
            boolean chosen = i == shown.look().alarm;
            if (chosen) {
                chosenFrom = lines.size();
            }
            lines.add(head(alarms.get(i), focused && chosen));
            List<Line> text = Texts.wrapped(alarms.get(i).text(), canvas.width() - INDENT).stream()
                    .map(t -> Line.of(" ".repeat(INDENT) + t))
                    .toList();
            lines.addAll(text.subList(0, Math.min(text.size(), chosen || i == 0 ? words : 0)));
            if (chosen) {
                chosenTo = lines.size();
            }
        }
        Line.draw(canvas, lines, chosenTo <= canvas.height() ? 0 : Math.min(chosenFrom, chosenTo - canvas.height()));
    }

    private static Line head(Alarm alarm, boolean chosen) {
        String word = alarm.kind().word();
        Line start = Line.of(chosen ? "▸ " : "  ").and(Texts.clock(alarm.raised()) + "  ");
        Line named = switch (alarm.state()) {
            case RAISED -> start.and(" " + word + " ", Style.REVERSE);
            case ACKNOWLEDGED -> start.and("[" + word + "]", Style.STRONG);
            case SHELVED -> start.and("[" + word + ", shelved]");
            case RETURNED -> start.and("·" + word, alarm.acknowledged() ? Style.PLAIN : Style.STRONG);
        };
        String subject = Objects.requireNonNullElse(alarm.channel(), Objects.requireNonNullElse(alarm.relation(), ""));
        return named.and(" " + subject + cause(alarm) + size(alarm) + times(alarm) + ", "
                + alarm.priority().word() + waits(alarm));
    }

    private static String waits(Alarm alarm) {
        return alarm.state() == Alarm.State.RETURNED && !alarm.acknowledged() ? ", not acknowledged" : "";
    }

    private static String cause(Alarm alarm) {
        if (alarm.cause() == null) {
            return "";
        }
        if (alarm.cause().equals(NOT_SEPARABLE)) {
            return ", cause not separable yet";
        }
        return (alarm.provisional() ? ", perhaps " : ", cause ") + alarm.cause();
    }

    private static String size(Alarm alarm) {
        if (!Double.isFinite(alarm.size())) {
            return "";
        }
        Rounded size = Rounded.of(alarm.size(), alarm.sizeU());
        String text = Double.isFinite(alarm.sizeU()) ? size.text() : Texts.value(alarm.size(), 4);
        return ", " + text + (alarm.unit().isEmpty() ? "" : " " + alarm.unit());
    }

    private static String times(Alarm alarm) {
        return alarm.count() > 1 ? ", " + alarm.count() + " times" : "";
    }
}
