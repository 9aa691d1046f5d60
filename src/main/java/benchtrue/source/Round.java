package benchtrue.source;

import benchtrue.source.Poller.NoValue;
import benchtrue.source.Poller.Result;
import benchtrue.source.Poller.Value;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/** What a round of questions has given so far. */
final class Round {
    private final double[] values;
    private final long[] stamps;
    private final byte[][] answers;
    private final List<String> problems = new ArrayList<>();
    private long first;
    private boolean came;
    private boolean answered;

    Round(int channels) {
        values = new double[channels];
        stamps = new long[channels];
        answers = new byte[channels][0];
        Arrays.fill(values, Double.NaN);
    }

    /** Bytes came for some channels, whatever they say. */
    void came(int[] channels, byte[] bytes, long stamp) {
        first = came ? first : stamp;
        came = true;
        answers[Arrays.stream(channels).min().orElseThrow()] = bytes;
        for (int channel : channels) {
            stamps[channel] = stamp;
        }
    }

    /** @return why there is no value; empty where there is one */
    String result(int channel, Result result) {
        answered = true;
        values[channel] = result instanceof Value value ? value.value() : Double.NaN;
        return result instanceof NoValue none ? none.why() : "";
    }

    void problem(String words) {
        problems.add(words);
    }

    Polled done(long now) {
        return new Polled(came ? first : now, values, stamps, answers, problems, answered);
    }
}
