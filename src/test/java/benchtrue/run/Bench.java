package benchtrue.run;

import benchtrue.model.Expression;
import benchtrue.model.Forgetting;
import benchtrue.model.Interval;
import benchtrue.model.Memory;
import benchtrue.model.Relation;
import benchtrue.model.Scope;
import benchtrue.model.Unit;
import benchtrue.reading.Reading;
import benchtrue.sheet.Alarms;
import benchtrue.sheet.BenchSheet;
import benchtrue.sheet.Channel;
import benchtrue.sheet.Group;
import benchtrue.sheet.ReferenceSpec;
import benchtrue.sheet.RelationSpec;
import benchtrue.sheet.UnknownSpec;
import benchtrue.source.Source;
import java.time.Instant;
import java.util.List;
import java.util.Map;
import java.util.SplittableRandom;
import java.util.stream.Stream;
import org.jspecify.annotations.Nullable;

/** An invented bench for tests of the run: V = R·I + V0, readings ten times a second, and sources that need no file. */
final class Bench {
    static final Interval ANY = new Interval(Double.NEGATIVE_INFINITY, Double.POSITIVE_INFINITY);

    private Bench() {}

    static BenchSheet sheet(Memory memory, double otherOfV) {
        return sheet(new Forgetting(Forgetting.Kind.EXPONENTIAL, memory), otherOfV);
    }

    static BenchSheet sheet(Forgetting forgetting, double otherOfV) {
        Scope scope = Scope.EMPTY.withChannel("I", unit("A"), Double.NaN).withChannel("V", unit("V"), Double.NaN);
        Relation relation =
                Relation.parse("V = R*I + V0", scope, Map.of(), null).get();
        List<UnknownSpec> unknowns = relation.unknowns().stream()
                .map(u -> new UnknownSpec(u.name(), u.unit(), u.constantTerm(), null, Double.NaN, null, 0))
                .toList();
        RelationSpec spec = new RelationSpec(relation, "V", true, new int[] {0, 1});
        Group group = new Group(List.of(spec), unknowns, forgetting);
        return new BenchSheet(
                "Resistor on the bench",
                "R17",
                List.of(),
                0,
                List.of(channel("I", "A", 0), channel("V", "V", otherOfV)),
                List.of(),
                List.of(group),
                List.of(),
                List.of(),
                List.of(),
                List.of(),
                new ReferenceSpec(20, null, List.of()),
                new Alarms(1 / (8 * 3600.0)),
                null,
                null,
                null,
                null,
                "");
    }

    private static Unit unit(String text) {
        return Unit.parse(text).get();
    }

    private static Channel channel(String name, String unit, double other) {
        @Nullable Expression none = null;
        return new Channel(name, unit(unit), ANY, Double.NaN, Double.NaN, other, false, false, null, none, null);
    }

    static Setup setup(BenchSheet sheet) {
        List<? extends benchtrue.alarm.@Nullable ReferenceModel> none =
                Stream.<benchtrue.alarm.@Nullable ReferenceModel>generate(() -> null)
                        .limit(sheet.groups().size())
                        .toList();
        return new Setup(sheet, false, "replay", "bench", null, none);
    }

    /** Readings of R = 2 Ω, V0 = 0.1 V; R goes up by {@code step} after {@code stepAt} readings. */
    record Made(int count, long seed, int stepAt, double step) implements SourceMaker {
        @Override
        public Source open() {
            SplittableRandom random = new SplittableRandom(seed);
            return new Source() {
                private int made;

                @Override
                public Outcome next(Reading into) {
                    if (made == count) {
                        return Outcome.END;
                    }
                    made++;
                    double current = 1 + (made / 7 % 5);
                    double r = made > stepAt ? 2 + step : 2;
                    into.number = made;
                    into.time = (made - 1) * 0.1;
                    into.values[0] = current;
                    into.values[1] = r * current + 0.1 + 0.01 * random.nextGaussian();
                    return Outcome.READING;
                }

                @Override
                public String problem() {
                    return "";
                }

                @Override
                public @Nullable Instant startedUtc() {
                    return null;
                }

                @Override
                public double progress() {
                    return made / (double) count;
                }

                @Override
                public void close() {}
            };
        }
    }
}
