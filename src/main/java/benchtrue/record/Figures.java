package benchtrue.record;

import benchtrue.model.Interval;
import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;
import org.jspecify.annotations.Nullable;

/** Numbers as a page shows them. What is not known is a dash. */
public final class Figures {
    private static final String UNKNOWN = "-";

    private Figures() {}

    /** To so many significant digits, without an exponent from 1e-4 to 1e7. */
    public static String figure(double value, int digits) {
        if (Double.isNaN(value)) {
            return UNKNOWN;
        }
        if (Double.isInfinite(value)) {
            return value > 0 ? "inf" : "-inf";
        }
        if (value == 0) {
            return "0";
        }
        BigDecimal rounded = new BigDecimal(value).round(new MathContext(digits, RoundingMode.HALF_EVEN));
        int exponent = rounded.precision() - rounded.scale() - 1;
        if (exponent < -4 || exponent > 7) {
            return rounded.toString();
        }
        return rounded.toPlainString();
    }

    /** As the sheet gave it: all its digits and none more. */
    public static String exact(double value) {
        if (Double.isNaN(value) || Double.isInfinite(value)) {
            return figure(value, 1);
        }
        BigDecimal plain = new BigDecimal(Double.toString(value)).stripTrailingZeros();
        return plain.abs().compareTo(BigDecimal.valueOf(1e7)) < 0 && plain.scale() < 12
                ? plain.toPlainString()
                : plain.toString();
    }

    /** A time of the run to a tenth of a second. */
    public static String seconds(double time) {
        return Double.isFinite(time) ? BigDecimal.valueOf(time).setScale(1, RoundingMode.HALF_EVEN) + " s" : UNKNOWN;
    }

    /** {@code 11.2 … 11.4}, {@code at least 16}, {@code at most 0.02}; empty where there is none. */
    public static String limits(@Nullable Interval limits) {
        if (limits == null || (Double.isInfinite(limits.lower()) && Double.isInfinite(limits.upper()))) {
            return "";
        }
        if (Double.isInfinite(limits.upper())) {
            return "at least " + exact(limits.lower());
        }
        if (Double.isInfinite(limits.lower())) {
            return "at most " + exact(limits.upper());
        }
        return exact(limits.lower()) + " to " + exact(limits.upper());
    }
}
