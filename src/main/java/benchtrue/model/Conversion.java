package benchtrue.model;

import java.math.BigDecimal;
import java.math.MathContext;

/**
 * From a value in one unit to the same value in another: (value + before)·factor + after, at most one of the two shifts not 0,
 * each constant correctly rounded once.
 */
public record Conversion(double before, double factor, double after) {
    /** More digits than any shift between temperature scales that is exact as a decimal. */
    private static final int EXACT_DIGITS = 15;

    private static final MathContext DIGITS = new MathContext(60);

    /** NaN stays NaN. */
    public double apply(double value) {
        return (value + before) * factor + after;
    }

    /** y = (x + a)·f − b is (x + (a − b/f))·f; where that shift is no short decimal, x·f + (a·f − b). */
    static Conversion of(BigDecimal factor, BigDecimal fromOffset, BigDecimal toOffset) {
        BigDecimal before =
                fromOffset.subtract(toOffset.divide(factor, DIGITS), DIGITS).stripTrailingZeros();
        if (before.precision() <= EXACT_DIGITS) {
            return new Conversion(before.doubleValue(), factor.doubleValue(), 0);
        }
        BigDecimal after = fromOffset.multiply(factor, DIGITS).subtract(toOffset);
        return new Conversion(0, factor.doubleValue(), after.doubleValue());
    }
}
