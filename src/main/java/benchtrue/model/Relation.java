package benchtrue.model;

import java.util.List;
import java.util.Map;
import org.jspecify.annotations.Nullable;

/** An equation, linear in its unknowns: response = Σ regressor·unknown, its units checked. Immutable. */
public final class Relation {
    private final String text;
    private final String responseText;
    private final Typed response;
    private final List<Unknown> unknowns;
    private final List<Code> regressors;
    private final Code weight;

    Relation(
            String text,
            String responseText,
            Typed response,
            List<Unknown> unknowns,
            List<Code> regressors,
            @Nullable Expression weight) {
        this.text = text;
        this.responseText = responseText;
        this.response = response;
        this.unknowns = List.copyOf(unknowns);
        this.regressors = List.copyOf(regressors);
        this.weight = weight == null ? new Code.Constant(1) : weight.typed().code();
    }

    /**
     * Reads an equation. Every name on its right side that the scope does not have is an unknown.
     *
     * @param declaredUnits of unknowns, by name; the others get the unit that makes the equation fit
     * @param weight of a reading; null: 1
     */
    public static Parsed<Relation> parse(
            String text, Scope scope, Map<String, Unit> declaredUnits, @Nullable Expression weight) {
        return new RelationParser(text, scope, declaredUnits, weight).parse();
    }

    /** As the user wrote it. */
    public String text() {
        return text;
    }

    /** The left side as the user wrote it. */
    public String responseText() {
        return responseText;
    }

    /** Of the left side; K where a known temperature was taken off a temperature. */
    public Unit responseUnit() {
        return response.unit();
    }

    /** Of every reading, where it is the same; NaN where it varies. */
    public double constantWeight() {
        return weight instanceof Code.Constant constant ? constant.value() : Double.NaN;
    }

    /** In the order in which the equation names them. */
    public List<Unknown> unknowns() {
        return unknowns;
    }

    /** A fresh row maker for one run. */
    public Regressor compile() {
        Evaluator[] evaluators = regressors.stream().map(Code::start).toArray(Evaluator[]::new);
        return new Regressor(response.code().start(), evaluators, weight.start());
    }

    /** @param constantTerm whether it multiplies nothing that varies */
    public record Unknown(String name, Unit unit, boolean constantTerm) {}
}
