package benchtrue.model;

import java.math.BigDecimal;
import java.util.Map;
import java.util.stream.Collectors;

/**
 * A unit of measurement. Immutable; equal where it means the same, whatever its symbol: {@code N*m} equals {@code J}.
 *
 * <p>A plain number, a radian and a steradian fit each other, as the SI Brochure has it (9th ed., 2.3.3). A revolution is a
 * count of its own: {@code rev/min} fits {@code rev/s}, but neither {@code Hz} nor {@code rad/s}. Only an explicit conversion,
 * as of a column of the readings, takes 1 rev for 2π rad.
 */
public final class Unit {
    /** The unit of a plain number. */
    public static final Unit ONE = new Unit("", Powers.none(), Powers.none(), Powers.none(), BigDecimal.ZERO);

    private static final String ANGLE = "rad";
    private static final String COUNT = "rev";

    private final String symbol;
    /** The units that the symbol is made of; units that cancel in a computed one cancel here. */
    private final Powers<String> parts;
    /** In the SI base units, rev and rad. */
    private final Powers<String> dimension;
    /** How many coherent SI units it is. */
    private final Powers<Long> scale;
    /** What a temperature in this unit lacks to absolute zero, in this unit; 0 for all others and for differences. */
    private final BigDecimal offset;

    private Unit(String symbol, Powers<String> parts, Powers<String> dimension, Powers<Long> scale, BigDecimal offset) {
        this.symbol = symbol;
        this.parts = parts;
        this.dimension = dimension;
        this.scale = scale;
        this.offset = offset;
    }

    /** Reads a unit; an empty or blank text is the plain number. */
    public static Parsed<Unit> parse(String text) {
        return UnitParser.parse(text);
    }

    static Unit base(String symbol) {
        return new Unit(symbol, Powers.of(symbol), Powers.of(symbol), Powers.none(), BigDecimal.ZERO);
    }

    /** A plain number as a factor of a unit. */
    static Unit number(String symbol, Powers<Long> scale) {
        Powers<String> parts = scale.isEmpty() ? Powers.none() : Powers.of(symbol);
        return new Unit(symbol, parts, Powers.none(), scale, BigDecimal.ZERO);
    }

    /** The same meaning under a name of its own. */
    Unit named(String name) {
        return new Unit(name, Powers.of(name), dimension, scale, offset);
    }

    /** The same meaning and parts, shown as the user wrote it. */
    Unit written(String text) {
        return new Unit(text, parts, dimension, scale, offset);
    }

    /** The temperature scale whose values, plus the offset, count from absolute zero. */
    Unit shifted(String symbol, BigDecimal newOffset) {
        return new Unit(symbol, parts, dimension, scale, newOffset);
    }

    /** As the user wrote it; empty for a plain number; made of its parts for a computed unit. */
    public String symbol() {
        return symbol;
    }

    /** Whether values in this unit are plain numbers without a factor. */
    public boolean isPlain() {
        return fits(ONE) && scale.isEmpty();
    }

    /** Whether it is a temperature scale with a zero of its own: degC, degF. */
    public boolean hasOffset() {
        return offset.signum() != 0;
    }

    /** The unit of differences of values in this unit: K for degC; itself where there is no offset. */
    public Unit difference() {
        return hasOffset() ? new Unit(printed(parts), parts, dimension, scale, BigDecimal.ZERO) : this;
    }

    /** Whether a value in this unit may be added to one in the other. */
    public boolean fits(Unit other) {
        return dimension.without(ANGLE).equals(other.dimension.without(ANGLE));
    }

    /** Whether an explicit conversion exists: the units fit, or revolutions stand where the other has radians. */
    public boolean convertsTo(Unit target) {
        return fits(target) || turns(target).numerator() != 0;
    }

