package benchtrue.source;

import benchtrue.reading.Reading;
import java.io.Closeable;
import java.time.Instant;
import org.jspecify.annotations.Nullable;

/** Where readings come from, one after the other; the run's loop is the same for all of them. Used by one thread. */
public interface Source extends Closeable {
    /** What came. */
    enum Outcome {
        /** A reading was filled in. */
        READING,
        /** A line could not be read; {@link #problem()} says which and why. It took no number and the next line is whole. */
        MALFORMED,
        /**
         * The device began anew (its clock jumped, its boot banner came): the reading that follows belongs to a new segment.
         * Run time goes on; {@link #problem()} says what was seen.
         */
        RESTART,
        /** Nothing came for a while (live sources only); ask again. */
        WAITING,
        /** The source is gone for now and is being reopened (live sources only); {@link #problem()} says why. Ask again. */
        LOST,
        /** Nothing more will come. */
        END,
        /** It could not be read to its end; {@link #problem()} says where and why. */
        FAILED
    }

    /** @param into filled where the outcome is READING, else untouched */
    Outcome next(Reading into);

    /** What the last outcome other than READING was about, with file and line where there is one; empty where there is nothing to say. */
    String problem();

    /** The recorded start in UTC; null where the times are plain seconds, or before the first reading. */
    @Nullable
    Instant startedUtc();

    /** Lines that came and could not be kept for the run (live sources only). */
    default long lost() {
        return 0;
    }

    /** Lines that came and wait for the run (live sources only). */
    default int queued() {
        return 0;
    }

    /** How much of the source is read, 0…1; NaN where that is not known. */
    double progress();
}
