package benchtrue.source;

import benchtrue.source.Source.Outcome;

/** One row of readings.csv that was read: its outcome, and where that is READING, device time and values. Filled again. */
final class ReplayRow {
    Outcome outcome = Outcome.END;
    long line;
    /** What is wrong; empty for a reading. */
    String problem = "";
    /** Device time. */
    long nanos;

    final double[] values;

    ReplayRow(int channels) {
        values = new double[channels];
    }

    void is(Outcome outcome, long line, String problem) {
        this.outcome = outcome;
        this.line = line;
        this.problem = problem;
    }
}
