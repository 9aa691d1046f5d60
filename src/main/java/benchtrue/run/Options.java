package benchtrue.run;

import java.util.List;

/**
 * How a run is driven. Has no part in what it computes.
 *
 * @param pace times real time, above 0; infinite: as fast as it goes
 * @param shown whether somebody looks at the desk: then snapshots are made, and after its end the run stays open until it is
 *     closed
 * @param acts of the operator that a recorded run has, in the order of their readings
 */
public record Options(double pace, boolean shown, List<TimedAct> acts) {
    public Options {
        if (!(pace > 0)) {
            throw new IllegalArgumentException("pace " + pace + ": must be above 0");
        }
        acts = List.copyOf(acts);
    }
}
