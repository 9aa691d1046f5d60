package benchtrue.alarm;

import org.jspecify.annotations.Nullable;

/**
 * What a detector found, to be raised or to bring a standing alarm up to date. Fields as in {@link Alarm}.
 *
 * @param beyondLimit whether with this change the unknown is outside its tolerance limits
 */
record Finding(
        Alarm.Kind kind,
        @Nullable String relation,
        @Nullable String channel,
        @Nullable String unknown,
        Onset onset,
        double size,
        double sizeU,
        String unit,
        @Nullable String cause,
        boolean provisional,
        boolean beyondLimit,
        Alarm.Priority priority,
        String text) {

    /** Something about a channel or the clock, which has no cause to be named. */
    static Finding of(
            Alarm.Kind kind,
            @Nullable String channel,
            Onset onset,
            double size,
            String unit,
            Alarm.Priority priority,
            String text) {
        return new Finding(
                kind, null, channel, null, onset, size, Double.NaN, unit, null, false, false, priority, text);
    }

    /** What is told of a relation as a whole. */
    static Finding ofRelation(
            Alarm.Kind kind,
            String relation,
            Onset onset,
            double size,
            String unit,
            Alarm.Priority priority,
            String text) {
        return new Finding(
                kind, relation, null, null, onset, size, Double.NaN, unit, null, false, false, priority, text);
    }

    /** When it began: times in s since the first reading, NaN not known; reading 0: not known. */
    record Onset(double time, double from, double to, long reading) {
        static Onset at(double time, long reading) {
            return new Onset(time, time, time, reading);
        }
    }
}
