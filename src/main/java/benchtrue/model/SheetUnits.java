package benchtrue.model;

import benchtrue.model.Syntax.Operator;
import java.util.List;
import java.util.Set;
import org.jspecify.annotations.Nullable;

/** Expressions whose plain numbers are in the units that the sheet gives its channels: corrections and limits of operation. */
final class SheetUnits {
    private SheetUnits() {}

    static Parsed<Expression> correction(String text, Scope scope, String channel) {
        Unit unit = scope.find(channel) instanceof Scope.Value value ? value.unit() : Unit.ONE;
        Scope own = scope.ofCorrection(channel);
        Messages messages = new Messages();
        try {
            Syntax syntax = Parser.parse(text, own::has);
            boolean plain = !namesUnit(syntax);
            Typed typed = new Typing(plain ? own.ofPlainNumbers() : own, messages).type(syntax);
            if (typed != null && !plain && !typed.unit().fits(unit)) {
                messages.problem(
                        0,
                        "the corrected value is in " + Sums.shown(typed.unit()) + ", the channel in "
                                + Sums.shown(unit),
                        Sums.misfitRemedy(typed.unit(), unit));
            }
            if (typed == null || messages.hasProblems()) {
                return messages.failed();
            }
            Code code = plain ? typed.code() : typed.in(unit);
            return messages.done(new Expression(text, new Typed(unit, code, typed.sources(), false)));
        } catch (Mistake mistake) {
            messages.problem(mistake.problem);
            return messages.failed();
        }
    }

    static Parsed<Expression> limit(String text, Scope scope) {
        Messages messages = new Messages();
        try {
            Syntax.Binary sides = sides(text, scope);
            Typed excess = excess(sides, scope, messages);
            if (excess == null && !namesUnit(sides)) {
                Messages plain = new Messages();
                Typed numbers = excess(sides, scope.ofPlainNumbers(), plain);
                return numbers == null ? messages.failed() : plain.done(new Expression(text, numbers));
            }
            return excess == null ? messages.failed() : messages.done(new Expression(text, excess));
        } catch (Mistake mistake) {
            messages.problem(mistake.problem);
            return messages.failed();
        }
    }

    /** smaller − larger, from {@code smaller < larger} or {@code larger > smaller}. */
    private static Syntax.Binary sides(String text, Scope scope) {
        List<Token> tokens = Lexer.tokens(text);
        List<Token> signs =
                tokens.stream().filter(token -> token.is("<") || token.is(">")).toList();
        if (signs.size() != 1) {
            int column = signs.isEmpty() ? text.length() : signs.get(1).column();
            throw new Mistake(column, "a limit has one '<' or '>'", "write it as n*dp < 3.5e5");
        }
        Token sign = signs.get(0);
        Syntax left = Parser.parse(text, tokens.subList(0, tokens.indexOf(sign)), sign.column(), scope::has);
        Syntax right = Parser.parse(
                text, tokens.subList(tokens.indexOf(sign) + 1, tokens.size() - 1), text.length(), scope::has);
        return sign.is("<")
                ? new Syntax.Binary(sign.column(), Operator.MINUS, left, right)
                : new Syntax.Binary(sign.column(), Operator.MINUS, right, left);
    }

    private static @Nullable Typed excess(Syntax.Binary sides, Scope scope, Messages messages) {
        Typing typing = new Typing(scope, messages);
        Typed left = typing.type(sides.left());
        Typed right = typing.type(sides.right());
        if (left == null || right == null) {
            return null;
        }
        Typed a = isPlainConstant(left) ? in(right.unit(), left) : left;
        Typed b = isPlainConstant(right) ? in(left.unit(), right) : right;
        return new Sums(messages).join(sides, a, b);
    }

    private static boolean isPlainConstant(Typed typed) {
        return typed.isConstant() && typed.unit().isPlain();
    }

    private static Typed in(Unit unit, Typed number) {
        return new Typed(unit, number.code(), Set.of(), false);
    }

    private static boolean namesUnit(Syntax syntax) {
        if (syntax instanceof Syntax.Literal number) {
            return number.unit() != null;
        }
        if (syntax instanceof Syntax.Negation negation) {
            return namesUnit(negation.operand());
        }
        if (syntax instanceof Syntax.Call call) {
            return namesUnit(call.argument());
        }
        return syntax instanceof Syntax.Binary binary && (namesUnit(binary.left()) || namesUnit(binary.right()));
    }
}
