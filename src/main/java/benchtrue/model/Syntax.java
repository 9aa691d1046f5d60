package benchtrue.model;

import org.jspecify.annotations.Nullable;

/** The tree of an expression as it was written. */
sealed interface Syntax {
    /** Column where messages about this node point. */
    int column();

    /** @param unit null where the number carries none */
    record Literal(
            int column, String text, double value, @Nullable Unit unit) implements Syntax {
        static Literal whole(int column, int value) {
            return new Literal(column, Integer.toString(value), value, null);
        }
    }

    record Name(int column, String name) implements Syntax {}

    record Negation(int column, Syntax operand) implements Syntax {}

    /** @param column of the operator */
    record Binary(int column, Operator operator, Syntax left, Syntax right) implements Syntax {}

    record Call(int column, Function function, Syntax argument) implements Syntax {}

    /** In the order of their binding. */
    enum Operator {
        PLUS("+", 1),
        MINUS("-", 1),
        TIMES("*", 2),
        OVER("/", 2),
        POWER("^", 4);

        final String sign;
        final int binding;

        Operator(String sign, int binding) {
            this.sign = sign;
            this.binding = binding;
        }
    }
}
