package benchtrue.run;

import java.util.Locale;

/** Run time as people write it. */
public final class ClockText {
    private ClockText() {}

    /** {@code 380.2 s}; a day and more with its hours beside: {@code 93784.0 s (26 h 3 min)}. */
    public static String of(double seconds) {
        if (Double.isNaN(seconds)) {
            return "-";
        }
        String plain = String.format(Locale.ROOT, "%.1f s", seconds);
        if (Math.abs(seconds) < 3600) {
            return plain;
        }
        long minutes = Math.round(seconds / 60);
        return plain + String.format(Locale.ROOT, " (%d h %02d min)", minutes / 60, minutes % 60);
    }
}
