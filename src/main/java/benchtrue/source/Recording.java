package benchtrue.source;

/** Where a live run is kept. Nothing here waits for a disk. Times are µs since 1970-01-01T00:00Z and rise from call to call. */
public interface Recording {
    /** Each line as it came, its end included; may be called by any one thread. The bytes are not written again. */
    void raw(long utcMicros, byte[] line);

    /** The values that a line was read as, in the order and the units of the sheet; NaN: missing. They are copied. */
    void reading(long utcMicros, double[] values);

    /** A line that could not be read as values. */
    void unread(long utcMicros);
}
