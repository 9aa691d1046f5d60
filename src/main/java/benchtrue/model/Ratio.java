package benchtrue.model;

import java.util.Optional;

/** A fraction in lowest terms, denominator above 0: the exponent of a unit. Both parts stay below {@link #LARGEST}. */
record Ratio(long numerator, long denominator) {
    static final Ratio ZERO = new Ratio(0, 1);
    static final Ratio ONE = new Ratio(1, 1);

    /** Beyond any exponent that physics has; keeps all arithmetic on fractions exact. */
    static final long LARGEST = 1000;

    static Ratio of(long numerator, long denominator) {
        long divisor = gcd(Math.abs(numerator), Math.abs(denominator)) * Long.signum(denominator);
        return new Ratio(numerator / divisor, denominator / divisor);
    }

    /** The fraction with a denominator of at most 12 that the number is, to 1e-12; empty where there is none. */
    static Optional<Ratio> near(double number) {
        for (int denominator = 1; denominator <= 12; denominator++) {
            double numerator = Math.rint(number * denominator);
            if (Math.abs(numerator) < LARGEST && Math.abs(numerator / denominator - number) <= 1e-12) {
                return Optional.of(of((long) numerator, denominator));
            }
        }
        return Optional.empty();
    }

    Ratio plus(Ratio other) {
        return of(numerator * other.denominator + other.numerator * denominator, denominator * other.denominator);
    }

    Ratio times(Ratio other) {
        return of(numerator * other.numerator, denominator * other.denominator);
    }

    Ratio negated() {
        return new Ratio(-numerator, denominator);
    }

    boolean isTooLarge() {
        return Math.abs(numerator) >= LARGEST || denominator >= LARGEST;
    }

    /** {@code 2}, {@code -1} or {@code (1/2)}, as it stands after {@code ^}. */
    @Override
    public String toString() {
        return denominator == 1 ? Long.toString(numerator) : "(" + numerator + "/" + denominator + ")";
    }

    private static long gcd(long a, long b) {
        return b == 0 ? Math.max(a, 1) : gcd(b, a % b);
    }
}
