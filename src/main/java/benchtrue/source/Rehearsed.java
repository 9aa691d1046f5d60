package benchtrue.source;

import benchtrue.sheet.Mistake;

/** What became of a rehearsal. */
public sealed interface Rehearsed {
    /** @param readings how many rows readings.csv has below its header */
    record Written(long readings) implements Rehearsed {}

    /** Nothing in the folder was changed. */
    record Refused(Mistake mistake) implements Rehearsed {}
}
