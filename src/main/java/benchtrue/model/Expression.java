package benchtrue.model;

import java.util.Set;

/** An expression over channels and constants, with its unit checked. Immutable; {@link #compile()} makes what holds state. */
public final class Expression {
    private final String text;
    private final Typed typed;

    Expression(String text, Typed typed) {
        this.text = text;
        this.typed = typed;
    }

    /** Reads an expression in which every name is one of the scope. */
    public static Parsed<Expression> parse(String text, Scope scope) {
        Messages messages = new Messages();
        try {
            Typed typed = new Typing(scope, messages).type(Parser.parse(text, scope::has));
            return typed == null ? messages.failed() : messages.done(new Expression(text, typed));
        } catch (Mistake mistake) {
            messages.problem(mistake.problem);
            return messages.failed();
        }
    }

    /**
     * Reads the correction of a channel, from the indication {@code x} to the corrected value in the channel's unit. Where the
     * text names no unit, {@code x} is the plain number of the channel's unit: {@code 1.002*x - 0.1}.
     */
    public static Parsed<Expression> parseCorrection(String text, Scope scope, String channel) {
        return SheetUnits.correction(text, scope, channel);
    }

    /**
     * Reads a limit of operation such as {@code n*dp < 3.5e5} into the excess that must not be above 0. A plain number is in
     * the unit that the other side has; where no number has a unit and the units do not fit, all channels count as the plain
     * numbers that they are in their units.
     */
    public static Parsed<Expression> parseLimit(String text, Scope scope) {
        return SheetUnits.limit(text, scope);
    }

    public String text() {
        return text;
    }

    public Unit unit() {
        return typed.unit();
    }

    /** Whether it is the same at every reading. */
    public boolean isConstant() {
        return typed.isConstant();
    }

    Typed typed() {
        return typed;
    }

    Set<Integer> sources() {
        return typed.sources();
    }

    /** A fresh evaluator: {@code prev}, {@code rate} and {@code dir} in it remember earlier readings of one run. */
    public Evaluator compile() {
        return typed.code().start();
    }
}