    /** How many of its revolutions the target counts in radians; 0 where the units do not differ in just that. */
    private Ratio turns(Unit target) {
        Powers<String> ratio = dimension.times(target.dimension.power(Ratio.of(-1, 1)));
        boolean onlyTurns = ratio.without(COUNT).without(ANGLE).isEmpty();
        return onlyTurns && ratio.exponent(COUNT).equals(ratio.exponent(ANGLE).negated())
                ? ratio.exponent(COUNT)
                : Ratio.ZERO;
    }

    /**
     * What a difference in this unit is multiplied by to be in the target; correctly rounded.
     *
     * @throws IllegalArgumentException where the units do not fit
     */
    public double factorTo(Unit target) {
        if (!fits(target)) {
            throw new IllegalArgumentException("\"" + symbol + "\" does not fit \"" + target.symbol + "\"");
        }
        return exactFactorTo(target).doubleValue();
    }

    private BigDecimal exactFactorTo(Unit target) {
        Ratio turns = turns(target);
        Powers<Long> ratio = scale.times(target.scale.power(Ratio.of(-1, 1)));
        return Scale.value(ratio.with(2L, turns).with(Scale.PI, turns));
    }

    /**
     * The explicit conversion of values, with the offsets of temperature scales, and 1 rev = 2π rad.
     *
     * @throws IllegalArgumentException where there is none
     */
    public Conversion conversionTo(Unit target) {
        if (!convertsTo(target)) {
            throw new IllegalArgumentException("\"" + symbol + "\" does not convert to \"" + target.symbol + "\"");
        }
        return Conversion.of(exactFactorTo(target), offset, target.offset);
    }

    /** One value of {@link #conversionTo}. */
    public double convert(double value, Unit target) {
        return conversionTo(target).apply(value);
    }

    /** Offsets of temperature scales fall away in products. */
    public Unit times(Unit other) {
        return computed(parts.times(other.parts), dimension.times(other.dimension), scale.times(other.scale));
    }

    public Unit over(Unit other) {
        return times(other.power(Ratio.of(-1, 1)));
    }

    Unit power(Ratio exponent) {
        return computed(parts.power(exponent), dimension.power(exponent), scale.power(exponent));
    }

    /** Whether exponents and factor stay within what can be computed. */
    boolean isReasonable() {
        return dimension.exponents().values().stream().noneMatch(Ratio::isTooLarge)
                && scale.exponents().values().stream().noneMatch(Ratio::isTooLarge)
                && Double.isFinite(Math.log(Scale.value(scale).doubleValue()));
    }

    private static Unit computed(Powers<String> parts, Powers<String> dimension, Powers<Long> scale) {
        return new Unit(printed(parts), parts, dimension, scale, BigDecimal.ZERO);
    }

    /** {@code cm^3/rev}, {@code kg*m/(A*s^2)}, {@code 1/K}. */
    private static String printed(Powers<String> parts) {
        String above = joined(parts, 1);
        String below = joined(parts, -1);
        if (below.isEmpty()) {
            return above;
        }
        return (above.isEmpty() ? "1" : above) + "/" + (below.contains("*") ? "(" + below + ")" : below);
    }

    private static String joined(Powers<String> parts, int sign) {
        return parts.exponents().entrySet().stream()
                .filter(part -> Long.signum(part.getValue().numerator()) == sign)
                .map(part -> printed(part, sign))
                .collect(Collectors.joining("*"));
    }

    private static String printed(Map.Entry<String, Ratio> part, int sign) {
        Ratio exponent = sign > 0 ? part.getValue() : part.getValue().negated();
        return exponent.equals(Ratio.ONE) ? part.getKey() : part.getKey() + "^" + exponent;
    }

    @Override
    public boolean equals(Object other) {
        return other instanceof Unit unit
                && fits(unit)
                && scale.equals(unit.scale)
                && offset.compareTo(unit.offset) == 0;
    }

    @Override
    public int hashCode() {
        return 31 * dimension.without(ANGLE).hashCode() + scale.hashCode();
    }

    /** The symbol, or {@code 1} for a plain number. */
    @Override
    public String toString() {
        return symbol.isEmpty() ? "1" : symbol;
    }
}
