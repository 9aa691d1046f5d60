package benchtrue.source;

import java.util.List;

/**
 * What one round of questions gave. One channel was asked after the other, so the values are not of one instant.
 *
 * @param nanos when the first byte of the round came, by the monotonic clock; when the round ended, where none came
 * @param values one for each channel of the sheet; NaN where none was to be had
 * @param stamps when the first byte of each channel's answer came; 0 where none came
 * @param answers what came for each question, sound or not, at the first channel that it asks for; the others are empty
 * @param problems why values are missing, with the channel's name; of overloads and the like only the beginning is told
 * @param answered whether at least one instrument answered in good order
 */
record Polled(long nanos, double[] values, long[] stamps, byte[][] answers, List<String> problems, boolean answered) {
    Polled {
        problems = List.copyOf(problems);
    }
}
