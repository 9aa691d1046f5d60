package benchtrue.run;

import benchtrue.model.Forgetting;
import benchtrue.reading.Reading;
import benchtrue.source.Source;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.util.ArrayList;
import java.util.List;

/**
 * Goes over the recorded readings again, from the file and not from the estimator, with the same rows left out, the same
 * segments and the same memory; holds one reading at a time.
 */
final class SecondPass {
    private final Engine engine;
    private final SourceMaker record;

    SecondPass(Engine engine, SourceMaker record) {
        this.engine = engine;
        this.record = record;
    }

    /** What takes the rows of one group. */
    interface Sink {
        /** A segment begins with the reading that comes next. */
        default void segment(Turn turn) {}

        /** Another memory holds from the reading that comes next. */
        default void forget(Forgetting forgetting) {}

        /** The next reading, before its rows; elapsed in s since the one before. */
        default void next(double time, double elapsed) {}

        /** A row that was used. */
        void row(int relation, Row row);
    }

    /** Each sink takes the group of its place; {@code errors} are filled for each reading before its rows. */
    void run(List<? extends Sink> sinks, Systematic... errors) {
        Rows rows = new Rows(engine.setup().sheet());
        List<Walk> walks = new ArrayList<>();
        for (int g = 0; g < sinks.size(); g++) {
            walks.add(new Walk(engine.groups().get(g), sinks.get(g)));
        }
        try (Source source = record.open()) {
            Reading reading = engine.newReading();
            double last = Double.NaN;
            while (reading.number < engine.reading() && next(source, reading)) {
                rows.fill(reading);
                for (Systematic each : errors) {
                    each.fill(reading);
                }
                double elapsed = Double.isNaN(last) ? 0 : Math.max(0, reading.time - last);
                last = reading.time;
                for (int g = 0; g < walks.size(); g++) {
                    walks.get(g).take(reading.number, reading.time, elapsed, rows.of(g));
                }
            }
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    /** False at the end of the record. */
    private static boolean next(Source source, Reading reading) {
        while (true) {
            switch (source.next(reading)) {
                case READING -> {
                    return true;
                }
                case END, FAILED -> {
                    return false;
                }
                default -> {}
            }
        }
    }

    /** Where the pass stands in the ledger of one group. */
    private static final class Walk {
        private final Sink sink;
        private final List<Turn> turns;
        private final Spans.Cursor[] leftOut;
        private int nextTurn;

        Walk(GroupRun group, Sink sink) {
            this.sink = sink;
            turns = group.ledger().turns();
            leftOut = new Spans.Cursor[group.specs().size()];
            for (int k = 0; k < leftOut.length; k++) {
                leftOut[k] = group.ledger().leftOut(k);
            }
        }

        void take(long number, double time, double elapsed, Row[] rows) {
            boolean begins = false;
            while (nextTurn < turns.size() && turns.get(nextTurn).reading() <= number) {
                begins |= turn(turns.get(nextTurn++));
            }
            sink.next(time, begins ? 0 : elapsed);
            for (int k = 0; k < rows.length; k++) {
                if (!leftOut[k].contains(number) && rows[k].present) {
                    sink.row(k, rows[k]);
                }
            }
        }

        private boolean turn(Turn turn) {
            if (turn.forgetting() != null) {
                sink.forget(turn.forgetting());
            }
            if (turn.segment() != null) {
                sink.segment(turn);
            }
            return turn.segment() != null;
        }
    }
}
