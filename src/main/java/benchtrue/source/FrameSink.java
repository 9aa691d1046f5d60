package benchtrue.source;

/** Takes what a line was split into. */
interface FrameSink {
    /**
     * @param bytes from 0 with the mark of its start, if it has one; filled again afterwards
     * @param from first byte of the text
     * @param to behind its last byte
     * @param end behind the last byte of its end, at least {@code to}
     * @param firstByteNanos when its first byte was read, on the monotonic clock
     * @param cutShort whether it was longer than what is kept
     */
    void frame(byte[] bytes, int from, int to, int end, long firstByteNanos, boolean cutShort);
}
