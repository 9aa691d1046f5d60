package benchtrue.run;

import benchtrue.alarm.Monitor;
import benchtrue.reading.Reading;
import benchtrue.sheet.BenchSheet;
import benchtrue.sheet.Exclusion;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import org.jspecify.annotations.Nullable;

/**
 * Takes one reading after the other from row to estimate, test, alarm and event. What it does depends on the readings and the
 * operator's acts only, never on a clock: the same readings give the same results to the last bit. Used by one thread.
 */
public final class Engine {
    /** Used readings after which it is known which channels stand in regressors. */
    private static final int FELT_BY = 256;

    private final Setup setup;
    private final RunListener listener;
    private final Monitor monitor;
    private final Rows rows;
    private final Systematic systematic;
    private final Systematic noise;
    private final Tally tally = new Tally();
    private final Log log;
    private final List<GroupRun> groups = new ArrayList<>();
    private final List<Settling> settlings = new ArrayList<>();
    private final List<Adoption> adoptions = new ArrayList<>();
    private final Acts acts;
    private final EstimateRow row;
    private List<Exclusion> exclusions;
    private @Nullable Instant startedUtc;
    private @Nullable String restart;
    private boolean feltKnown;
    private double time = Double.NaN;
    private double lastTime = Double.NaN;
    private long reading;

    public Engine(Setup setup, RunListener listener) {
        this.setup = setup;
        this.listener = listener;
        BenchSheet sheet = setup.sheet();
        monitor = new Monitor(sheet);
        rows = new Rows(sheet);
        systematic = new Systematic(sheet);
        noise = Systematic.ofNoise(sheet);
        log = new Log(listener, tally);
        exclusions = sheet.exclusions();
        int unknowns = 0;
        int relations = 0;
        for (int g = 0; g < sheet.groups().size(); g++) {
            GroupRun group = new GroupRun(g, sheet.groups().get(g), monitor.group(g), systematic, noise);
            groups.add(group);
            settlings.add(new Settling(group));
            adoptions.add(
                    new Adoption(group, sheet.reference(), setup.references().get(g), log));
            unknowns += group.estimates().length;
            relations += group.specs().size();
        }
        row = new EstimateRow(unknowns, relations);
        acts = new Acts(this, log);
    }

    public Reading newReading() {
        return new Reading(setup.sheet().channels().size());
    }

    /** The recorded start, once it is known: dated exclusions count from it. */
    public void started(@Nullable Instant start) {
        startedUtc = start;
        exclusions =
                setup.sheet().exclusions().stream().map(e -> e.since(start)).toList();
    }

    public void step(Reading next) {
        reading = next.number;
        lastTime = time;
        time = next.time;
        log.at(reading, time);
        monitor.arrive(next);
        String reason = restart == null ? monitor.newSegment() : restart;
        if (restart != null) {
            monitor.restarted(next);
        }
        if (reason != null) {
            beginSegment(reason);
        }
        restart = null;
        rows.fill(next);
        systematic.fill(next);
        noise.fill(next);
        tally.reading(time, take());
        log.alarms(monitor.book().drain());
        settle();
        if (!feltKnown && tally.count(Tally.Fate.USED) >= FELT_BY) {
            feltKnown = true;
            noise.dropUnfelt();
        }
        if (listener.wants(reading)) {
            publish();
        }
    }

    private Tally.Fate take() {
        Exclusion exclusion = exclusion();
        String barred = exclusion == null ? warmUp() : exclusion.reason();
        Tally.Fate fate = Tally.Fate.USED;
        for (int g = 0; g < groups.size(); g++) {
            Tally.Fate one =
                    groups.get(g).take(reading, time, monitor.elapsed(), rows.of(g), barred, acts.onHold(), log);
            fate = one.compareTo(fate) < 0 ? one : fate;
        }
        return exclusion == null ? fate : Tally.Fate.EXCLUDED;
    }

    private @Nullable Exclusion exclusion() {
        for (int i = 0; i < exclusions.size(); i++) {
            Exclusion exclusion = exclusions.get(i);
            if (!exclusion.dated() && exclusion.from() <= time && time <= exclusion.to()) {
                return exclusion;
            }
        }
        return null;
    }

    private @Nullable String warmUp() {
        return time < setup.sheet().warmUpSeconds() ? "warm-up" : null;
    }

    private void settle() {
        for (int g = 0; g < groups.size(); g++) {
            Settling settling = settlings.get(g);
            if (settling.due(reading)) {
                settling.evaluate(reading, time, monitor.book().anyStanding());
                if (settling.allDetermined()) {
                    groups.get(g).compareWithPlausible();
                }
                adoptions.get(g).consider(settling.allSettled(), reading, time);
            }
        }
    }

    private void publish() {
        row.reading = reading;
        row.time = time;
        int unknown = 0;
        int relation = 0;
        for (int g = 0; g < groups.size(); g++) {
            GroupRun group = groups.get(g);
            group.fill(row, unknown, relation);
            unknown += group.estimates().length;
            relation += group.specs().size();
        }
        listener.reading(row);
    }

    /** A segment of all groups begins with the present reading. */
    void beginSegment(String reason) {
        log.event("segment", reason);
        for (int g = 0; g < groups.size(); g++) {
            groups.get(g).begin(reading, time, reason);
            settlings.get(g).restart();
        }
    }

    /** A line could not be read. */
    public void malformed(String problem) {
        log.malformed(problem);
    }

    /** The device began anew: the next reading is the first of a segment. */
    public void restarted(String problem) {
        restart = "restart";
        log.event("restart", problem);
    }

    /** The source went away or came back; for the log. */
    public void source(String word, String problem) {
        log.event(word, problem);
    }

    /** Does what the operator asked, between two readings, and logs it. */
    public void apply(Act act) {
        log.at(reading, Double.isNaN(time) ? 0 : time);
        acts.apply(act);
        log.alarms(monitor.book().drain());
    }

    Setup setup() {
        return setup;
    }

    Monitor monitor() {
        return monitor;
    }

    Tally tally() {
        return tally;
    }

    List<GroupRun> groups() {
        return groups;
    }

    Settling settling(int group) {
        return settlings.get(group);
    }

    Adoption adoption(int group) {
        return adoptions.get(group);
    }

    Acts acts() {
        return acts;
    }

    Rows rows() {
        return rows;
    }

    /** Rows with each channel that stands in a regressor moved by its declared noise. */
    Systematic noise() {
        return noise;
    }

    List<Exclusion> exclusions() {
        return exclusions;
    }

    @Nullable
    Instant startedUtc() {
        return startedUtc;
    }

    /** Seconds since the first reading; NaN before it. */
    public double time() {
        return time;
    }

    /** Number of the last reading; 0 before the first. */
    public long reading() {
        return reading;
    }

    /** How often an alarm spoke so far. */
    public long alarmsRaised() {
        return log.alarmsRaised();
    }

    /** Seconds between the last two readings; NaN before the second. */
    double interval() {
        return time - lastTime;
    }
}
