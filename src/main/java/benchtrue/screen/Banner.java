package benchtrue.screen;

import benchtrue.alarm.Alarm;
import benchtrue.run.Snapshot;
import java.util.List;
import java.util.Locale;

/**
 * What must be seen from three metres, in four fields: live or replay, is the line alive, is an alarm not acknowledged, is the
 * result settled. A field that wants somebody to act is in reverse video, whole.
 */
final class Banner {
    private static final int FIELDS = 4;
    /** A line is taken for dead after so many seconds. */
    private static final double SILENT = 5;

    private final Shown shown;
    private final Snapshot snapshot;

    Banner(Shown shown) {
        this.shown = shown;
        snapshot = shown.snapshot();
    }

    void draw(Canvas canvas) {
        field(canvas, 0, kind(), Style.REVERSE);
        field(canvas, 1, line(), lineWants() ? Style.REVERSE : Style.STRONG);
        field(canvas, 2, alarms(), unacknowledged() > 0 ? Style.REVERSE : Style.STRONG);
        field(canvas, 3, result(), Style.STRONG);
    }

    private static void field(Canvas canvas, int place, String text, Style style) {
        int from = canvas.width() * place / FIELDS;
        int to = canvas.width() * (place + 1) / FIELDS;
        Canvas part = canvas.part(from, 0, to - from - (place < FIELDS - 1 ? 1 : 0), canvas.height());
        String fitted = part.fitted(text, part.width());
        String centred = " ".repeat(Math.max(0, (part.width() - part.width(fitted)) / 2)) + fitted;
        for (int y = 0; y < part.height(); y++) {
            part.bar(y, y == part.height() / 2 ? centred : "", style);
        }
    }

    private String kind() {
        return snapshot.live() ? "L I V E" : "R E P L A Y  " + pace();
    }

    private String pace() {
        double pace = snapshot.pace();
        if (Double.isInfinite(pace)) {
            return "×max";
        }
        return "×" + (pace == Math.rint(pace) ? Long.toString((long) pace) : Double.toString(pace));
    }

    private boolean lineWants() {
        return shown.frozen()
                || snapshot.phase() == Snapshot.Phase.LOST
                || snapshot.phase() == Snapshot.Phase.PAUSED
                || snapshot.readingAge() > SILENT;
    }

    private String line() {
        if (shown.frozen()) {
            return "FROZEN " + Texts.span(shown.frozenSeconds());
        }
        String time = Texts.clock(snapshot.time());
        return switch (snapshot.phase()) {
            case WAITING -> "WAITING";
            case LOST -> "LINE LOST " + Texts.span(snapshot.readingAge());
            case ENDED -> "ENDED " + time;
            case PAUSED -> "PAUSED " + time + share();
            case RUNNING -> snapshot.live() ? "LINE " + Texts.span(snapshot.readingAge()) + " AGO" : time + share();
        };
    }

    private String share() {
        double progress = snapshot.progress();
        return Double.isNaN(progress) ? "" : String.format(Locale.ROOT, "  %.0f %%", 100 * progress);
    }

    private long unacknowledged() {
        return snapshot.alarms().stream()
                .filter(a -> a.state() == Alarm.State.RAISED)
                .count();
    }

    private String alarms() {
        long fresh = unacknowledged();
        if (fresh > 0) {
            return Texts.count(fresh, "ALARM").toUpperCase(Locale.ROOT);
        }
        long waiting = snapshot.alarms().stream().filter(a -> !a.acknowledged()).count();
        if (waiting > 0) {
            return "·" + waiting + " RETURNED";
        }
        long standing = snapshot.alarms().stream()
                .filter(a -> a.state() == Alarm.State.ACKNOWLEDGED || a.state() == Alarm.State.SHELVED)
                .count();
        return standing > 0 ? "[" + Texts.count(standing, "alarm") + "]" : "no alarm";
    }

    /** The word of the unknown that is least far. */
    private String result() {
        List<String> order = List.of("not determined", "weak", "settling", "settled");
        int least = shown.unknowns().stream()
                .mapToInt(u -> order.indexOf(u.state()))
                .min()
                .orElse(0);
        return order.get(Math.max(0, least)).toUpperCase(Locale.ROOT);
    }
}
