package benchtrue.source;

import java.math.BigDecimal;
import java.math.RoundingMode;
import java.nio.charset.StandardCharsets;
import java.time.DateTimeException;
import java.time.LocalDate;

/**
 * Times of readings.csv, to the nanosecond: as whole numbers, so that nothing is lost before the first is subtracted. Holds
 * 292 years around 0 (1970 where the time is a date).
 */
final class TimeCells {
    /** Stands for bytes that are no time. */
    static final long UNREADABLE = Long.MIN_VALUE;

    private static final int NANO_DIGITS = 9;
    private static final long NANOS = 1_000_000_000L;
    private static final long SECONDS_PER_DAY = 86_400;
    private static final int MOST_DIGITS = 18;
    private static final int LONGEST_CELL = 100;
    private static final long[] POWERS = new long[MOST_DIGITS + 1];

    static {
        POWERS[0] = 1;
        for (int i = 1; i < POWERS.length; i++) {
            POWERS[i] = 10 * POWERS[i - 1];
        }
    }

    private final int decimals;
    private int date = -1;
    private long epochDay;

    /** @param decimals by how many digits the unit of decimal times is smaller than a second: 0 for s, 3 for ms */
    TimeCells(int decimals) {
        this.decimals = decimals;
    }

    /** Whether the cell begins as a date does, 2027-…. */
    static boolean isDated(byte[] bytes, int from, int to) {
        return to - from > 4 && bytes[from + 4] == '-' && number(bytes, from, from + 4) >= 0;
    }

    /** A decimal number in the unit of the column, without exponent. */
    long decimal(byte[] bytes, int from, int to, char point) {
        boolean negative = from < to && bytes[from] == '-';
        int at = from < to && (negative || bytes[from] == '+') ? from + 1 : from;
        int first = at;
        long digits = 0;
        int mark = -1;
        for (; at < to; at++) {
            if (bytes[at] == point && mark < 0) {
                mark = at;
            } else if (bytes[at] >= '0' && bytes[at] <= '9') {
                digits = 10 * digits + (bytes[at] - '0');
            } else {
                return UNREADABLE;
            }
        }
        int count = to - first - (mark < 0 ? 0 : 1);
        int shift = NANO_DIGITS - decimals - (mark < 0 ? 0 : to - mark - 1);
        if (count == 0 || to - from > LONGEST_CELL) {
            return UNREADABLE;
        }
        long nanos = count <= MOST_DIGITS ? scaled(digits, shift) : exactly(bytes, first, to, point);
        return negative && nanos != UNREADABLE ? -nanos : nanos;
    }

    /** digits·10^shift, halves upward. */
    private static long scaled(long digits, int shift) {
        if (digits == 0 || shift < -MOST_DIGITS) {
            return 0;
        }
        if (shift >= 0) {
            boolean fits = shift <= MOST_DIGITS && digits <= Long.MAX_VALUE / POWERS[shift];
            return fits ? digits * POWERS[shift] : UNREADABLE;
        }
        long unit = POWERS[-shift];
        long rest = digits % unit;
        return digits / unit + (rest >= unit - rest ? 1 : 0);
    }

    private long exactly(byte[] bytes, int from, int to, char point) {
        String text = new String(bytes, from, to - from, StandardCharsets.US_ASCII).replace(point, '.');
        BigDecimal nanos =
                new BigDecimal(text).scaleByPowerOfTen(NANO_DIGITS - decimals).setScale(0, RoundingMode.HALF_UP);
        return nanos.compareTo(BigDecimal.valueOf(Long.MAX_VALUE)) > 0 ? UNREADABLE : nanos.longValue();
    }

