package benchtrue.alarm;

import java.util.List;

/**
 * What the likelihood-ratio bank says of a change against the reference.
 *
 * @param leader place of the cause with the most evidence among the regressors; their number: the noise
 * @param ramp whether a ramp explains it better than a step
 * @param ratio ℓ of the leader
 * @param lead by how much it leads the next cause
 * @param named whether the lead is enough, and the leader explains all there is
 * @param rivals places of the causes within reach of the leader, itself first
 * @param tellable whether at the present operating point more readings alone can tell the rivals apart
 * @param together whether a change of several unknowns at once explains much more
 * @param gain whether a common factor of all coefficients explains it better than any one of them
 * @param onset in s, with its interval
 * @param change of the unknown now in units of s; of noise the factor of its standard deviation
 * @param size of the change now: in the unknown's unit, with U; of noise the factor of its standard deviation
 * @param shift mean error since the onset in the response's unit, with U
 */
record Cause(
        int leader,
        boolean ramp,
        double ratio,
        double lead,
        boolean named,
        List<Integer> rivals,
        boolean tellable,
        boolean together,
        boolean gain,
        Finding.Onset onset,
        double change,
        double size,
        double sizeU,
        double shift,
        double shiftU) {

    /** The same cause with an onset that was known better. */
    Cause with(boolean nowNamed, Finding.Onset better) {
        return new Cause(
                leader, ramp, ratio, lead, nowNamed, rivals, tellable, together, gain, better, change, size, sizeU,
                shift, shiftU);
    }
}
