package benchtrue.model;

import java.util.List;
import java.util.Map;
import org.jspecify.annotations.Nullable;

/**
 * A result asked for: constant + Σ coefficient·unknown, in {@code unit}. Immutable.
 *
 * @param coefficients by the unknown's name, for those that it has, in the order of the text; in {@code unit} for each unit of
 *     the unknown
 */
public record Combination(String text, Unit unit, double constant, Map<String, Double> coefficients) {

    /**
     * Reads the expression of a result: unknowns, constants and numbers with units, no channels.
     *
     * @param unknowns of all relations with their units
     * @param declared the unit that the sheet asks for; null: the first of {@code usual} that fits, else that of the first term
     * @param usual the units of the responses
     */
    public static Parsed<Combination> parse(
            String text, Scope scope, Map<String, Unit> unknowns, @Nullable Unit declared, List<Unit> usual) {
        return new CombinationParser(text, scope, unknowns).parse(declared, usual);
    }
}
