package benchtrue.model;

import benchtrue.reading.Reading;
import java.util.List;
import org.jspecify.annotations.Nullable;

/**
 * Turns the readings of one run into observations: corrections first, then the derived channels, each of which may use those
 * before it. Fills the same observation again; to be called once for each reading, in order.
 */
public final class Preparation {
    private final @Nullable Evaluator[] corrections;
    private final Evaluator[] derived;
    private final Observation observation;

    /**
     * @param corrections one for each channel in the order of the sheet, null where the indication is used as it is
     * @param derived in the order of the sheet
     */
    public Preparation(List<? extends @Nullable Expression> corrections, List<Expression> derived) {
        this.corrections = new Evaluator[corrections.size()];
        for (int channel = 0; channel < corrections.size(); channel++) {
            Expression correction = corrections.get(channel);
            this.corrections[channel] = correction == null ? null : correction.compile();
        }
        this.derived = derived.stream().map(Expression::compile).toArray(Evaluator[]::new);
        observation = new Observation(corrections.size() + derived.size());
    }

    /** The reading's observation, until the next call; what is missing or cannot be computed is NaN. */
    public Observation prepare(Reading reading) {
        int channels = corrections.length;
        observation.time = reading.time;
        System.arraycopy(reading.values, 0, observation.values, 0, channels);
        for (int channel = 0; channel < channels; channel++) {
            Evaluator correction = corrections[channel];
            if (correction != null) {
                observation.values[channel] = correction.evaluate(observation);
            }
        }
        for (int index = 0; index < derived.length; index++) {
            observation.values[channels + index] = derived[index].evaluate(observation);
        }
        return observation;
    }
}
