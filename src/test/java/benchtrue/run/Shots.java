package benchtrue.run;

import benchtrue.alarm.ReferenceModel;
import benchtrue.sheet.BenchSheet;
import benchtrue.sheet.SheetReader;
import benchtrue.source.Opened;
import benchtrue.source.ReplaySource;
import java.nio.file.Path;
import java.util.List;
import java.util.Objects;
import java.util.stream.Stream;
import org.jspecify.annotations.Nullable;

/** Snapshots of the shipped runs at stated times. */
public final class Shots {
    private static final double PACE = 20;

    private Shots() {}

    public static BenchSheet sheet(String rig) {
        return Objects.requireNonNull(
                SheetReader.read(Path.of("replays", rig, "sheet.toml")).sheet());
    }

    /** As the screen shows it when the replay was paused at the first reading from that time on, or at its end. */
    public static Snapshot of(String rig, double seconds, Act... acts) {
        return of(sheet(rig), Path.of("replays", rig, "readings.csv"), seconds, acts);
    }

    public static Snapshot of(BenchSheet sheet, Path readings, double seconds, Act... acts) {
        List<? extends @Nullable ReferenceModel> none = Stream.<@Nullable ReferenceModel>generate(() -> null)
                .limit(sheet.groups().size())
                .toList();
        Setup setup = new Setup(sheet, false, "replay", "run", null, none);
        SourceMaker maker = () -> ((Opened.Ready) ReplaySource.open(readings, sheet)).source();
        try (Session session = new Session(setup, maker, List.of(), new Silent())) {
            Views views = new Views(session.engine());
            while (!session.ended()
                    && !(session.engine().reading() > 0 && session.engine().time() >= seconds)) {
                session.fetch();
                if (session.due()) {
                    session.take();
                    views.reading();
                }
            }
            for (Act act : acts) {
                session.act(act);
            }
            boolean ended = session.ended();
            Closing closing = ended ? new Closer(session.engine(), maker, false).close() : null;
            return views.snapshot(
                    ended ? Snapshot.Phase.ENDED : Snapshot.Phase.PAUSED, PACE, session.source(), Double.NaN, closing);
        }
    }

    private static final class Silent implements RunListener {
        @Override
        public boolean wants(long reading) {
            return false;
        }

        @Override
        public void reading(EstimateRow row) {}

        @Override
        public void event(Event event) {}

        @Override
        public void closed(Closing closing) {}
    }
}
