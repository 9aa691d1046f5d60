package benchtrue.model;

import java.util.Set;
import java.util.TreeSet;

/**
 * An expression whose units are checked.
 *
 * @param code computes the value in {@code unit}
 * @param sources real channels that it is computed from
 * @param named whether it is a channel or constant itself, and not computed
 */
record Typed(Unit unit, Code code, Set<Integer> sources, boolean named) {
    static Typed computed(Unit unit, Code code, Typed... from) {
        Set<Integer> sources = new TreeSet<>();
        for (Typed part : from) {
            sources.addAll(part.sources);
        }
        return new Typed(unit, code, sources, false);
    }

    boolean isConstant() {
        return code instanceof Code.Constant;
    }

    boolean isPoint() {
        return unit.hasOffset();
    }

    /** The same differences in another unit, which must fit; the offset of a temperature is not touched. */
    Code in(Unit target) {
        return Code.scaled(code, unit.factorTo(target));
    }

    /** The same value in another unit, which must fit, with the offsets of temperatures. */
    Code convertedTo(Unit target) {
        return Code.converted(code, unit.conversionTo(target));
    }
}
