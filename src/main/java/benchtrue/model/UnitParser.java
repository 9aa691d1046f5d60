package benchtrue.model;

import benchtrue.model.Token.Kind;
import java.math.BigDecimal;
import java.util.List;
import java.util.function.Predicate;
import org.jspecify.annotations.Nullable;

/**
 * The syntax of units: names and powers of them joined by {@code *} or {@code /}, which work from left to right
 * ({@code m/s/s} is m/s²), parentheses, {@code 1/K}, and a number before a unit as its factor ({@code 100 m^3/h}).
 */
final class UnitParser {
    private static final String SYNTAX = "join names of units with * and /, as in kg*m/s^2";
    private static final int DEEPEST = 50;

    private final Tokens tokens;
    private int depth;

    private UnitParser(Tokens tokens) {
        this.tokens = tokens;
    }

    static Parsed<Unit> parse(String text) {
        if (text.isBlank()) {
            return new Parsed<>(Unit.ONE, List.of(), List.of());
        }
        try {
            return new Parsed<>(whole(text).written(text.strip()), List.of(), List.of());
        } catch (Mistake mistake) {
            return Parsed.failed(List.of(mistake.problem), List.of());
        }
    }

    private static Unit whole(String text) {
        Tokens tokens = new Tokens(text, Lexer.tokens(text));
        Unit unit = new UnitParser(tokens).product();
        if (!tokens.at(Kind.END)) {
            throw new Mistake(
                    tokens.peek().column(),
                    "a unit does not go on with " + tokens.peek().quoted(),
                    SYNTAX);
        }
        return unit;
    }

    /**
     * The unit behind a number in an expression: it reaches over {@code *} and {@code /} as long as these are written
     * without a space around them and followed by a unit that is no name of the sheet.
     *
     * @return null, and nothing taken, where no unit follows
     */
    static @Nullable Unit literal(Tokens tokens, Predicate<String> isOfSheet) {
        if (!tokens.at(Kind.NAME) || UnitTable.find(tokens.peek().text()) == null) {
            return null;
        }
        int start = tokens.place();
        UnitParser parser = new UnitParser(tokens);
        Unit unit = parser.power();
        while (joinsUnit(tokens, isOfSheet)) {
            unit = parser.step(unit);
        }
        return unit.written(tokens.textSince(start));
    }

    private static boolean joinsUnit(Tokens tokens, Predicate<String> isOfSheet) {
        Token sign = tokens.peek();
        boolean tight =
                sign.column() == tokens.end() && sign.end() == tokens.ahead(1).column();
        return tight && (sign.is("*") || sign.is("/")) && startsUnit(tokens, 1, isOfSheet);
    }

    private static boolean startsUnit(Tokens tokens, int steps, Predicate<String> isOfSheet) {
        Token first = tokens.ahead(steps);
        if (first.is("(")) {
            return startsUnit(tokens, steps + 1, isOfSheet);
        }
        return first.kind() == Kind.NAME && UnitTable.find(first.text()) != null && !isOfSheet.test(first.text());
    }

    private Unit product() {
        Unit unit = leading();
        while (tokens.peek().is("*") || tokens.peek().is("/")) {
            unit = step(unit);
        }
        return unit;
    }

    private Unit step(Unit left) {
        Token sign = tokens.next();
        Unit right = leading();
        return reasonable(sign.is("*") ? left.times(right) : left.over(right), sign.column());
    }

    /** A number may stand directly before a name, as its factor. */
    private Unit leading() {
        boolean number = tokens.at(Kind.NUMBER);
        Unit unit = power();
        return number && tokens.at(Kind.NAME) ? unit.times(power()) : unit;
    }

    private Unit power() {
        int column = tokens.peek().column();
        Unit base = primary();
        if (tokens.at(Kind.SUPERSCRIPT)) {
            return reasonable(base.power(Ratio.of((long) tokens.next().number(), 1)), column);
        }
        return tokens.take("^") ? reasonable(base.power(exponent()), column) : base;
    }

    private static Unit reasonable(Unit unit, int column) {
        if (!unit.isReasonable()) {
            throw new Mistake(column, "a power of a unit beyond what can be computed", "use a smaller exponent");
        }
        return unit;
    }

    private Ratio exponent() {
        if (tokens.take("(")) {
            Ratio top = signed();
            Ratio ratio = tokens.take("/") ? top.times(inverse(signed())) : top;
            close();
            return ratio;
        }
        return signed();
    }

    private Ratio inverse(Ratio ratio) {
        if (ratio.numerator() == 0) {
            throw new Mistake(tokens.end() - 1, "an exponent divided by zero", "write a ratio such as ^(1/2)");
        }
        return Ratio.of(ratio.denominator(), ratio.numerator());
    }

    private Ratio signed() {
        boolean negative = tokens.take("-");
        Token token = tokens.next();
        Ratio ratio = Ratio.near(token.number()).orElse(null);
        if (token.kind() != Kind.NUMBER || ratio == null) {
            throw new Mistake(
                    token.column(),
                    token.quoted() + " is no exponent of a unit",
                    "write a whole number or a ratio such as ^(1/2)");
        }
        return negative ? ratio.negated() : ratio;
    }

    private Unit primary() {
        Token token = tokens.next();
        if (token.is("(") && depth < DEEPEST) {
            depth++;
            Unit unit = product();
            close();
            depth--;
            return unit;
        }
        return switch (token.kind()) {
            case NAME -> named(token);
            case NUMBER -> number(token);
            default -> throw new Mistake(token.column(), "a unit is expected, not " + token.quoted(), SYNTAX);
        };
    }

    private void close() {
        if (!tokens.take(")")) {
            throw new Mistake(tokens.peek().column(), "')' is missing in a unit", "close the parenthesis");
        }
    }

    private static Unit named(Token name) {
        Unit unit = UnitTable.find(name.text());
        if (unit == null) {
            throw new Mistake(name.column(), name.quoted() + " is no unit that is known here", meant(name.text()));
        }
        return unit;
    }

    /** What to write instead: a usual way of writing, the digit of a power, two units run together, the nearest name. */
    private static String meant(String name) {
        String usual = UnitTable.meant(name);
        int last = name.length() - 1;
        boolean raised =
                last > 0 && "23".indexOf(name.charAt(last)) >= 0 && UnitTable.find(name.substring(0, last)) != null;
        String meant = usual != null
                ? usual
                : raised ? name.substring(0, last) + "^" + name.charAt(last) : Nearest.to(name, UnitTable.names());
        return meant == null
                ? "docs/equations.md lists the units; without one a value is a plain number"
                : "write " + meant;
    }

    private static Unit number(Token token) {
        BigDecimal digits = new BigDecimal(token.text()).stripTrailingZeros();
        boolean usable = digits.signum() > 0
                && Math.abs(digits.scale()) < 100
                && digits.unscaledValue().compareTo(Scale.LARGEST_INTEGER) < 0;
        if (!usable) {
            throw new Mistake(
                    token.column(),
                    token.text() + " cannot be the factor of a unit",
                    "use a number above 0 of at most 13 digits");
        }
        return Unit.number(token.text(), Scale.of(digits));
    }
}
