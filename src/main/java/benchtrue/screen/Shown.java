package benchtrue.screen;

import benchtrue.run.Snapshot;
import java.util.LinkedHashSet;
import java.util.List;

/**
 * All that one frame is made of.
 *
 * @param frozenSeconds for how long the display has been frozen; NaN: it is not
 * @param trouble what could not be done, in words; empty: nothing
 */
record Shown(Snapshot snapshot, Look look, double frozenSeconds, String trouble) {

    /** The unknowns of all relations, each once. */
    List<Snapshot.UnknownView> unknowns() {
        LinkedHashSet<Snapshot.UnknownView> all = new LinkedHashSet<>();
        snapshot.relations().forEach(r -> all.addAll(r.unknowns()));
        return List.copyOf(all);
    }

    boolean frozen() {
        return !Double.isNaN(frozenSeconds);
    }
}
