package benchtrue.sheet;

import benchtrue.model.Interval;
import benchtrue.model.Unit;
import org.jspecify.annotations.Nullable;

/**
 * What the sheet asks of an unknown, all in {@code unit}.
 *
 * @param constantTerm whether it multiplies nothing that varies: the intercept
 * @param plausible where a sound rig has it; null: not declared
 * @param wanted the expanded uncertainty that is wanted; NaN: none
 * @param limits its tolerance limits; null: none
 * @param otherUncertainty standard uncertainty (type B) that adds in quadrature; 0: none
 */
public record UnknownSpec(
        String name,
        Unit unit,
        boolean constantTerm,
        @Nullable Interval plausible,
        double wanted,
        @Nullable Interval limits,
        double otherUncertainty) {}
