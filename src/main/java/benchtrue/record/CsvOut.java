package benchtrue.record;

import com.fasterxml.jackson.core.io.NumberOutput;
import java.io.Closeable;
import java.nio.charset.StandardCharsets;
import org.jspecify.annotations.Nullable;

/**
 * Rows after RFC 4180 in UTF-8, ended by a line feed. Numbers are written as the shortest text that reads back as the same
 * double, by a printer that is the same on every Java release; what is not finite is an empty cell.
 */
final class CsvOut implements Closeable {
    /** The longest number takes 24 characters. */
    private static final int ROOM = 32;

    private final GrowingFile file;
    private final byte[] buffer = new byte[1 << 16];
    private int size;
    private boolean rowBegun;

    CsvOut(GrowingFile file) {
        this.file = file;
    }

    CsvOut number(double value) {
        comma();
        if (Double.isFinite(value)) {
            ascii(NumberOutput.toString(value, true));
        }
        return this;
    }

    CsvOut whole(long value) {
        comma();
        size = NumberOutput.outputLong(value, buffer, size);
        return this;
    }

    /** Null is an empty cell. */
    CsvOut text(@Nullable String text) {
        comma();
        if (text != null) {
            byte[] bytes = quoted(text).getBytes(StandardCharsets.UTF_8);
            for (byte b : bytes) {
                makeRoom();
                buffer[size++] = b;
            }
        }
        return this;
    }

    void endRow() {
        makeRoom();
        buffer[size++] = '\n';
        rowBegun = false;
    }

    /** Hands all finished rows to the file. */
    void flush() {
        file.write(buffer, size);
        size = 0;
    }

    @Override
    public void close() {
        flush();
        file.close();
    }

    private void comma() {
        makeRoom();
        if (rowBegun) {
            buffer[size++] = ',';
        }
        rowBegun = true;
    }

    private void ascii(String text) {
        for (int i = 0; i < text.length(); i++) {
            buffer[size++] = (byte) text.charAt(i);
        }
    }

    private void makeRoom() {
        if (size > buffer.length - ROOM) {
            flush();
        }
    }

    private static String quoted(String text) {
        for (int i = 0; i < text.length(); i++) {
            char c = text.charAt(i);
            if (c == ',' || c == '"' || c == '\r' || c == '\n') {
                return '"' + text.replace("\"", "\"\"") + '"';
            }
        }
        return text;
    }
}
