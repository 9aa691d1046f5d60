package benchtrue.run;

import org.jspecify.annotations.Nullable;

/**
 * One line of the event log.
 *
 * @param reading number of the last reading when it happened
 * @param time seconds since the first reading
 * @param event a word: raised, cause, returned, acknowledged, held out, adopted, gap, malformed, segment, mark, …
 * @param value a number that belongs to it, in {@code unit}; NaN: none
 */
public record Event(
        long reading,
        double time,
        String event,
        @Nullable String relation,
        @Nullable String channel,
        @Nullable String unknown,
        double value,
        String unit,
        String text) {}
