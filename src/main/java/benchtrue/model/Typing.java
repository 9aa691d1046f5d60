package benchtrue.model;

import benchtrue.model.Syntax.Operator;
import java.util.Set;
import org.jspecify.annotations.Nullable;

/**
 * Gives every part of a tree its unit and its code, and reports each place where units do not fit. A value keeps the unit
 * that it has; a factor is applied only where a sum, a function or an exponent needs it.
 */
final class Typing {
    private static final Unit SECOND = Unit.parse("s").get();
    private static final Ratio HALF = Ratio.of(1, 2);

    private final Scope scope;
    private final Messages messages;
    private final Sums sums;

    Typing(Scope scope, Messages messages) {
        this.scope = scope;
        this.messages = messages;
        sums = new Sums(messages);
    }

    /** Null where a mistake was reported. */
    @Nullable
    Typed type(Syntax syntax) {
        if (syntax instanceof Syntax.Literal number) {
            Unit unit = number.unit() == null ? Unit.ONE : number.unit();
            return new Typed(unit, new Code.Constant(number.value()), Set.of(), false);
        }
        if (syntax instanceof Syntax.Name name) {
            return name(name);
        }
        if (syntax instanceof Syntax.Negation negation) {
            return negation(negation);
        }
        if (syntax instanceof Syntax.Call call) {
            return call(call);
        }
        return binary((Syntax.Binary) syntax);
    }

    private @Nullable Typed name(Syntax.Name name) {
        Scope.Meaning meaning = scope.find(name.name());
        if (meaning instanceof Scope.Value value) {
            return new Typed(value.unit(), new Code.Channel(value.index()), value.sources(), true);
        }
        if (meaning instanceof Scope.Constant constant) {
            return new Typed(constant.unit(), new Code.Constant(constant.value()), Set.of(), true);
        }
        if (name.name().equals(Function.TIME)) {
            return new Typed(SECOND, Code.time(), Set.of(), false);
        }
        unknownName(name);
        return null;
    }

    private void unknownName(Syntax.Name name) {
        String nearest = Nearest.to(name.name(), scope.names());
        String known = scope.names().isEmpty() ? "there are none" : "there are " + String.join(" ", scope.names());
        messages.problem(
                name.column(),
                name.name() + " is neither channel, constant nor function",
                nearest == null ? known : "did you mean " + nearest + "?");
    }

    private @Nullable Typed negation(Syntax.Negation negation) {
        Typed operand = type(negation.operand());
        if (operand == null) {
            return null;
        }
        Code code = Code.apply(value -> -value, operand.code());
        if (negation.operand() instanceof Syntax.Literal) {
            return Typed.computed(operand.unit(), code);
        }
        return Typed.computed(fromZero(operand, negation.operand(), "with its sign turned"), code, operand);
    }

    /** The unit of a temperature that is used as written, counted from the zero of its scale. */
    private Unit fromZero(Typed typed, Syntax syntax, String use) {
        if (typed.isPoint()) {
            messages.notice(
                    syntax.column(),
                    Printer.text(syntax) + " counts from 0 " + typed.unit() + " where it stands " + use,
                    "where the absolute temperature is meant, give the channel in K");
        }
        return typed.unit().difference();
    }

    private @Nullable Typed binary(Syntax.Binary binary) {
        Typed left = type(binary.left());
        Typed right = type(binary.right());
        if (left == null || right == null) {
            return null;
        }
        return switch (binary.operator()) {
            case PLUS, MINUS -> sums.join(binary, left, right);
            case TIMES, OVER -> product(binary, left, right);
            case POWER -> power(binary, left, right);
        };
    }

    private @Nullable Typed product(Syntax.Binary binary, Typed left, Typed right) {
        boolean times = binary.operator() == Operator.TIMES;
        Unit a = fromZero(left, binary.left(), "in a product");
        Unit b = fromZero(right, binary.right(), "in a product");
        Code code = times ? Code.product(left.code(), right.code()) : Code.quotient(left.code(), right.code());
        return reasonable(binary.column(), times ? a.times(b) : a.over(b), code, left, right);
    }

