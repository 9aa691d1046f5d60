package benchtrue.cli;

import benchtrue.record.SummaryJson;
import benchtrue.record.SummaryText;
import benchtrue.run.Closing;
import benchtrue.run.Desk;

/** A run up to its last word: its summary on the output, whatever ended it. */
final class EndOfRun {
    /** The run. */
    interface Running {
        Closing run(Desk desk) throws Exception;
    }

    private EndOfRun() {}

    /** Returns the exit status. */
    static int tell(Output out, RunOptions options, Running running) throws Exception {
        Desk desk = new Desk();
        Departure departure = Departure.of(desk);
        try {
            Closing closing = running.run(desk);
            if (options.json()) {
                out.json(SummaryJson.of(closing));
            } else {
                out.line("");
                out.text(SummaryText.brief(closing));
            }
            return closing.status();
        } finally {
            departure.done();
        }
    }
}
