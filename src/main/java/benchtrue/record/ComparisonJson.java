package benchtrue.record;

import benchtrue.estimate.RunComparison;
import benchtrue.run.ComparedUnknown;
import java.io.IOException;
import java.util.List;
import java.util.stream.IntStream;

/** The same unknowns over several runs, for scripts. */
public final class ComparisonJson {
    private ComparisonJson() {}

    public static String of(List<ComparedUnknown> unknowns) {
        return JsonOut.text(out -> out.object(o -> {
            out.object("program", p -> {
                out.text("name", Program.NAME);
                out.text("version", Program.version());
            });
            out.array("unknowns", unknowns, unknown -> write(out, unknown));
        }));
    }

    private static void write(JsonOut out, ComparedUnknown unknown) throws IOException {
        out.object(o -> {
            out.text("name", unknown.name());
            out.text("unit", unknown.unit());
            out.interval("limits", unknown.limits());
            out.text("timeIn", unknown.dated() ? "days" : "runs");
            List<Integer> places =
                    IntStream.range(0, unknown.values().size()).boxed().toList();
            out.array("runs", places, i -> run(out, unknown, i));
            trend(out, unknown.comparison());
        });
    }

    private static void run(JsonOut out, ComparedUnknown unknown, int i) throws IOException {
        ComparedUnknown.Value value = unknown.values().get(i);
        out.object(o -> {
            out.text("name", value.run());
            out.number("time", value.time());
            out.number("estimate", value.unknown().estimate());
            out.number("expandedUncertainty", value.unknown().expandedUncertainty());
            out.number("standardUncertaintyOfReadings", value.ownU());
            out.number("en", unknown.comparison().agreement()[i]);
            out.truth("outlier", unknown.comparison().outlier()[i]);
        });
    }

    private static void trend(JsonOut out, RunComparison comparison) throws IOException {
        RunComparison.Trend trend = comparison.trend();
        if (trend == null) {
            out.nothing("trend");
        } else {
            out.object("trend", t -> {
                out.number("slope", trend.slope());
                out.number("slopeU", trend.slopeU());
                out.truth("clear", trend.isClear());
                out.number("scatter", trend.scatter());
            });
        }
        RunComparison.Reach reach = comparison.reaches();
        if (reach == null) {
            out.nothing("reaches");
        } else {
            out.object("reaches", r -> {
                out.number("limit", reach.limit());
                out.number("time", reach.time());
                out.number("earliest", reach.earliest());
                out.number("latest", reach.latest());
            });
        }
    }
}
