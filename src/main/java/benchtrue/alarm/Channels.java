package benchtrue.alarm;

import benchtrue.reading.Reading;
import benchtrue.sheet.Channel;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.stream.Stream;
import org.jspecify.annotations.Nullable;

/** The channels of a run. */
final class Channels {
    private final ChannelWatch[] watches;
    private final Map<String, Decision.HoldOut> objections = new HashMap<>();

    Channels(List<Channel> channels, AlarmBook book) {
        watches = channels.stream().map(c -> new ChannelWatch(c, book)).toArray(ChannelWatch[]::new);
    }

    void arrive(Reading reading, double runningTime, double perReading) {
        for (int i = 0; i < watches.length; i++) {
            watches[i].arrive(reading.values[i], runningTime, reading.number, perReading);
        }
    }

    /** Why a row that depends on these channels is held out, or null. */
    Decision.@Nullable HoldOut objection(int[] channels) {
        for (int channel : channels) {
            String reason = watches[channel].objection();
            if (reason != null) {
                return objections.computeIfAbsent(reason, Decision.HoldOut::new);
            }
        }
        return null;
    }

    /** When the trouble began that is objected to, in s. */
    double troubleSince(int[] channels) {
        double since = Double.POSITIVE_INFINITY;
        for (int channel : channels) {
            if (watches[channel].objection() != null) {
                since = Math.min(since, watches[channel].troubleSince());
            }
        }
        return since;
    }

    /** Whether one of them repeats its value and may turn out to be stuck. */
    boolean unresolved(int[] channels) {
        for (int channel : channels) {
            if (watches[channel].unresolved()) {
                return true;
            }
        }
        return false;
    }

    List<String> notices() {
        return Stream.of(watches)
                .map(ChannelWatch::coarse)
                .filter(Objects::nonNull)
                .toList();
    }

    /** Status of a channel: good, doubtful, stuck, saturated, outside, silent. */
    String word(int channel) {
        return watches[channel].word();
    }
}
