package benchtrue.source;

import ch.randelshofer.fastdoubleparser.JavaDoubleParser;
import java.util.Arrays;

/** Decimal numbers in ASCII bytes, to the nearest double. */
final class Decimals {
    /** Stands for bytes that are no decimal number, or one that no double can hold. */
    static final double UNREADABLE = Double.POSITIVE_INFINITY;

    /** Integers below it are doubles. */
    private static final long EXACT = 1L << 53;

    /** Powers of ten that are doubles: a number below 2⁵³ times or by one of them is rounded just once (Clinger 1990). */
    private static final double[] POWERS = {
        1e0, 1e1, 1e2, 1e3, 1e4, 1e5, 1e6, 1e7, 1e8, 1e9, 1e10, 1e11, 1e12, 1e13, 1e14, 1e15, 1e16, 1e17, 1e18, 1e19,
        1e20, 1e21, 1e22
    };

    private static final int MOST_DIGITS = 18;

    private Decimals() {}

    /**
     * Reads {@code [+-] digits [point digits] [e [+-] digits]} between blanks.
     *
     * @param point the decimal mark
     * @return NaN where there is nothing but blanks, or {@code NaN} in any case; {@link #UNREADABLE}
     */
    static double parse(byte[] bytes, int from, int to, char point) {
        int start = from;
        int end = to;
        while (start < end && isBlank(bytes[start])) {
            start++;
        }
        while (end > start && isBlank(bytes[end - 1])) {
            end--;
        }
        return start == end ? Double.NaN : number(bytes, start, end, point);
    }

    private static double number(byte[] bytes, int start, int end, char point) {
        int at = isSign(bytes[start]) ? start + 1 : start;
        long digits = 0;
        int count = 0;
        int seen = 0;
        int scale = 0;
        boolean fraction = false;
        for (; at < end; at++) {
            int digit = bytes[at] - '0';
            if (digit >= 0 && digit <= 9) {
                digits = count < MOST_DIGITS ? 10 * digits + digit : digits;
                count += count > 0 || digit > 0 ? 1 : 0;
                scale -= fraction ? 1 : 0;
                seen++;
            } else if (bytes[at] == point && !fraction) {
                fraction = true;
            } else {
                break;
            }
        }
        if (seen == 0) {
            return isNan(bytes, start, end) ? Double.NaN : UNREADABLE;
        }
        if (at < end) {
            return isExponent(bytes, at, end) ? byLibrary(bytes, start, end, point) : UNREADABLE;
        }
        if (count > MOST_DIGITS || digits > EXACT || scale < 1 - POWERS.length) {
            return byLibrary(bytes, start, end, point);
        }
        double size = digits / POWERS[-scale];
        return bytes[start] == '-' ? -size : size;
    }

    private static boolean isExponent(byte[] bytes, int at, int end) {
        if (bytes[at] != 'e' && bytes[at] != 'E') {
            return false;
        }
        int first = at + 1 < end && isSign(bytes[at + 1]) ? at + 2 : at + 1;
        for (int i = first; i < end; i++) {
            if (bytes[i] < '0' || bytes[i] > '9') {
                return false;
            }
        }
        return first < end;
    }

    private static double byLibrary(byte[] bytes, int start, int end, char point) {
        try {
            if (point == '.') {
                return readable(JavaDoubleParser.parseDouble(bytes, start, end - start));
            }
            byte[] pointed = Arrays.copyOfRange(bytes, start, end);
            for (int i = 0; i < pointed.length; i++) {
                pointed[i] = pointed[i] == point ? (byte) '.' : pointed[i];
            }
            return readable(JavaDoubleParser.parseDouble(pointed));
        } catch (NumberFormatException e) {
            return UNREADABLE; // more digits or a larger exponent than the library takes
        }
    }

    private static double readable(double value) {
        return Double.isInfinite(value) ? UNREADABLE : value;
    }

    private static boolean isNan(byte[] bytes, int start, int end) {
        return end - start == 3
                && (bytes[start] | 0x20) == 'n'
                && (bytes[start + 1] | 0x20) == 'a'
                && (bytes[start + 2] | 0x20) == 'n';
    }

    static boolean isBlank(byte b) {
        return b == ' ' || b == '\t';
    }

    private static boolean isSign(byte b) {
        return b == '-' || b == '+';
    }
}
