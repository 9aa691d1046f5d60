package benchtrue.sheet;

import benchtrue.model.Interval;
import benchtrue.model.Unit;
import org.jspecify.annotations.Nullable;

/**
 * A result asked for: constant + Σ coefficient·unknown, in {@code unit}.
 *
 * @param group index of the group whose unknowns it combines
 * @param coefficients one for each unknown of the group
 * @param limits tolerance limits; null: none
 */
public record Result(
        String name,
        String text,
        Unit unit,
        int group,
        double constant,
        double[] coefficients,
        @Nullable Interval limits) {}
