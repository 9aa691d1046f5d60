package benchtrue.record;

import benchtrue.alarm.Alarm;
import java.util.Objects;

/** An alarm in one sentence. */
public final class AlarmText {
    private AlarmText() {}

    /** Kind, what it concerns, when it began and was raised, size, cause and state; then its own words. */
    public static String line(Alarm alarm) {
        StringBuilder line = new StringBuilder(alarm.kind().word());
        line.append(" of ").append(subject(alarm));
        if (Double.isFinite(alarm.onset())) {
            line.append(", began at ").append(Figures.seconds(alarm.onset())).append(onsetRange(alarm));
        }
        line.append(", raised at ").append(Figures.seconds(alarm.raised()));
        if (Double.isFinite(alarm.size())) {
            line.append(", size ").append(Measured.text(alarm.size(), alarm.sizeU()));
            line.append(alarm.unit().isEmpty() ? "" : " " + alarm.unit());
        }
        line.append(cause(alarm)).append(", ").append(alarm.state().word());
        if (alarm.count() > 1) {
            line.append(", ").append(alarm.count()).append(" times");
        }
        line.append(" (").append(alarm.priority().word()).append("). ").append(alarm.text());
        return alarm.comment().isEmpty() ? line.toString() : line + " Operator: " + alarm.comment();
    }

    private static String subject(Alarm alarm) {
        return alarm.channel() != null ? alarm.channel() : Objects.requireNonNullElse(alarm.relation(), "the run");
    }

    private static String onsetRange(Alarm alarm) {
        return Double.isFinite(alarm.onsetFrom()) && alarm.onsetFrom() < alarm.onsetTo()
                ? " (between " + Figures.seconds(alarm.onsetFrom()) + " and " + Figures.seconds(alarm.onsetTo()) + ")"
                : "";
    }

    private static String cause(Alarm alarm) {
        if (alarm.cause() == null) {
            return "";
        }
        if (alarm.cause().equals("not separable")) {
            return ", cause not separable";
        }
        return (alarm.provisional() ? ", a lead so far: " : ", cause ") + alarm.cause();
    }
}
