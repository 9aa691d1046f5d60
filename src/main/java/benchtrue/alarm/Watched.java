package benchtrue.alarm;

import benchtrue.sheet.UnknownSpec;
import java.util.List;

/**
 * What the tests need to know of one relation.
 *
 * @param label how events and tables name it
 * @param unit of the response
 * @param unknowns of the relation, in its own order
 * @param places of these among the unknowns of the group
 * @param channels indices of the channels on which its rows depend, derived ones resolved
 * @param factors for each unknown the names of the channels that it multiplies
 * @param holdsOut whether outliers are held out
 */
record Watched(
        String label,
        String unit,
        List<UnknownSpec> unknowns,
        int[] places,
        int[] channels,
        List<List<String>> factors,
        boolean holdsOut) {

    int size() {
        return places.length;
    }

    /** Whether one of its unknowns is a constant term: then an offset of the response is that unknown. */
    boolean hasConstantTerm() {
        return unknowns.stream().anyMatch(UnknownSpec::constantTerm);
    }
}
