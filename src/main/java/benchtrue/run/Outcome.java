package benchtrue.run;

import benchtrue.alarm.Alarm;
import java.util.ArrayList;
import java.util.List;
import org.jspecify.annotations.Nullable;

/**
 * How the run ended, as the exit status says it: the highest of what holds.
 *
 * @param status 0 nothing found; 3 an alarm or a value outside its limits; 4 not to be relied on; 5 the source was lost
 */
record Outcome(int status, String text) {
    static Outcome of(
            List<Closing.Relation> relations, List<Closing.Result> results, List<Alarm> alarms, boolean lost) {
        if (lost) {
            return new Outcome(5, "the source was lost or could not be read to its end");
        }
        String unreliable = unreliable(relations);
        if (!unreliable.isEmpty()) {
            return new Outcome(4, unreliable);
        }
        List<String> found = found(relations, results, alarms);
        return found.isEmpty()
                ? new Outcome(0, "ended, nothing found")
                : new Outcome(3, "the run found: " + String.join("; ", found));
    }

    private static String unreliable(List<Closing.Relation> relations) {
        for (Closing.Relation relation : relations) {
            for (Closing.Unknown unknown : relation.unknowns()) {
                if (!unknown.determined()) {
                    return "not to be relied on: " + unknown.name() + " is not determined";
                }
            }
            Closing.Batch batch = relation.batch();
            if (batch != null && !batch.agrees()) {
                return "not to be relied on: the recursive and the batch fit of " + relation.response() + " disagree";
            }
        }
        return "";
    }

    private static List<String> found(
            List<Closing.Relation> relations, List<Closing.Result> results, List<Alarm> alarms) {
        List<String> found = new ArrayList<>();
        alarms.stream()
                .filter(a -> a.kind().isDrift() || a.kind().isChannelFault())
                .map(a -> a.kind().word() + " alarm" + subject(a))
                .distinct()
                .forEach(found::add);
        for (Closing.Relation relation : relations) {
            for (Closing.Unknown unknown : relation.unknowns()) {
                if (outside(unknown.verdict())) {
                    found.add(unknown.name() + " outside its limits");
                }
            }
        }
        for (Closing.Result result : results) {
            if (outside(result.verdict())) {
                found.add(result.name() + " outside its limits");
            }
        }
        return found.stream().distinct().toList();
    }

    private static String subject(Alarm alarm) {
        if (alarm.channel() != null) {
            return " on channel " + alarm.channel();
        }
        return alarm.relation() == null ? "" : " in " + alarm.relation();
    }

    private static boolean outside(@Nullable String verdict) {
        return verdict != null && verdict.endsWith("fail");
    }
}
