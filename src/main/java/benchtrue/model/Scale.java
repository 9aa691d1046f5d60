package benchtrue.model;

import java.math.BigDecimal;
import java.math.BigInteger;
import java.math.MathContext;
import java.util.Map;

/**
 * The factor of a unit as an exact product of powers of primes and of π. Factors of any two units divide exactly, so that a
 * conversion is one correctly rounded double: L/min to cm³/min is 1000, not 1000 ± an ulp.
 */
final class Scale {
    /** Stands for π among the primes. */
    static final Long PI = 0L;

    /** Trial division finds every prime of a number below this in a few milliseconds. */
    static final BigInteger LARGEST_INTEGER = BigInteger.TEN.pow(13);

    private static final MathContext DIGITS = new MathContext(60);

    /** OEIS A000796, to more digits than {@link #DIGITS}. */
    private static final BigDecimal PI_DIGITS =
            new BigDecimal("3.14159265358979323846264338327950288419716939937510582097494459230781640628620899");

    private Scale() {}

    /** @param number above 0, its digits without the power of ten below {@link #LARGEST_INTEGER} */
    static Powers<Long> of(BigDecimal number) {
        BigDecimal shortest = number.stripTrailingZeros();
        return tenTo(-shortest.scale()).times(factorize(shortest.unscaledValue().longValueExact()));
    }

    static Powers<Long> tenTo(int exponent) {
        return Powers.<Long>none().with(2L, Ratio.of(exponent, 1)).with(5L, Ratio.of(exponent, 1));
    }

    private static Powers<Long> factorize(long number) {
        Powers<Long> primes = Powers.none();
        long rest = number;
        for (long prime = 2; prime * prime <= rest; prime++) {
            while (rest % prime == 0) {
                primes = primes.with(prime, Ratio.ONE);
                rest /= prime;
            }
        }
        return rest == 1 ? primes : primes.with(rest, Ratio.ONE);
    }

    /** To {@link #DIGITS} digits. */
    static BigDecimal value(Powers<Long> scale) {
        long root = 1;
        for (Ratio exponent : scale.exponents().values()) {
            root = root
                    / BigInteger.valueOf(root)
                            .gcd(BigInteger.valueOf(exponent.denominator()))
                            .longValue()
                    * exponent.denominator();
        }
        return root(radicand(scale, root), root);
    }

    /** scaleʳᵒᵒᵗ, whose exponents are all whole; numerator and denominator are exact before the one division. */
    private static BigDecimal radicand(Powers<Long> scale, long root) {
        BigDecimal numerator = BigDecimal.ONE;
        BigDecimal denominator = BigDecimal.ONE;
        for (Map.Entry<Long, Ratio> factor : scale.exponents().entrySet()) {
            int exponent = Math.toIntExact(
                    factor.getValue().numerator() * (root / factor.getValue().denominator()));
            BigDecimal base = factor.getKey().equals(PI) ? PI_DIGITS : BigDecimal.valueOf(factor.getKey());
            if (exponent > 0) {
                numerator = numerator.multiply(base.pow(exponent));
            } else {
                denominator = denominator.multiply(base.pow(-exponent));
            }
        }
        return numerator.divide(denominator, DIGITS);
    }

    /** Newton's method for yʳᵒᵒᵗ = x, from a double: each step doubles the digits. */
    private static BigDecimal root(BigDecimal x, long root) {
        if (root == 1) {
            return x;
        }
        int r = Math.toIntExact(root);
        BigDecimal y = new BigDecimal(Math.pow(x.doubleValue(), 1.0 / r));
        for (int step = 0; step < 4; step++) {
            BigDecimal excess = y.pow(r, DIGITS).subtract(x, DIGITS);
            y = y.subtract(excess.divide(y.pow(r - 1, DIGITS).multiply(BigDecimal.valueOf(r)), DIGITS), DIGITS);
        }
        return y;
    }
}
