package benchtrue.source;

import java.io.IOException;

/** Bytes to and from a serial line, used by one thread. */
interface SerialLink {
    /**
     * Waits for bytes up to {@link PortLink#WAIT_MILLIS}, and no longer than it takes for the first to come.
     *
     * @return how many were filled in; 0 where none came in that time; −1 where the line is gone and is to be closed
     */
    int read(byte[] into);

    /** @throws IOException where not all could be written, which is so when the line is gone */
    void write(byte[] bytes, int length) throws IOException;

    /** Throws away what has come and was not read. */
    void discard();
}
