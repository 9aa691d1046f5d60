package benchtrue.model;

import benchtrue.model.Syntax.Operator;
import org.jspecify.annotations.Nullable;

/**
 * Sums and differences of values with units. What is added is converted to the unit of the first.
 *
 * <p>Temperatures, where a <em>point</em> is a value on a scale with a zero of its own (degC, degF):
 * <ul>
 *   <li>point − point, and point − a channel or constant in K (or the reverse): both are temperatures, their offsets convert,
 *       the result is a difference in K;
 *   <li>point ± difference: a point;
 *   <li>point + point, difference − point: added as written, counted from the zero of the scale, as a mean needs it.
 * </ul>
 */
final class Sums {
    private final Messages messages;

    Sums(Messages messages) {
        this.messages = messages;
    }

    /** Null where the units do not fit, which was reported. */
    @Nullable
    Typed join(Syntax.Binary binary, Typed left, Typed right) {
        if (!left.unit().fits(right.unit())) {
            misfit(binary, left.unit(), right.unit());
            return null;
        }
        if (left.isPoint() || right.isPoint()) {
            return temperatures(binary, left, right);
        }
        return joined(binary, left.unit(), left.code(), right.in(left.unit()), left, right);
    }

    private static Typed joined(Syntax.Binary binary, Unit unit, Code a, Code b, Typed left, Typed right) {
        Code code = binary.operator() == Operator.MINUS ? Code.difference(a, b) : Code.sum(a, b);
        return Typed.computed(unit, code, left, right);
    }

    private void misfit(Syntax.Binary binary, Unit left, Unit right) {
        boolean minus = binary.operator() == Operator.MINUS;
        messages.problem(
                binary.column(),
                Printer.text(binary.left()) + " is in " + shown(left) + " and " + Printer.text(binary.right()) + " in "
                        + shown(right) + ": they cannot be " + (minus ? "subtracted" : "added"),
                misfitRemedy(left, right));
    }

    static String shown(Unit unit) {
        return unit.isPlain() ? "no unit" : unit.symbol();
    }

    /** What to do where two units should fit and do not. */
    static String misfitRemedy(Unit left, Unit right) {
        if (left.convertsTo(right)
                || left.over(right).fits(TURN)
                || right.over(left).fits(TURN)) {
            return "a revolution is a count: multiply by (6.283185307179586 rad/rev) or divide by (1 rev)";
        }
        if (left.isPlain() || right.isPlain()) {
            return "give the plain number its unit, as in (5 " + (left.isPlain() ? right : left) + ")";
        }
        return "mend the unit of a channel or constant, or multiply by a value with a unit";
    }

    private static final Unit TURN = Unit.base("rev");

    private Typed temperatures(Syntax.Binary binary, Typed left, Typed right) {
        boolean minus = binary.operator() == Operator.MINUS;
        Unit scale = left.isPoint() ? left.unit() : right.unit();
        boolean bothTemperatures = (left.isPoint() || left.named()) && (right.isPoint() || right.named());
        if (minus && bothTemperatures) {
            noticeKelvin(binary, left, right);
            return joined(binary, scale.difference(), left.convertedTo(scale), right.convertedTo(scale), left, right);
        }
        boolean fromZero = minus ? !left.isPoint() : left.isPoint() && right.isPoint();
        if (fromZero) {
            messages.notice(
                    binary.column(),
                    "temperatures are added as written here, counted from 0 " + scale,
                    "write a difference of two temperatures where one is meant");
        }
        Unit unit = fromZero ? scale.difference() : scale;
        return joined(binary, unit, left.in(scale), right.in(scale), left, right);
    }

    private void noticeKelvin(Syntax.Binary binary, Typed left, Typed right) {
        if (left.isPoint() != right.isPoint()) {
            Syntax kelvin = left.isPoint() ? binary.right() : binary.left();
            messages.notice(
                    kelvin.column(),
                    Printer.text(kelvin) + " is taken for a temperature, not for a difference",
                    "where it is a difference, write + (-1)*" + Printer.text(kelvin));
        }
    }
}
