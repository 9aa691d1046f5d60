package benchtrue.source;

import benchtrue.sheet.LineSpec;

/** Splits the bytes of a line at their line ends: LF, CR or both. Holds one line of bounded length, whatever comes. */
final class Framer {
    /** Longest line that is kept, in bytes; the rest of a longer one is dropped up to its end. */
    static final int LONGEST = 1 << 16;

    private final byte[] held = new byte[LONGEST + 2];
    private int size;
    private long firstByte;
    private boolean cut;
    private boolean afterReturn;

    Framer(LineSpec spec) {}

    /** @param nanos when the bytes were read */
    void add(byte[] bytes, int from, int to, long nanos, FrameSink sink) {
        for (int i = from; i < to; i++) {
            byte b = bytes[i];
            if (afterReturn) {
                afterReturn = false;
                if (b == '\n') {
                    held[size] = b;
                    end(size - 1, size + 1, sink);
                    continue;
                }
                end(size - 1, size, sink);
            }
            if (size == 0) {
                firstByte = nanos;
            }
            if (b == '\n') {
                held[size] = b;
                end(size, size + 1, sink);
            } else if (b == '\r') {
                held[size++] = b;
                afterReturn = true;
            } else if (size < LONGEST) {
                held[size++] = b;
            } else {
                cut = true;
            }
        }
    }

    private void end(int to, int end, FrameSink sink) {
        sink.frame(held, 0, to, end, firstByte, cut);
        size = 0;
        cut = false;
    }
}
