package benchtrue.alarm;

import org.jspecify.annotations.Nullable;

/** One alarm of the book with what its state needs beyond the alarm itself. */
final class Entry {
    private final int id;
    private final double raised;
    private final long raisedReading;
    private Finding finding;
    private boolean stands = true;
    private boolean acknowledged;
    private double shelvedUntil = Double.POSITIVE_INFINITY;
    private double spokenSize;
    private String spokenCause = "";
    private int count = 1;
    private String comment = "";

    Entry(int id, Finding finding, double time, long reading) {
        this.id = id;
        this.finding = finding;
        raised = time;
        raisedReading = reading;
        spokenSize = Math.abs(finding.size());
        spokenCause = finding.provisional() ? "" : words(finding);
    }

    /** @return the word for the log, or null where nothing need be said */
    @Nullable
    String report(Finding found) {
        Finding before = finding;
        finding = found;
        if (!stands) {
            stands = true;
            return speak();
        }
        if (!found.provisional() && !spokenCause.equals(words(found))) {
            spokenCause = words(found);
            spokenSize = Math.abs(found.size());
            return "cause";
        }
        boolean doubled = !found.provisional() && Math.abs(found.size()) >= 2 * spokenSize && spokenSize > 0;
        return doubled || (found.beyondLimit() && !before.beyondLimit()) ? speak() : null;
    }

    private static String words(Finding found) {
        return found.kind() == Alarm.Kind.NOISE ? found.kind().word() : String.valueOf(found.cause());
    }

    private @Nullable String speak() {
        spokenSize = Math.abs(finding.size());
        count++;
        if (isShelved()) {
            return null;
        }
        acknowledged = false;
        return "again";
    }

    @Nullable
    String comeBack() {
        stands = false;
        return isShelved() ? null : "returned";
    }

    void acknowledge(String words) {
        acknowledged = true;
        comment = words;
    }

    void shelve(double until, String reason) {
        shelvedUntil = until;
        acknowledged = true;
        comment = reason;
    }

    /** A shelved alarm whose time is over must be looked at again, if it still stands. */
    String unshelve() {
        shelvedUntil = Double.POSITIVE_INFINITY;
        acknowledged = !stands;
        return stands ? "unshelved" : "returned";
    }

    double shelvedUntil() {
        return shelvedUntil;
    }

    private boolean isShelved() {
        return shelvedUntil < Double.POSITIVE_INFINITY;
    }

    boolean stands() {
        return stands;
    }

    boolean acknowledged() {
        return acknowledged;
    }

    private Alarm.State state() {
        if (isShelved()) {
            return Alarm.State.SHELVED;
        }
        if (!stands) {
            return Alarm.State.RETURNED;
        }
        return acknowledged ? Alarm.State.ACKNOWLEDGED : Alarm.State.RAISED;
    }

    Alarm alarm() {
        Finding f = finding;
        Finding.Onset onset = f.onset();
        return new Alarm(
                id,
                f.kind(),
                f.relation(),
                f.channel(),
                f.unknown(),
                onset.time(),
                onset.from(),
                onset.to(),
                onset.reading(),
                raised,
                raisedReading,
                f.size(),
                f.sizeU(),
                f.unit(),
                f.cause(),
                f.provisional(),
                state(),
                acknowledged,
                count,
                f.priority(),
                f.text(),
                comment);
    }
}
