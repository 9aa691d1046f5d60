package benchtrue.screen;

import benchtrue.alarm.Alarm;
import benchtrue.model.Interval;
import benchtrue.run.Snapshot;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/** Snapshots that no rig would give: long names, many channels, numbers of all sizes. */
final class Views {
    private Views() {}

    static Snapshot of(
            List<Snapshot.ChannelView> channels,
            List<Snapshot.UnknownView> unknowns,
            List<Alarm> alarms,
            boolean live) {
        Snapshot.RelationView relation = new Snapshot.RelationView(
                "y = a*x + b",
                "y",
                "V",
                "all",
                0.01,
                20,
                22,
                5,
                List.of(),
                unknowns,
                new double[] {0.5, -1, 6, Double.NaN, 2},
                new boolean[] {false, false, true, false, false},
                4,
                true,
                "",
                new Snapshot.Arms(0.25, 0),
                new Snapshot.Arms(Double.NaN, Double.NaN));
        return new Snapshot(
                live,
                "A bench",
                "",
                "run",
                Snapshot.Phase.RUNNING,
                100,
                20,
                live ? Double.NaN : 0.5,
                20,
                live ? 0.3 : Double.NaN,
                false,
                new Snapshot.Counts(100, 98, 2, 0, 0, 0, 0, 0, 0),
                channels,
                List.of(relation),
                alarms,
                null,
                List.of(),
                List.of("no reference model adopted yet"),
                List.of(),
                List.of(),
                null,
                null);
    }

    static Snapshot.ChannelView channel(String name, String unit, double value, String status) {
        return new Snapshot.ChannelView(name, unit, value, 0, status, new double[] {1, 2, 3, 4, 5, 4, 3});
    }

    static Snapshot.UnknownView unknown(String name, String unit, double value, double expanded) {
        int points = 50;
        double[] times = new double[points];
        double[] path = new double[points];
        double[] band = new double[points];
        for (int i = 0; i < points; i++) {
            times[i] = i;
            path[i] = value;
            band[i] = expanded * points / (i + 1);
        }
        return new Snapshot.UnknownView(
                name,
                unit,
                value,
                expanded / 2,
                expanded,
                2,
                20,
                Double.isNaN(value) ? "not determined" : "settling",
                expanded / 2,
                40,
                "",
                new Interval(value < 0 ? 2 * value : -1e300, value < 0 ? -1e-300 : 1e300),
                "U",
                "pass",
                null,
                Double.NaN,
                Double.NaN,
                times,
                path,
                band);
    }

    static Alarm alarm(int id, Alarm.State state, String text) {
        return new Alarm(
                id,
                Alarm.Kind.STEP,
                "y",
                null,
                null,
                10,
                9,
                11,
                50,
                12,
                60,
                0.5,
                0.1,
                "V",
                "not separable",
                true,
                state,
                state == Alarm.State.ACKNOWLEDGED,
                1,
                Alarm.Priority.ACT_NOW,
                text,
                "");
    }

    static List<Snapshot.ChannelView> channels(int count) {
        List<Snapshot.ChannelView> channels = new ArrayList<>();
        for (int i = 1; i <= count; i++) {
            channels.add(channel("c" + i, "V", Math.pow(10, i - 12.0), "good"));
        }
        return channels;
    }

    static List<Snapshot.UnknownView> unknowns(double... values) {
        List<Snapshot.UnknownView> unknowns = new ArrayList<>();
        Arrays.stream(values)
                .forEach(v -> unknowns.add(unknown("k" + (unknowns.size() + 1), "V/A", v, Math.abs(v) / 100)));
        return unknowns;
    }
}
