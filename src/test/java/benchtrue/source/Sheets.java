package benchtrue.source;

import benchtrue.model.Interval;
import benchtrue.model.Unit;
import benchtrue.sheet.Alarms;
import benchtrue.sheet.BenchSheet;
import benchtrue.sheet.Channel;
import benchtrue.sheet.Dialect;
import benchtrue.sheet.LineSpec;
import benchtrue.sheet.ReferenceSpec;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import org.jspecify.annotations.Nullable;

/** Sheets that have channels and nothing else. */
final class Sheets {
    private Sheets() {}

    /** @param namesAndUnits name, unit, name, unit… */
    static BenchSheet of(String... namesAndUnits) {
        return of(null, namesAndUnits);
    }

    static BenchSheet withDecimalComma(String... namesAndUnits) {
        return of(new LineSpec(null, 9600, "8N1", ";", true, Map.of(), Dialect.PLAIN), namesAndUnits);
    }

    /** 9600 baud. */
    static LineSpec line(String frame) {
        return new LineSpec(null, 9600, frame, ",", false, Map.of(), Dialect.PLAIN);
    }

    private static BenchSheet of(@Nullable LineSpec line, String... namesAndUnits) {
        List<Channel> channels = new ArrayList<>();
        for (int i = 0; i < namesAndUnits.length; i += 2) {
            channels.add(channel(namesAndUnits[i], namesAndUnits[i + 1]));
        }
        return new BenchSheet(
                "",
                "",
                List.of(),
                0,
                channels,
                List.of(),
                List.of(),
                List.of(),
                List.of(),
                List.of(),
                List.of(),
                new ReferenceSpec(Double.POSITIVE_INFINITY, null, List.of()),
                new Alarms(1),
                null,
                line,
                null,
                null,
                "");
    }

    private static Channel channel(String name, String unit) {
        return new Channel(
                name,
                Unit.parse(unit).get(),
                new Interval(Double.NEGATIVE_INFINITY, Double.POSITIVE_INFINITY),
                Double.NaN,
                Double.NaN,
                Double.NaN,
                false,
                false,
                null,
                null,
                null);
    }
}
