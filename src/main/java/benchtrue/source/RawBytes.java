package benchtrue.source;

import java.io.ByteArrayOutputStream;
import java.nio.ByteBuffer;
import java.nio.charset.CharacterCodingException;
import java.nio.charset.CharsetDecoder;
import java.nio.charset.CodingErrorAction;
import java.nio.charset.StandardCharsets;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** Bytes of a line as raw.log writes them: controls, backslashes and what is not UTF-8 as {@code \xNN}. */
public final class RawBytes {
    private static final Pattern ESCAPE = Pattern.compile("\\\\x([0-9A-Fa-f]{2})");

    private RawBytes() {}

    public static String text(byte[] bytes) {
        StringBuilder text = new StringBuilder(bytes.length + 8);
        for (int at = 0; at < bytes.length; ) {
            int size = size(bytes, at);
            if (size == 0) {
                text.append(String.format("\\x%02X", bytes[at++]));
            } else {
                text.append(new String(bytes, at, size, StandardCharsets.UTF_8));
                at += size;
            }
        }
        return text.toString();
    }

    /** How many bytes the printable character takes; 0 where there is none. */
    private static int size(byte[] bytes, int at) {
        int first = bytes[at] & 0xFF;
        if (first < 0x80) {
            return first >= 0x20 && first != 0x7F && first != '\\' ? 1 : 0;
        }
        int size = first >= 0xF0 ? 4 : first >= 0xE0 ? 3 : 2;
        if (first < 0xC2 || at + size > bytes.length) {
            return 0;
        }
        CharsetDecoder decoder = StandardCharsets.UTF_8
                .newDecoder()
                .onMalformedInput(CodingErrorAction.REPORT)
                .onUnmappableCharacter(CodingErrorAction.REPORT);
        try {
            int point =
                    decoder.decode(ByteBuffer.wrap(bytes, at, size)).toString().codePointAt(0);
            return Character.isISOControl(point) ? 0 : size;
        } catch (CharacterCodingException e) {
            return 0; // not UTF-8: written byte by byte
        }
    }

    /** The bytes that such a text stands for. */
    public static byte[] of(String text) {
        ByteArrayOutputStream bytes = new ByteArrayOutputStream();
        Matcher escape = ESCAPE.matcher(text);
        int from = 0;
        while (escape.find()) {
            bytes.writeBytes(text.substring(from, escape.start()).getBytes(StandardCharsets.UTF_8));
            bytes.write(Integer.parseInt(escape.group(1), 16));
            from = escape.end();
        }
        bytes.writeBytes(text.substring(from).getBytes(StandardCharsets.UTF_8));
        return bytes.toByteArray();
    }
}
