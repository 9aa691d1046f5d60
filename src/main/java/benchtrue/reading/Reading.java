package benchtrue.reading;

import java.util.Arrays;

/**
 * One reading as it arrived. A source fills the same object again for each reading, so that a long run allocates nothing;
 * whoever keeps a value beyond the next reading copies it.
 */
public final class Reading {
    /** Counts from 1 over the run; a line that could not be read takes no number. */
    public long number;

    /** Seconds since the first reading of the run. */
    public double time;

    /** One value for each channel in the order of the sheet, in the channel's unit, uncorrected; NaN where it is missing. */
    public final double[] values;

    public Reading(int channels) {
        values = new double[channels];
        Arrays.fill(values, Double.NaN);
    }
}
