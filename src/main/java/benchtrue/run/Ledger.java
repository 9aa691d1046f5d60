package benchtrue.run;

import benchtrue.model.Forgetting;
import java.util.ArrayList;
import java.util.List;

/** What a second pass over the record must know of one group: which rows were left out, where segments begin. */
final class Ledger {
    private final Spans[] leftOut;
    private final List<Turn> turns = new ArrayList<>();

    Ledger(int relations) {
        leftOut = new Spans[relations];
        for (int k = 0; k < relations; k++) {
            leftOut[k] = new Spans();
        }
    }

    void leaveOut(int relation, long reading) {
        leftOut[relation].add(reading);
    }

    /** Rows from this reading on are used after all; returns how many there were. */
    long takeBack(int relation, long reading) {
        return leftOut[relation].removeFrom(reading);
    }

    /** @param reading may lie a few readings back: what was turned since then holds from there */
    void segment(long reading, double time, String reason) {
        turns.replaceAll(turn -> turn.reading() <= reading ? turn : turn.at(reading));
        turns.add(new Turn(reading, time, reason, null));
    }

    void forgetting(long reading, Forgetting forgetting) {
        turns.add(new Turn(reading, Double.NaN, null, forgetting));
    }

    /** In the order of their readings. */
    List<Turn> turns() {
        return List.copyOf(turns);
    }

    Spans.Cursor leftOut(int relation) {
        return leftOut[relation].cursor();
    }
}