    private @Nullable Typed reasonable(int column, Unit unit, Code code, Typed... from) {
        if (!unit.isReasonable()) {
            messages.problem(column, "a power of a unit beyond what can be computed", "use smaller exponents");
            return null;
        }
        return Typed.computed(unit, code, from);
    }

    private @Nullable Typed power(Syntax.Binary binary, Typed base, Typed exponent) {
        if (!exponent.unit().fits(Unit.ONE)) {
            messages.problem(
                    binary.right().column(),
                    "an exponent is a plain number; " + Printer.text(binary.right()) + " is in " + exponent.unit(),
                    "divide it by a value with that unit");
            return null;
        }
        Unit unit = fromZero(base, binary.left(), "in a power");
        Code plainExponent = exponent.in(Unit.ONE);
        if (plainExponent instanceof Code.Constant constant && !unit.isPlain()) {
            Ratio ratio = Ratio.near(constant.value()).orElse(null);
            if (ratio != null) {
                return reasonable(binary.column(), unit.power(ratio), Code.power(base.code(), plainExponent), base);
            }
        }
        if (!unit.fits(Unit.ONE)) {
            messages.problem(
                    binary.column(),
                    Printer.text(binary.left()) + " is in " + unit + ": only a plain number can have the exponent "
                            + Printer.text(binary.right()),
                    "divide it by a value with that unit, or use an exponent that is a ratio of small numbers");
            return null;
        }
        return Typed.computed(Unit.ONE, Code.power(base.in(Unit.ONE), plainExponent), base, exponent);
    }

    private @Nullable Typed call(Syntax.Call call) {
        Typed argument = type(call.argument());
        if (argument == null) {
            return null;
        }
        Function function = call.function();
        if (function.wantsPlainNumber()) {
            return ofPlainNumber(call, argument);
        }
        return switch (function) {
            case RATE, PREV, DIR -> remembering(call, argument);
            case SQRT -> {
                Unit unit = fromZero(argument, call.argument(), "in sqrt");
                yield reasonable(call.column(), unit.power(HALF), code(function, argument.code()), argument);
            }
            case ABS -> {
                Unit unit = fromZero(argument, call.argument(), "in abs");
                yield Typed.computed(unit, code(function, argument.code()), argument);
            }
            default -> {
                fromZero(argument, call.argument(), "in " + function.word());
                yield Typed.computed(Unit.ONE, code(function, argument.code()), argument);
            }
        };
    }

    private static Code code(Function function, Code argument) {
        return Code.apply(function.operator(), argument);
    }

    private @Nullable Typed ofPlainNumber(Syntax.Call call, Typed argument) {
        String word = call.function().word();
        if (argument.unit().fits(Unit.ONE)) {
            return Typed.computed(Unit.ONE, code(call.function(), argument.in(Unit.ONE)), argument);
        }
        String inner = Printer.text(call.argument(), Operator.OVER.binding);
        boolean angle =
                call.function() == Function.SIN || call.function() == Function.COS || call.function() == Function.TAN;
        messages.problem(
                call.argument().column(),
                word + " takes a plain number" + (angle ? " or an angle" : "") + "; " + Printer.text(call.argument())
                        + " is in " + argument.unit(),
                "divide by a value with that unit, as in " + word + "(" + inner + "/(1 " + argument.unit() + "))");
        return null;
    }

    private Typed remembering(Syntax.Call call, Typed argument) {
        double resolution =
                call.argument() instanceof Syntax.Name name && scope.find(name.name()) instanceof Scope.Value value
                        ? value.resolution()
                        : 0;
        Unit unit = switch (call.function()) {
            case RATE -> argument.unit().difference().over(SECOND);
            case DIR -> Unit.ONE;
            default -> argument.unit();
        };
        return Typed.computed(unit, Remembering.of(call.function(), argument.code(), resolution), argument);
    }
}
