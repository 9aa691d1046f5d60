package benchtrue.run;

import benchtrue.alarm.Monitor;
import benchtrue.model.Observation;
import benchtrue.sheet.BenchSheet;
import benchtrue.sheet.Channel;
import benchtrue.sheet.Derived;
import benchtrue.source.Source;
import java.util.ArrayList;
import java.util.List;
import org.jspecify.annotations.Nullable;

/** What the screen sees of an engine: keeps short histories and copies all into snapshots. */
final class Views {
    private static final int TREND = 120;
    /** Points of a trend are at least so many seconds apart. */
    private static final double TREND_STEP = 0.5;

    private final Engine engine;
    private final List<GroupViews> groups = new ArrayList<>();
    private final Advising advising;
    private final Stopping stopping;
    private final Recent[] trends;
    private final double[] lastSeen;
    private final double[] lastKept;
    private @Nullable Spell spell;

    Views(Engine engine) {
        this.engine = engine;
        advising = new Advising(engine);
        stopping = new Stopping(engine);
        BenchSheet sheet = engine.setup().sheet();
        int channels = sheet.channels().size() + sheet.derived().size();
        trends = new Recent[channels];
        lastSeen = new double[channels];
        lastKept = new double[channels];
        for (int i = 0; i < channels; i++) {
            trends[i] = new Recent(TREND);
            lastSeen[i] = Double.NaN;
            lastKept[i] = Double.NEGATIVE_INFINITY;
        }
        for (GroupRun group : engine.groups()) {
            groups.add(new GroupViews(engine, group));
        }
    }

    /** @param begins whether a new spell begins, or the present one ends */
    void observe(boolean begins) {
        spell = begins ? new Spell(engine.setup().sheet()) : null;
    }

    /** To be called after each reading. */
    void reading() {
        stopping.reading();
        Observation observation = engine.rows().observation();
        double time = engine.time();
        for (int i = 0; i < trends.length; i++) {
            double value = observation.values[i];
            if (!Double.isNaN(value)) {
                lastSeen[i] = time;
                if (!(Math.abs(time - lastKept[i]) < TREND_STEP)) {
                    lastKept[i] = time;
                    trends[i].add(value);
                }
            }
        }
        if (spell != null) {
            spell.add(time, observation.values);
        }
        for (int g = 0; g < groups.size(); g++) {
            groups.get(g).reading();
        }
    }

    /** @param readingAge seconds of the wall clock since the last reading; NaN for a replay */
    Snapshot snapshot(Snapshot.Phase phase, double pace, Source source, double readingAge, @Nullable Closing closing) {
        Setup setup = engine.setup();
        BenchSheet sheet = setup.sheet();
        List<Snapshot.RelationView> relations = new ArrayList<>();
        groups.forEach(group -> group.addTo(relations));
        Monitor monitor = engine.monitor();
        return new Snapshot(
                setup.live(),
                sheet.title(),
                sheet.item(),
                setup.sourceName(),
                phase,
                engine.reading(),
                engine.time(),
                source.progress(),
                pace,
                readingAge,
                engine.acts().onHold(),
                counts(source),
                channels(sheet, monitor),
                relations,
                monitor.book().alarms(),
                advising.advice(),
                notices(),
                stopping.whyNotYet(),
                stopping.points(),
                engine.acts().setUp(),
                spell == null ? null : spell.view(),
                closing);
    }

    private Snapshot.Counts counts(Source source) {
        Tally tally = engine.tally();
        return new Snapshot.Counts(
                tally.seen(),
                tally.count(Tally.Fate.USED),
                tally.count(Tally.Fate.HELD_OUT),
                tally.count(Tally.Fate.EXCLUDED),
                tally.malformedCount(),
                tally.count(Tally.Fate.MISSING),
                engine.monitor().gaps(),
                source.lost(),
                source.queued());
    }

    private List<Snapshot.ChannelView> channels(BenchSheet sheet, Monitor monitor) {
        List<Snapshot.ChannelView> views = new ArrayList<>();
        int index = 0;
        for (Channel channel : sheet.channels()) {
            views.add(channel(index, channel.name(), channel.unit().symbol(), monitor.channelStatus(index)));
            index++;
        }
        for (Derived derived : sheet.derived()) {
            views.add(channel(index, derived.name(), derived.expression().unit().symbol(), "derived"));
            index++;
        }
        return views;
    }

    private Snapshot.ChannelView channel(int index, String name, String unit, String status) {
        double value = engine.reading() == 0 ? Double.NaN : engine.rows().observation().values[index];
        return new Snapshot.ChannelView(
                name, unit, value, engine.time() - lastSeen[index], status, trends[index].copy());
    }

    private List<String> notices() {
        List<String> notices = new ArrayList<>(engine.monitor().notices());
        if (engine.acts().onHold()) {
            notices.add("estimates are held by the operator");
        }
        for (GroupRun group : engine.groups()) {
            String waiting = engine.adoption(group.index()).waitingFor();
            if (!waiting.isEmpty()) {
                notices.add("reference model not adopted yet: " + waiting);
            }
        }
        return notices;
    }
}
