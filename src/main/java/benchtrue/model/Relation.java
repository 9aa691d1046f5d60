package benchtrue.model;

import java.util.List;

/** An equation, linear in its unknowns: response = Σ regressor·unknown, its units checked. Immutable. */
public final class Relation {
    private final String text;

    Relation(String text) {
        this.text = text;
    }

    /** As the user wrote it. */
    public String text() {
        return text;
    }

    /** The left side as the user wrote it. */
    public String responseText() {
        return text;
    }

    public Unit responseUnit() {
        return Unit.ONE;
    }

    /** In the order in which the equation names them. */
    public List<Unknown> unknowns() {
        return List.of();
    }

    /** A fresh row maker for one run. */
    public Regressor compile() {
        return new Regressor();
    }

    /** @param constantTerm whether it multiplies nothing that varies */
    public record Unknown(String name, Unit unit, boolean constantTerm) {}
}
