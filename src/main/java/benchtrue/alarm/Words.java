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

    /** The unit with a blank before it; nothing for a plain number. */
    static String unit(String symbol) {
        return symbol.isEmpty() ? "" : " " + symbol;
    }
}
