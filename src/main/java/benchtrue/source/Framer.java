package benchtrue.source;

import benchtrue.sheet.LineSpec;

/**
 * Splits the bytes of a line at their line ends, CR, LF or both, or into what stands between STX and ETX. Holds one line of
 * bounded length, whatever comes.
 */
final class Framer {
    /** Longest line that is kept, in bytes; the rest of a longer one is dropped up to its end. */
    static final int LONGEST = 1 << 16;

    private static final byte STX = 2;
    private static final byte ETX = 3;

    private final boolean framed;
    private final byte[] held = new byte[LONGEST + 2];
    private int size;
    private long firstByte;
    private boolean cut;
    private boolean afterReturn;
    private boolean inFrame;

    Framer(LineSpec spec) {
        framed = spec.dialect().framed();
    }

    /** @param nanos when the bytes were read */
    void add(byte[] bytes, int from, int to, long nanos, FrameSink sink) {
        for (int i = from; i < to; i++) {
            if (framed) {
                addFramed(bytes[i], nanos, sink);
            } else {
                addPlain(bytes[i], nanos, sink);
            }
        }
    }

    private void addPlain(byte b, long nanos, FrameSink sink) {
        if (afterReturn) {
            afterReturn = false;
            if (b == '\n') {
                held[size] = b;
                end(0, size - 1, size + 1, sink);
                return;
            }
            end(0, size - 1, size, sink);
        }
        if (size == 0) {
            firstByte = nanos;
        }
        if (b == '\n') {
            held[size] = b;
            end(0, size, size + 1, sink);
        } else if (b == '\r') {
            held[size++] = b;
            afterReturn = true;
        } else {
            hold(b);
        }
    }

    private void addFramed(byte b, long nanos, FrameSink sink) {
        if (b == STX) {
            size = 0;
            cut = false;
            inFrame = true;
            firstByte = nanos;
            hold(b);
        } else if (inFrame && b == ETX) {
            held[size] = b;
            inFrame = false;
            end(1, size, size + 1, sink);
        } else if (inFrame) {
            hold(b);
        }
    }

    private void hold(byte b) {
        if (size < LONGEST) {
            held[size++] = b;
        } else {
            cut = true;
        }
    }

    private void end(int from, int to, int end, FrameSink sink) {
        sink.frame(held, from, to, end, firstByte, cut);
        size = 0;
        cut = false;
    }
}
