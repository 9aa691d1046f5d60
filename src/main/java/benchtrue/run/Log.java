package benchtrue.run;

import benchtrue.alarm.Alarm;
import benchtrue.alarm.Change;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import org.jspecify.annotations.Nullable;

/** The event log of a run, and the counts of what was left out. A reason that lasts is logged when it begins and when it ends. */
final class Log {
    private final RunListener listener;
    private final Tally tally;
    private final Map<String, String> reasons = new HashMap<>();
    private final Map<String, String> untested = new HashMap<>();
    private long reading;
    private long spoken;
    private double time;

    Log(RunListener listener, Tally tally) {
        this.listener = listener;
        this.tally = tally;
    }

    /** All that is logged from now on belongs to this reading. */
    void at(long number, double seconds) {
        reading = number;
        time = seconds;
    }

    void event(String word, String text) {
        event(word, null, Double.NaN, "", text);
    }

    void event(String word, @Nullable String relation, double value, String unit, String text) {
        listener.event(new Event(reading, time, word, relation, null, null, value, unit, text));
    }

    void leftOut(String relation, String reason) {
        tally.leftOut(reason, 1);
        if (!reason.equals(reasons.put(relation, reason))) {
            event("held out", relation, Double.NaN, "", reason);
        }
    }

    void used(String relation) {
        if (!reasons.isEmpty() && reasons.remove(relation) != null) {
            event("used again", relation, Double.NaN, "", "");
        }
    }

    void takeBack(String reason) {
        tally.takeBack(reason, 1);
    }

    /** @param why empty: its innovations are tested */
    void tested(String relation, String why) {
        String before = untested.get(relation);
        if (why.equals(before)) {
            return;
        }
        untested.put(relation, why);
        if (before != null || !why.isEmpty()) {
            event(why.isEmpty() ? "tested" : "not tested", relation, Double.NaN, "", why);
        }
    }

    void malformed(String problem) {
        tally.malformed();
        event("malformed", problem);
    }

    void alarms(List<Change> changes) {
        for (int i = 0; i < changes.size(); i++) {
            Alarm alarm = changes.get(i).alarm();
            spoken += changes.get(i).what().equals("raised")
                            || changes.get(i).what().equals("again")
                    ? 1
                    : 0;
            String text = alarm.kind().word() + ": " + alarm.text()
                    + (alarm.comment().isEmpty() ? "" : " [" + alarm.comment() + "]");
            listener.event(new Event(
                    changes.get(i).reading(),
                    time,
                    changes.get(i).what(),
                    alarm.relation(),
                    alarm.channel(),
                    alarm.unknown(),
                    alarm.size(),
                    alarm.unit(),
                    text));
        }
    }

    /** How often an alarm was raised or spoke again. */
    long alarmsRaised() {
        return spoken;
    }
}
