package benchtrue.source;

import java.nio.ByteBuffer;
import java.nio.charset.CharacterCodingException;
import java.nio.charset.StandardCharsets;

/** Bytes from outside as text that no terminal takes for commands: controls and what is not UTF-8 as {@code \xNN}. */
final class CellText {
    private static final int LONGEST = 40;

    private CellText() {}

    /** At most 40 bytes of it. */
    static String shown(byte[] bytes, int from, int to) {
        int end = Math.min(to, from + LONGEST);
        while (end < to && end > from && (bytes[end] & 0xC0) == 0x80) {
            end--;
        }
        StringBuilder text = new StringBuilder();
        for (int at = from; at < end; ) {
            int size = characterSize(bytes, at, end);
            if (size == 0) {
                text.append(String.format("\\x%02X", bytes[at++]));
            } else {
                text.append(new String(bytes, at, size, StandardCharsets.UTF_8));
                at += size;
            }
        }
        return end < to ? text + "…" : text.toString();
    }

    /** How many bytes the printable character takes; 0 where there is none. */
    private static int characterSize(byte[] bytes, int at, int end) {
        int first = bytes[at] & 0xFF;
        if (first < 0x80) {
            return first >= 0x20 && first != 0x7F ? 1 : 0;
        }
        int size = first >= 0xF0 ? 4 : first >= 0xE0 ? 3 : 2;
        if (first < 0xC2 || at + size > end) {
            return 0;
        }
        try {
            String character = StandardCharsets.UTF_8
                    .newDecoder()
                    .decode(ByteBuffer.wrap(bytes, at, size))
                    .toString();
            return Character.isISOControl(character.codePointAt(0)) ? 0 : size;
        } catch (CharacterCodingException e) {
            return 0; // not UTF-8: shown byte by byte
        }
    }
}
