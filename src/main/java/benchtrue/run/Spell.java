package benchtrue.run;

import benchtrue.sheet.BenchSheet;
import benchtrue.sheet.Channel;
import java.util.ArrayList;
import java.util.List;

/** What the channels did from one moment on, for the checks before a run: mean, noise, step, rate, autocorrelation. */
final class Spell {
    private final BenchSheet sheet;
    private final double[] first;
    private final double[] before;
    private final long[] count;
    private final double[] mean;
    private final double[] squares;
    private final double[] neighbours;
    private final double[] step;
    private double from = Double.NaN;
    private double to = Double.NaN;
    private long readings;

    Spell(BenchSheet sheet) {
        this.sheet = sheet;
        int channels = sheet.channels().size();
        first = new double[channels];
        before = new double[channels];
        count = new long[channels];
        mean = new double[channels];
        squares = new double[channels];
        neighbours = new double[channels];
        step = new double[channels];
    }

    /** @param values of the channels in the order of the sheet; NaN: missing */
    void add(double time, double[] values) {
        from = readings++ == 0 ? time : from;
        to = time;
        for (int i = 0; i < count.length; i++) {
            if (!Double.isNaN(values[i])) {
                add(i, values[i]);
            }
        }
    }

    private void add(int i, double value) {
        if (count[i]++ == 0) {
            first[i] = value;
            step[i] = Double.POSITIVE_INFINITY;
        } else {
            double change = Math.abs(value - before[i]);
            step[i] = change > 0 ? Math.min(step[i], change) : step[i];
            neighbours[i] += (value - before[i]) * (value - before[i]);
        }
        double away = value - mean[i];
        mean[i] += away / count[i];
        squares[i] += away * (value - mean[i]);
        before[i] = value;
    }

    Snapshot.SpellView view() {
        List<Snapshot.ChannelSpell> channels = new ArrayList<>();
        for (int i = 0; i < count.length; i++) {
            Channel channel = sheet.channels().get(i);
            channels.add(view(channel, i));
        }
        double rate = readings > 1 ? (readings - 1) / (to - from) : Double.NaN;
        return new Snapshot.SpellView(readings == 0 ? 0 : to - from, rate, channels);
    }

    /** The autocorrelation at lag 1 is 1 − d/2 with d as in Durbin–Watson; it widens the uncertainty of the mean, never narrows it. */
    private Snapshot.ChannelSpell view(Channel channel, int i) {
        double variance = count[i] > 1 ? squares[i] / (count[i] - 1) : Double.NaN;
        double lag = squares[i] > 0 ? 1 - neighbours[i] / (2 * squares[i]) : 0;
        double widening = lag > 0 && lag < 1 ? (1 + lag) / (1 - lag) : 1;
        return new Snapshot.ChannelSpell(
                channel.name(),
                channel.unit().symbol(),
                count[i],
                count[i] == 0 ? Double.NaN : mean[i],
                Math.sqrt(variance * widening / Math.max(1, count[i])),
                Math.sqrt(variance),
                Double.isInfinite(step[i]) || count[i] < 2 ? Double.NaN : step[i],
                lag,
                before[i] - first[i]);
    }
}
