package benchtrue.source;

import java.io.Closeable;
import java.io.IOException;
import java.io.InputStream;
import java.util.Arrays;

/**
 * Splits bytes into rows of cells (RFC 4180: comma, double quotes, line breaks within quotes; LF, CR and CRLF end a row). Empty
 * lines are passed over. A row that cannot be split costs only its first line: a quote that is never closed does not swallow
 * the rest of the file. Holds one buffer, in which a row lies whole; allocates nothing for each row.
 */
final class CsvRows implements Closeable {
    /** Longest row in bytes; 10 000 columns of 100 characters fit. */
    static final int LONGEST = 1 << 20;

    enum Kind {
        ROW,
        /** Longer than {@link #LONGEST}: passed over up to the next line break. */
        TOO_LONG,
        /** A quote that is not closed, or text behind a closing quote. */
        BADLY_QUOTED,
        END
    }

    private static final int INCOMPLETE = -1;
    private static final int BADLY_QUOTED = -2;

    private final InputStream in;
    private byte[] buffer = new byte[LONGEST];
    private int[] starts = new int[16];
    private int[] ends = new int[16];
    private int cells;
    private int from;
    private int next;
    private int filled;
    private boolean atEnd;
    private long line = 1;
    private long nextLine = 1;
    private long passed;

    /** Skips a byte order mark. */
    CsvRows(InputStream in) throws IOException {
        this.in = in;
        while (filled < 3 && !atEnd) {
            fill();
        }
        boolean mark = filled >= 3 && buffer[0] == (byte) 0xEF && buffer[1] == (byte) 0xBB && buffer[2] == (byte) 0xBF;
        next = mark ? 3 : 0;
    }

    /** Goes to the next row; the cells of the one before are gone. */
    Kind next() throws IOException {
        while (true) {
            from = next;
            line = nextLine;
            if (from == filled && !more()) {
                return Kind.END;
            }
            int end = scan();
            if (end == INCOMPLETE) {
                if (more()) {
                    continue;
                }
                toNextLine();
                return Kind.TOO_LONG;
            }
            if (end == BADLY_QUOTED) {
                toNextLine();
                return Kind.BADLY_QUOTED;
            }
            if (cells > 1 || starts[0] < ends[0]) {
                return Kind.ROW;
            }
        }
    }

    /** Finds the cells of the row at {@code from}, and where the row after it begins. */
    private int scan() {
        cells = 0;
        int at = from;
        while (true) {
            boolean quoted = at < filled && buffer[at] == '"';
            int end = quoted ? endOfQuoted(at + 1) : endOfPlain(at);
            if (end < 0) {
                return end;
            }
            add(quoted ? at + 1 : at, end);
            at = quoted ? end + 1 : end;
            if (at == filled || buffer[at] != ',') {
                return endRow(at);
            }
            at++;
        }
    }

    private int endOfPlain(int from) {
        byte[] bytes = buffer;
        int stop = filled;
        for (int at = from; at < stop; at++) {
            byte b = bytes[at];
            if (b == ',' || b == '\n' || b == '\r') {
                return at;
            }
        }
        return atEnd ? stop : INCOMPLETE;
    }

    private int endOfQuoted(int from) {
        for (int at = from; at < filled; at++) {
            if (buffer[at] == '\n') {
                nextLine++;
            } else if (buffer[at] == '"') {
                if (at + 1 == filled) {
                    return atEnd ? at : INCOMPLETE;
                }
                byte behind = buffer[at + 1];
                if (behind != '"') {
                    return behind == ',' || behind == '\n' || behind == '\r' ? at : BADLY_QUOTED;
                }
                at++;
            }
        }
        return atEnd || isFull() ? BADLY_QUOTED : INCOMPLETE;
    }

    private int endRow(int at) {
        int after = at;
        if (at < filled) {
            after = at + 1;
            if (buffer[at] == '\r') {
                if (after == filled && !atEnd) {
                    return INCOMPLETE;
                }
                after += after < filled && buffer[after] == '\n' ? 1 : 0;
            }
            nextLine++;
        }
        next = after;
        return at;
    }

    private void add(int start, int end) {
        if (cells == starts.length) {
            starts = Arrays.copyOf(starts, 2 * cells);
            ends = Arrays.copyOf(ends, 2 * cells);
        }
        starts[cells] = start;
        ends[cells++] = end;
    }

    /** Reads on; the row begins over, at the front of the buffer. False where there is no more, or the buffer is full. */
    private boolean more() throws IOException {
        nextLine = line;
        if (atEnd || isFull()) {
            return false;
        }
        System.arraycopy(buffer, from, buffer, 0, filled - from);
        passed += from;
        filled -= from;
        from = 0;
        next = 0;
        fill();
        return filled > 0 || !atEnd;
    }

    private boolean isFull() {
        return from == 0 && filled == buffer.length;
    }

    private void fill() throws IOException {
        int count = in.read(buffer, filled, buffer.length - filled);
        atEnd = count < 0;
        filled += Math.max(0, count);
    }

    private void toNextLine() throws IOException {
        while (!passLine() && !atEnd) {
            passed += filled;
            filled = 0;
            from = 0;
            fill();
        }
    }

    /** Goes behind the first line break at or after {@code from}; false where there is none in the buffer. */
    private boolean passLine() {
        nextLine = line + 1;
        for (int at = from; at < filled; at++) {
            if (buffer[at] == '\n' || (buffer[at] == '\r' && at + 1 < filled && buffer[at + 1] != '\n')) {
                next = at + 1;
                return true;
            }
        }
        next = filled;
        return false;
    }

    /** The line on which the row begins, from 1. */
    long line() {
        return line;
    }

    int cells() {
        return cells;
    }

    /** Holds the cells of the row; not to be changed. */
    byte[] bytes() {
        return buffer;
    }

    /** Where the cell begins, behind its quote if it has one. */
    int start(int cell) {
        return starts[cell];
    }

    int end(int cell) {
        return ends[cell];
    }

    boolean isQuoted(int cell) {
        return starts[cell] > from && buffer[starts[cell] - 1] == '"';
    }

    /** Whether nothing follows the row. */
    boolean isLast() throws IOException {
        return next == filled && (atEnd || !moreBehind());
    }

    private boolean moreBehind() throws IOException {
        while (next == filled && !atEnd && filled < buffer.length) {
            fill();
        }
        return next < filled;
    }

    /** Bytes up to the end of the row. */
    long consumed() {
        return passed + next;
    }

    @Override
    public void close() throws IOException {
        in.close();
    }
}
