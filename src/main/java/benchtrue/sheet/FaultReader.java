package benchtrue.sheet;

import benchtrue.model.Interval;
import java.util.List;
import java.util.stream.Stream;
import org.jspecify.annotations.Nullable;

/** One of the {@code [[rehearsal.faults]]}. */
final class FaultReader {
    private static final List<String> OF_THE_RIG = List.of("dropout", "restart", "garbled");
    private static final List<String> OF_A_CHANNEL =
            List.of("gain", "offset", "warm-up", "hum", "late", "loose", "outliers", "clip", "stuck", "missing");

    private final List<String> channels;
    private final Keys keys;
    private final double from;
    private final double to;

    FaultReader(List<String> channels, Keys keys) {
        this.channels = channels;
        this.keys = keys;
        from = keys.seconds("from", 0);
        to = keys.seconds("to", Double.POSITIVE_INFINITY);
        if (keys.has("to") && !(from < to)) {
            keys.mistake("to", "the fault ends before it begins", "give a time after from");
        }
    }

    /** Null, with a mistake, where it is none. */
    @Nullable
    Fault read() {
        String kind = keys.needed("kind", "\"stuck\"");
        Fault fault = null;
        if (OF_THE_RIG.contains(kind)) {
            fault = ofTheRig(kind);
        } else if (OF_A_CHANNEL.contains(kind)) {
            fault = ofAChannel(kind);
        } else if (!kind.isEmpty()) {
            List<String> all =
                    Stream.concat(OF_A_CHANNEL.stream(), OF_THE_RIG.stream()).toList();
            keys.mistake("kind", "\"" + kind + "\" is no fault", Nearest.remedy(kind, all));
            return null;
        }
        keys.done();
        return fault;
    }

    private Fault ofTheRig(String kind) {
        if (kind.equals("garbled")) {
            return new Fault.Garbled(from, to, probability());
        }
        needs("to", "1060");
        return kind.equals("dropout")
                ? new Fault.Dropout(from, to)
                : new Fault.Restart(from, to, keys.number("clock", 0));
    }

    private @Nullable Fault ofAChannel(String kind) {
        String name = keys.needed("channel", "\"" + channels.get(0) + "\"");
        int channel = channels.indexOf(name);
        if (channel < 0) {
            if (!name.isEmpty()) {
                keys.mistake("channel", "there is no channel " + name, Nearest.remedy(name, channels));
            }
            return null;
        }
        return switch (kind) {
            case "gain" -> new Fault.Gain(channel, from, to, size(), keys.seconds("over", 0));
            case "offset" -> new Fault.Offset(channel, from, to, size(), keys.seconds("over", 0));
            case "warm-up" -> new Fault.WarmUp(channel, from, to, size(), seconds("time_constant", "\"240 s\""));
            case "hum" -> new Fault.Hum(channel, from, to, size(), frequency());
            case "late" -> new Fault.Late(channel, from, to, seconds("delay", "\"0.5 s\""));
            case "clip" -> clip(channel);
            case "stuck" -> new Fault.Stuck(channel, from, to);
            case "missing" -> new Fault.Missing(channel, from, to, probability());
            default -> loose(channel, kind.equals("outliers"));
        };
    }

    private void needs(String key, String example) {
        if (!keys.has(key)) {
            keys.needed(key, example);
        }
    }

    private double size() {
        needs("size", "-0.08");
        return keys.number("size", 0);
    }

    private double seconds(String key, String example) {
        needs(key, example);
        return keys.seconds(key, 1);
    }

    private double frequency() {
        needs("frequency", "49.98");
        return keys.size("frequency", 1, false);
    }

    private double probability() {
        needs("probability", "0.12");
        double probability = keys.size("probability", 1, true);
        if (probability > 1) {
            keys.mistake("probability", "a probability is at most 1", "write 12 % as 0.12");
        }
        return probability;
    }

    private @Nullable Fault loose(int channel, boolean eitherSign) {
        double probability = probability();
        needs("range", "[-0.9, -0.25]");
        Interval range = keys.interval("range");
        return range == null
                ? null
                : new Fault.Loose(channel, from, to, probability, range.lower(), range.upper(), eitherSign);
    }

    private @Nullable Fault clip(int channel) {
        needs("limits", "[3.8, 20.5]");
        Interval limits = keys.interval("limits");
        return limits == null ? null : new Fault.Clip(channel, from, to, limits.lower(), limits.upper());
    }
}