    /**
     * ISO 8601 date and time of day, {@code 2027-03-01T09:30:00.125Z}: seconds may be left out, a blank may stand for the T, an
     * offset such as +01:00 for the Z; without either the time is UTC.
     *
     * @return nanoseconds since 1970-01-01T00:00Z
     */
    long dated(byte[] bytes, int from, int to) {
        if (to - from < 16 || bytes[from + 7] != '-' || bytes[from + 13] != ':') {
            return UNREADABLE;
        }
        byte separator = bytes[from + 10];
        int hour = number(bytes, from + 11, from + 13);
        int minute = number(bytes, from + 14, from + 16);
        boolean hasDay = (separator == 'T' || separator == 't' || separator == ' ') && toDay(bytes, from);
        if (!hasDay || hour < 0 || hour > 24 || minute < 0 || minute > 59) {
            return UNREADABLE;
        }
        long seconds = epochDay * SECONDS_PER_DAY + hour * 3600L + minute * 60L;
        int zone = zone(bytes, from + 16, to);
        long fraction = zone == from + 16 ? 0 : secondOfMinute(bytes, from + 16, zone);
        long offset = offset(bytes, zone, to);
        if (fraction == UNREADABLE
                || offset == UNREADABLE
                || Math.abs(seconds) > Long.MAX_VALUE / NANOS - 2 * SECONDS_PER_DAY) {
            return UNREADABLE;
        }
        return (seconds - offset) * NANOS + fraction;
    }

    /** Days are looked up once: the readings of a run are of few days. */
    private boolean toDay(byte[] bytes, int from) {
        int year = number(bytes, from, from + 4);
        int month = number(bytes, from + 5, from + 7);
        int day = number(bytes, from + 8, from + 10);
        int wanted = year < 0 || month < 0 || day < 0 ? -1 : (year * 100 + month) * 100 + day;
        if (wanted != date && wanted >= 0) {
            try {
                epochDay = LocalDate.of(year, month, day).toEpochDay();
                date = wanted;
            } catch (DateTimeException e) {
                return false; // no such day
            }
        }
        return wanted >= 0;
    }

    private static int zone(byte[] bytes, int from, int to) {
        int at = from;
        while (at < to && bytes[at] != 'Z' && bytes[at] != 'z' && bytes[at] != '+' && bytes[at] != '-') {
            at++;
        }
        return at;
    }

    /** {@code :SS} with decimals, as nanoseconds; a leap second is the first of the next minute. */
    private static long secondOfMinute(byte[] bytes, int from, int to) {
        int second = to - from < 3 || bytes[from] != ':' ? -1 : number(bytes, from + 1, from + 3);
        if (second < 0 || second > 60) {
            return UNREADABLE;
        }
        if (to - from == 3) {
            return second * NANOS;
        }
        int digits = Math.min(to - from - 4, NANO_DIGITS);
        int fraction = number(bytes, from + 4, from + 4 + digits);
        int rest = from + 4 + digits == to ? 0 : number(bytes, from + 4 + digits, to);
        boolean marked = bytes[from + 3] == '.' || bytes[from + 3] == ',';
        return marked && fraction >= 0 && rest >= 0
                ? second * NANOS + fraction * POWERS[NANO_DIGITS - digits]
                : UNREADABLE;
    }

    /** Seconds that the zone is ahead of UTC. */
    private static long offset(byte[] bytes, int from, int to) {
        if (from == to || ((bytes[from] == 'Z' || bytes[from] == 'z') && from + 1 == to)) {
            return 0;
        }
        int size = to - from;
        boolean colon = size == 6 && bytes[from + 3] == ':';
        int hours = size >= 3 ? number(bytes, from + 1, from + 3) : -1;
        int minutes = size == 3 ? 0 : size == 5 || colon ? number(bytes, to - 2, to) : -1;
        if (hours < 0 || hours > 18 || minutes < 0 || minutes > 59) {
            return UNREADABLE;
        }
        return (bytes[from] == '-' ? -1 : 1) * (hours * 3600L + minutes * 60L);
    }

    /** A number of digits that fits, else some number; −1 where there are none or something else is among them. */
    private static int number(byte[] bytes, int from, int to) {
        int value = from < to ? 0 : -1;
        for (int at = from; at < to; at++) {
            if (bytes[at] < '0' || bytes[at] > '9') {
                return -1;
            }
            value = 10 * value + (bytes[at] - '0');
        }
        return value & Integer.MAX_VALUE;
    }
}
