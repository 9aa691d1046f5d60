package benchtrue.run;

import java.util.ArrayList;
import java.util.EnumMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;

/** Counts of readings. Each reading counts once: as excluded, else as held out, else as missing, else as used. */
final class Tally {
    /** What became of a reading, the gravest first. */
    enum Fate {
        EXCLUDED,
        HELD_OUT,
        MISSING,
        USED
    }

    private final Map<Fate, long[]> fates = new EnumMap<>(Fate.class);
    private final Map<String, long[]> reasons = new LinkedHashMap<>();
    private long seen;
    private long malformed;
    private double first = Double.NaN;
    private double last = Double.NaN;

    Tally() {
        for (Fate fate : Fate.values()) {
            fates.put(fate, new long[1]);
        }
    }

    private long[] cell(Fate fate) {
        return Objects.requireNonNull(fates.get(fate));
    }

    void reading(double time, Fate fate) {
        seen++;
        cell(fate)[0]++;
        if (seen == 1) {
            first = time;
        }
        last = time;
    }

    void malformed() {
        malformed++;
    }

    /** A row or reading was left out for this reason. */
    void leftOut(String reason, long count) {
        reasons.computeIfAbsent(reason, r -> new long[1])[0] += count;
    }

    /** Readings that counted as held out are used after all. */
    void takeBack(String reason, long count) {
        leftOut(reason, -count);
        cell(Fate.HELD_OUT)[0] -= count;
        cell(Fate.USED)[0] += count;
    }

    long count(Fate fate) {
        return cell(fate)[0];
    }

    long seen() {
        return seen;
    }

    long malformedCount() {
        return malformed;
    }

    double last() {
        return last;
    }

    List<Closing.Held> reasons() {
        List<Closing.Held> held = new ArrayList<>();
        reasons.forEach((reason, count) -> {
            if (count[0] > 0) {
                held.add(new Closing.Held(reason, count[0]));
            }
        });
        return held;
    }

    Closing.Readings closing(long gaps) {
        return new Closing.Readings(
                seen,
                count(Fate.USED),
                count(Fate.HELD_OUT),
                count(Fate.EXCLUDED),
                malformed,
                count(Fate.MISSING),
                gaps,
                first,
                last,
                last - first);
    }
}
