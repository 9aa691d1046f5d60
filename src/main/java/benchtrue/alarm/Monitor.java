package benchtrue.alarm;

import benchtrue.reading.Reading;
import benchtrue.sheet.BenchSheet;
import benchtrue.sheet.Group;
import java.util.ArrayList;
import java.util.List;
import org.jspecify.annotations.Nullable;

/**
 * All that watches a run. For each reading the engine calls {@link #arrive}, then {@link RelationMonitor#judge} for each row
 * before it is used. Deterministic; holds no clock: time is what the readings say.
 */
public final class Monitor {
    private final AlarmBook book = new AlarmBook();
    private final ClockWatch clock = new ClockWatch(book);
    private final Budget budget;
    private final Channels channels;
    private final List<GroupMonitor> groups = new ArrayList<>();

    public Monitor(BenchSheet sheet) {
        channels = new Channels(sheet.channels(), book);
        int relations =
                sheet.groups().stream().mapToInt(g -> g.relations().size()).sum();
        budget = new Budget(
                sheet.alarms().falseAlarmsPerSecond(),
                DETECTORS * relations + sheet.channels().size());
        Dependence dependence = new Dependence(sheet);
        for (Group group : sheet.groups()) {
            groups.add(new GroupMonitor(group, dependence.watched(group), budget, book, channels, clock));
        }
    }

    /** Of each relation: the sample test, the CUSUM (of the live model, later against the reference), the bank. */
    private static final int DETECTORS = 3;

    /**
     * Looks at clock and channels, before any row of the reading is judged.
     *
     * @param reading indications before any correction
     */
    public void arrive(Reading reading) {
        clock.arrive(reading.time, reading.number);
        budget.learn(clock.interval());
        channels.arrive(reading, clock.running(), budget.perReading());
    }

    /** The source saw the device begin anew with this reading; to be called after {@link #arrive}. */
    public void restarted(Reading reading) {
        clock.restarted(reading.number);
    }

    /** Seconds by which the estimates age at this reading: never negative, 0 where the clock went back. */
    public double elapsed() {
        return clock.elapsed();
    }

    /** Why a new segment begins with this reading, before it is used; null where none does. */
    public @Nullable String newSegment() {
        return clock.segment();
    }

    public GroupMonitor group(int g) {
        return groups.get(g);
    }

    /** All alarms; what was changed is to be drained from it after each reading and each act. */
    public AlarmBook book() {
        return book;
    }

    /** Status of a channel as the screen says it: good, doubtful, stuck, saturated, outside, silent. */
    public String channelStatus(int channel) {
        return channels.word(channel);
    }

    /** What somebody should know of the channels that is no alarm: a resolution that hides the noise. */
    public List<String> notices() {
        return channels.notices();
    }

    /** Silences of more than three usual intervals. */
    public long gaps() {
        return clock.gaps();
    }

    /** Median interval of readings in s; NaN before the second. */
    public double interval() {
        return clock.interval();
    }
}
