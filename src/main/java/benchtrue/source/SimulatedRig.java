package benchtrue.source;

import benchtrue.sheet.BenchSheet;
import benchtrue.sheet.Rehearsal;

/** The rig that a sheet's {@code [rehearsal]} describes, as a source of readings. */
public final class SimulatedRig {
    private SimulatedRig() {}

    /**
     * Gives the readings that {@link Rehearsing} writes with the same seed, to the last bit.
     *
     * @param rehearsal the sheet's own
     */
    public static Source source(BenchSheet sheet, Rehearsal rehearsal, long seed) {
        return new RowSource(
                "rehearsal",
                new SimulatedRows(sheet, rehearsal, seed),
                sheet.channels().size());
    }
}
