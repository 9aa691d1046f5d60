package benchtrue.run;

/**
 * What one reading left behind, in the columns of estimates.csv. The engine fills the same object again for each reading.
 * NaN stands where an unknown is not determined or a relation had no row.
 */
public final class EstimateRow {
    public long reading;

    /** Seconds since the first reading. */
    public double time;

    /** Of all groups one after the other, in the order of their unknowns. */
    public final double[] estimates;

    /** Standard uncertainties, in the same order. */
    public final double[] uncertainties;

    /** One for each relation in the order of the sheet, in the response's unit. */
    public final double[] innovations;

    /** Bound of each innovation, in the response's unit. */
    public final double[] bounds;

    public EstimateRow(int unknowns, int relations) {
        estimates = new double[unknowns];
        uncertainties = new double[unknowns];
        innovations = new double[relations];
        bounds = new double[relations];
    }
}
