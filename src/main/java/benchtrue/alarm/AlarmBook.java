package benchtrue.alarm;

import java.util.ArrayList;
import java.util.List;
import java.util.Objects;
import org.jspecify.annotations.Nullable;

/**
 * All alarms of a run and what was done about them (after IEC 62682). One cause is one alarm: what is found again counts up
 * the alarm that stands; a step, a drift and more noise of one relation are one cause that is better known as time passes. An
 * alarm that persists speaks again only when its size has doubled or a limit is crossed.
 */
public final class AlarmBook {
    private final List<Entry> entries = new ArrayList<>();
    private final List<Change> changes = new ArrayList<>();
    private double time;
    private long reading;

    /** To be called before the detectors of a reading report: time in s, which must not go back. */
    void at(double now, long number) {
        time = now;
        reading = number;
        for (int i = 0; i < entries.size(); i++) {
            Entry entry = entries.get(i);
            if (now >= entry.shelvedUntil()) {
                changed(entry.unshelve(), entry);
            }
        }
    }

    /** Raises what was found, or brings the alarm that stands for the same cause up to date. */
    void report(Finding finding) {
        Entry entry = find(finding.kind(), finding.relation(), finding.channel());
        if (entry == null) {
            entry = new Entry(entries.size() + 1, finding, time, reading);
            entries.add(entry);
            changed("raised", entry);
        } else {
            changed(entry.report(finding), entry);
        }
    }

    /** What was found is no longer there. */
    void normal(Alarm.Kind kind, @Nullable String relation, @Nullable String channel) {
        Entry entry = find(kind, relation, channel);
        if (entry != null && entry.stands()) {
            changed(entry.comeBack(), entry);
        }
    }

    /** @return false where there is no such alarm that waits to be acknowledged */
    public boolean acknowledge(int id, String comment) {
        if (id < 1 || id > entries.size() || entries.get(id - 1).acknowledged()) {
            return false;
        }
        entries.get(id - 1).acknowledge(comment);
        changed("acknowledged", entries.get(id - 1));
        return true;
    }

    /**
     * Takes an alarm off the list for a time; it comes back by itself.
     *
     * @return false where there is no such alarm that stands
     */
    public boolean shelve(int id, double seconds, String reason) {
        if (id < 1 || id > entries.size() || !entries.get(id - 1).stands() || !(seconds > 0)) {
            return false;
        }
        entries.get(id - 1).shelve(time + seconds, reason);
        changed("shelved", entries.get(id - 1));
        return true;
    }

    /** All alarms of the run in the order in which they were raised. */
    public List<Alarm> alarms() {
        return entries.stream().map(Entry::alarm).toList();
    }

    /** Whether somebody still has to look at one. */
    public boolean anyUnacknowledged() {
        return entries.stream().anyMatch(e -> !e.acknowledged());
    }

    /** How many nobody has acknowledged. */
    public int unacknowledged() {
        return (int) entries.stream().filter(e -> !e.acknowledged()).count();
    }

    /** Whether any has not returned to normal, acknowledged or not. */
    public boolean anyStanding() {
        return entries.stream().anyMatch(Entry::stands);
    }

    /** The step, drift or noise alarm that stands for this relation and withholds its verdicts, or null. */
    public @Nullable Alarm standingDrift(String relation) {
        Entry entry = find(Alarm.Kind.DRIFT, relation, null);
        return entry != null && entry.stands() ? entry.alarm() : null;
    }

    /** Whether this alarm stands. */
    boolean stands(Alarm.Kind kind, @Nullable String relation, @Nullable String channel) {
        Entry entry = find(kind, relation, channel);
        return entry != null && entry.stands();
    }

    /** The changes since the last call, oldest first. */
    public List<Change> drain() {
        if (changes.isEmpty()) {
            return List.of();
        }
        List<Change> drained = List.copyOf(changes);
        changes.clear();
        return drained;
    }

    private void changed(@Nullable String what, Entry entry) {
        if (what != null) {
            changes.add(new Change(what, entry.alarm(), reading, time));
        }
    }

    /** The newest alarm of the same cause, unless it is over: returned and acknowledged. */
    private @Nullable Entry find(Alarm.Kind kind, @Nullable String relation, @Nullable String channel) {
        for (int i = entries.size() - 1; i >= 0; i--) {
            Entry entry = entries.get(i);
            if (sameCause(entry.alarm(), kind, relation, channel)) {
                return entry.stands() || !entry.acknowledged() ? entry : null;
            }
        }
        return null;
    }

    private static boolean sameCause(
            Alarm alarm, Alarm.Kind kind, @Nullable String relation, @Nullable String channel) {
        boolean sameKind = alarm.kind() == kind || (alarm.kind().isDrift() && kind.isDrift());
        return sameKind && Objects.equals(alarm.relation(), relation) && Objects.equals(alarm.channel(), channel);
    }
}
