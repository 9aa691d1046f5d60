package benchtrue.source;

import benchtrue.sheet.BenchSheet;
import benchtrue.sheet.Rehearsal;
import java.math.BigDecimal;
import org.jspecify.annotations.Nullable;

/** What the instruments of the simulated rig indicate at a time: the latest of the readings that {@link SimulatedRows} makes. */
final class PresentRig {
    /** An instrument whose reading is older than so many intervals is off. */
    private static final double FRESH_INTERVALS = 1.5;

    private final SimulatedRows rows;
    private final double interval;
    private final double end;
    private final @Nullable BigDecimal[] cells;
    private double indicated = Double.NEGATIVE_INFINITY;
    private boolean garbled;
    private boolean more;

    PresentRig(BenchSheet sheet, Rehearsal rehearsal, long seed) {
        rows = new SimulatedRows(sheet, rehearsal, seed);
        interval = 1 / rehearsal.ratePerSecond();
        end = rehearsal.durationSeconds();
        cells = new BigDecimal[sheet.channels().size()];
        more = rows.advance();
    }

    boolean isOver(double seconds) {
        return seconds >= end;
    }

    /** Goes to a time not before that of the last call; false where nothing answers at that time. */
    boolean isOnAt(double seconds) {
        while (more && rows.seconds() <= seconds) {
            System.arraycopy(rows.cells(), 0, cells, 0, cells.length);
            indicated = rows.seconds();
            garbled = rows.isGarbled();
            more = rows.advance();
        }
        return seconds - indicated < FRESH_INTERVALS * interval;
    }

    /** Whether what is answered now is cut off on its way. */
    boolean isGarbled() {
        return garbled;
    }

    /** One for each channel; null where it has no value. Filled again. */
    @Nullable
    BigDecimal[] cells() {
        return cells;
    }
}
