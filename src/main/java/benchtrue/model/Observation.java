package benchtrue.model;

/**
 * A reading after corrections, with the derived channels behind the real ones. Filled again for each reading.
 *
 * <p>values: the corrected channels in the order of the sheet, then the derived ones, each in its unit; NaN is missing.
 */
public final class Observation {
    /** Seconds since the first reading. */
    public double time;

    public final double[] values;

    public Observation(int size) {
        values = new double[size];
    }
}
