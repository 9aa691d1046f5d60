package benchtrue.source;

import java.io.Closeable;

/** Rows with the times that the device gave them. */
interface Rows extends Closeable {
    /** Fills in the next row, or why there is none. */
    void next(ReplayRow into);

    /** Whether device times count from 1970-01-01T00:00Z; known once there was a reading. */
    boolean isDated();

    /** From 0 to 1; NaN where it is not known. */
    double progress();
}
