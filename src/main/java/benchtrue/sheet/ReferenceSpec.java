package benchtrue.sheet;

import java.util.List;
import org.jspecify.annotations.Nullable;

/**
 * Where the reference model comes from.
 *
 * @param afterSeconds adopt not before this time of the run; infinite: never by itself
 * @param fromRun folder of an earlier run to take it from, as the sheet writes it; null: this run
 * @param typed typed into the sheet, one for each group that has one
 */
public record ReferenceSpec(double afterSeconds, @Nullable String fromRun, List<Typed> typed) {
    /**
     * A reference typed into the sheet.
     *
     * @param values one for each unknown of the group, in its unit
     * @param covariance of the values, row by row, p×p, in products of their units
     * @param residualStandardDeviation in the unit of the group's first response
     * @param degreesOfFreedom of that standard deviation; may be infinite
     */
    public record Typed(
            int group,
            double[] values,
            double[] covariance,
            double residualStandardDeviation,
            double degreesOfFreedom) {}
}
