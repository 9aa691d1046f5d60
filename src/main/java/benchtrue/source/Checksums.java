package benchtrue.source;

import benchtrue.sheet.Dialect.Checksum;
import java.util.Arrays;
import java.util.zip.CRC32;

/** The hexadecimal digits with which an instrument proves its lines. */
final class Checksums {
    private static final int CCITT = 0x1021;

    private Checksums() {}

    /** Where the digits begin at the end of the line; −1 where there are none. */
    static int digitsFrom(Checksum kind, byte[] bytes, int from, int to) {
        int start = to - kind.digits();
        if (start <= from) {
            return -1;
        }
        for (int i = start; i < to; i++) {
            if (Character.digit(bytes[i], 16) < 0) {
                return -1;
            }
        }
        return kind == Checksum.NMEA && bytes[start - 1] != '*' ? -1 : start;
    }

    static long said(byte[] bytes, int from, int to) {
        long value = 0;
        for (int i = from; i < to; i++) {
            value = 16 * value + Character.digit(bytes[i], 16);
        }
        return value;
    }

    /**
     * What the digits must say.
     *
     * @param to where they begin
     */
    static long of(Checksum kind, byte[] bytes, int from, int to) {
        return switch (kind) {
            case NONE -> 0;
            case NMEA -> xor(bytes, from + 1, to - 1);
            case XOR8 -> xor(bytes, from, to);
            case SUM8 -> sum(bytes, from, to);
            case CRC16_MODBUS -> Crc16.of(Arrays.copyOfRange(bytes, from, to), to - from);
            case CRC16_CCITT -> ccitt(bytes, from, to);
            case CRC32 -> crc32(bytes, from, to);
        };
    }

    private static int xor(byte[] bytes, int from, int to) {
        int xor = 0;
        for (int i = from; i < to; i++) {
            xor ^= bytes[i] & 0xFF;
        }
        return xor;
    }

    private static int sum(byte[] bytes, int from, int to) {
        int sum = 0;
        for (int i = from; i < to; i++) {
            sum += bytes[i] & 0xFF;
        }
        return sum & 0xFF;
    }

    private static int ccitt(byte[] bytes, int from, int to) {
        int crc = 0xFFFF;
        for (int i = from; i < to; i++) {
            crc ^= (bytes[i] & 0xFF) << 8;
            for (int bit = 0; bit < Byte.SIZE; bit++) {
                crc = (crc & 0x8000) == 0 ? crc << 1 : (crc << 1) ^ CCITT;
            }
        }
        return crc & 0xFFFF;
    }

    private static long crc32(byte[] bytes, int from, int to) {
        CRC32 crc = new CRC32();
        crc.update(bytes, from, to - from);
        return crc.getValue();
    }
}
