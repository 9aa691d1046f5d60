package benchtrue.model;

/** A unit of measurement. */
public final class Unit {
    /** The unit of a plain number. */
    public static final Unit ONE = new Unit("");

    private final String symbol;

    private Unit(String symbol) {
        this.symbol = symbol;
    }

    /** As the user wrote it; empty for a plain number. */
    public String symbol() {
        return symbol;
    }
}
