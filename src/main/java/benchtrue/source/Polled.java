package benchtrue.source;

import java.util.List;

/**
 * What one round of questions gave. One channel was asked after the other, so the values are not of one instant.
 *
 * @param nanos when the first byte of the first answer came, by the monotonic clock; when the round ended, where none came
 * @param values one for each channel of the sheet; NaN where none was to be had
 * @param stamps when the first byte of each channel's answer came; 0 where none came
 * @param problems why values are missing, with the channel's name
 * @param answered whether at least one instrument answered in good order
 */
record Polled(long nanos, double[] values, long[] stamps, List<String> problems, boolean answered) {
    Polled {
        problems = List.copyOf(problems);
    }
}
