package benchtrue.model;

import benchtrue.model.Syntax.Operator;

/** Writes a tree back as text that parses to the same tree, with no more parentheses than that needs. */
final class Printer {
    private static final int SIGN_BINDING = 3;
    private static final int STRONGEST = 5;

    private Printer() {}

    static String text(Syntax syntax) {
        return text(syntax, 0);
    }

    /** In parentheses where the text binds less than asked. */
    static String text(Syntax syntax, int binding) {
        String text = bare(syntax);
        return binding(syntax) < binding ? "(" + text + ")" : text;
    }

    private static int binding(Syntax syntax) {
        if (syntax instanceof Syntax.Binary binary) {
            return binary.operator().binding;
        }
        if (syntax instanceof Syntax.Negation) {
            return SIGN_BINDING;
        }
        boolean quantity = syntax instanceof Syntax.Literal number && number.unit() != null;
        return quantity ? SIGN_BINDING : STRONGEST;
    }

    private static String bare(Syntax syntax) {
        if (syntax instanceof Syntax.Literal number) {
            return number.unit() == null
                    ? number.text()
                    : number.text() + " " + number.unit().symbol();
        }
        if (syntax instanceof Syntax.Name name) {
            return name.name();
        }
        if (syntax instanceof Syntax.Negation negation) {
            return "-" + text(negation.operand(), SIGN_BINDING);
        }
        if (syntax instanceof Syntax.Call call) {
            return call.function().word() + "(" + text(call.argument()) + ")";
        }
        return binary((Syntax.Binary) syntax);
    }

    private static String binary(Syntax.Binary binary) {
        Operator operator = binary.operator();
        boolean toTheRight = operator == Operator.POWER;
        String left = text(binary.left(), operator.binding + (toTheRight ? 1 : 0));
        String right = text(binary.right(), operator.binding + (toTheRight ? 0 : 1));
        String space = operator.binding == 1 ? " " : "";
        return left + space + operator.sign + space + right;
    }
}
