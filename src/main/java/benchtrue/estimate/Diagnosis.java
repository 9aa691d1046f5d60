package benchtrue.estimate;

import java.util.List;

/**
 * What the readings can tell apart (Belsley, Kuh and Welsch 1980, Regression Diagnostics, ch. 3), from the singular values of
 * the column-scaled, uncentred regressors.
 *
 * @param conditionIndex largest over smallest singular value; infinite where some direction is not known at all
 * @param determined for each unknown whether it has a value: the directions that are not known do not move it
 * @param weak for each unknown whether more than half of its variance comes from a direction of index above 30
 * @param inseparable groups of unknowns that cannot be told apart: shares above a half of two or more at one such index
 * @param weakestDirection of the regressors, in their units: readings that move along it would tell most
 */
public record Diagnosis(
        double conditionIndex,
        boolean[] determined,
        boolean[] weak,
        List<List<Integer>> inseparable,
        double[] weakestDirection) {

    public boolean allDetermined() {
        for (boolean each : determined) {
            if (!each) {
                return false;
            }
        }
        return true;
    }
}
