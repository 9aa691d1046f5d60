package benchtrue.sheet;

import java.util.List;
import java.util.regex.Pattern;
import org.jspecify.annotations.Nullable;

/**
 * What a line of an instrument looks like, beyond its separator.
 *
 * @param fields what stands in the line, in its order: names of channels, {@link #IGNORED} for the rest; empty: the channels of
 *     the sheet
 * @param named whether fields are {@code name=value}, in any order
 * @param pattern whose groups are the fields; null: they stand between separators
 * @param framed whether a line stands between STX and ETX, else it ends with CR, LF or both
 * @param grouping whether numbers have a sign between thousands: the comma, or the point where the comma is the decimal mark
 * @param missing texts that stand where a value is missing
 * @param latin1 whether the text is in ISO 8859-1, else in UTF-8
 */
public record Dialect(
        List<String> fields,
        boolean named,
        @Nullable Pattern pattern,
        boolean framed,
        boolean grouping,
        List<String> missing,
        Checksum checksum,
        boolean latin1) {
    /** Stands for a field that is no channel. */
    public static final String IGNORED = "-";

    /** Fields between separators, in the order of the sheet. */
    public static final Dialect PLAIN =
            new Dialect(List.of(), false, null, false, false, List.of(), Checksum.NONE, false);

    public Dialect {
        fields = List.copyOf(fields);
        missing = List.copyOf(missing);
    }

    /** What proves that a line came as it was sent: hexadecimal digits at its end. */
    public enum Checksum {
        NONE("none", 0),
        /** Exclusive or of all between {@code $} or {@code !} and {@code *}, behind the {@code *} (NMEA 0183). */
        NMEA("nmea", 2),
        /** Exclusive or of all bytes before the digits. */
        XOR8("xor8", 2),
        /** Sum of all bytes before the digits, modulo 256. */
        SUM8("sum8", 2),
        /** CRC-16/MODBUS of all bytes before the digits. */
        CRC16_MODBUS("crc16-modbus", 4),
        /** CRC-16/IBM-3740, also called CCITT-FALSE: polynomial 1021, start FFFF. */
        CRC16_CCITT("crc16-ccitt", 4),
        /** CRC-32/ISO-HDLC. */
        CRC32("crc32", 8);

        private final String word;
        private final int digits;

        Checksum(String word, int digits) {
            this.word = word;
            this.digits = digits;
        }

        /** As sheets write it. */
        public String word() {
            return word;
        }

        /** How many hexadecimal digits it takes. */
        public int digits() {
            return digits;
        }
    }
}
