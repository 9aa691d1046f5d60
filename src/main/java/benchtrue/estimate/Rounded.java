package benchtrue.estimate;

import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;

/**
 * A value and its expanded uncertainty rounded together (GUM, JCGM 100:2008, 7.2.6): U to two significant digits, upwards
 * unless what is dropped is at most a twentieth of the last digit (10.47 becomes 11, 28.05 becomes 28), the value to the same
 * place.
 *
 * @param exponent of ten that both are to be multiplied by; 0 where they are written out
 */
public record Rounded(String value, String uncertainty, int exponent) {
    private static final BigDecimal NEGLIGIBLE = new BigDecimal("0.05");
    private static final int SMALLEST_PLAIN = -6;
    private static final int LARGEST_PLAIN = 7;
    private static final String UNKNOWN = "-";
    private static final int DIGITS_WITHOUT_U = 6;

    /** Where U is not known, or 0, the value has six significant digits. */
    public static Rounded of(double value, double expanded) {
        if (!Double.isFinite(value)) {
            return new Rounded(UNKNOWN, UNKNOWN, 0);
        }
        if (!(expanded > 0) || Double.isInfinite(expanded)) {
            return withoutUncertainty(value, expanded);
        }
        BigDecimal u = uncertainty(expanded);
        BigDecimal v = new BigDecimal(value).setScale(u.scale(), RoundingMode.HALF_EVEN);
        int exponent = exponent(v.abs().max(u));
        return new Rounded(text(v, exponent), text(u, exponent), exponent);
    }

    private static Rounded withoutUncertainty(double value, double expanded) {
        BigDecimal v = new BigDecimal(value).round(new MathContext(DIGITS_WITHOUT_U, RoundingMode.HALF_EVEN));
        int exponent = v.signum() == 0 ? 0 : exponent(v.abs());
        return new Rounded(text(v, exponent), expanded == 0 ? "0" : UNKNOWN, exponent);
    }

    /** Two significant digits, upwards. */
    static BigDecimal uncertainty(double expanded) {
        // As it is written: 28.05 is no double, and what is above it in binary must not round it up.
        BigDecimal exact = new BigDecimal(Double.toString(expanded));
        int scale = exact.scale() - exact.precision() + 2;
        BigDecimal digits = exact.movePointRight(scale);
        BigDecimal up = digits.subtract(NEGLIGIBLE).setScale(0, RoundingMode.CEILING);
        return up.movePointLeft(scale).setScale(up.precision() > 2 ? scale - 1 : scale, RoundingMode.UNNECESSARY);
    }

    private static int exponent(BigDecimal size) {
        int exponent = size.precision() - size.scale() - 1;
        return exponent < SMALLEST_PLAIN || exponent > LARGEST_PLAIN ? exponent : 0;
    }

    private static String text(BigDecimal number, int exponent) {
        BigDecimal shifted = number.movePointLeft(exponent);
        // A place left of the point is written with zeros: 11300 ± 120.
        return shifted.toPlainString();
    }

    /** {@code 11.3031 ± 0.0072}, {@code (1.204 ± 0.011)e-9}. */
    public String text() {
        String both = value + " ± " + uncertainty;
        return exponent == 0 ? both : "(" + both + ")e" + exponent;
    }
}
