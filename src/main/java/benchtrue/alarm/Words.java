package benchtrue.alarm;

import java.math.BigDecimal;
import java.math.MathContext;
import java.util.Locale;

/** Numbers in sentences. */
final class Words {
    private Words() {}

    /** Five significant digits, plain where that is short. */
    static String number(double value) {
        if (!(Math.abs(value) <= Double.MAX_VALUE)) {
            return Double.isNaN(value) ? "not known" : value > 0 ? "inf" : "-inf";
        }
        double size = Math.abs(value);
        if (size != 0 && (size < 1e-4 || size >= 1e7)) {
            return String.format(Locale.ROOT, "%.4g", value);
        }
        return new BigDecimal(value, new MathContext(5))
                .add(BigDecimal.ZERO)
                .stripTrailingZeros()
                .toPlainString();
    }

    /** A value with its sign and ± U, both to the second significant digit of U (GUM 7.2.6). */
    static String measured(double value, double expanded) {
        if (!(expanded > 0) || !(Math.abs(value) <= Double.MAX_VALUE)) {
            return number(value);
        }
        int places = Math.min(12, 1 - (int) Math.floor(Math.log10(expanded)));
        return places < 0
                ? number(value) + " ± " + number(expanded)
                : String.format(Locale.ROOT, "%+." + places + "f ± %." + places + "f", value, expanded);
    }

    /** The unit with a blank before it; nothing for a plain number. */
    static String unit(String symbol) {
        return symbol.isEmpty() ? "" : " " + symbol;
    }
}
