package benchtrue.alarm;

/**
 * The adopted model of the sound rig, against which drift is judged. Frozen: a model that keeps learning would follow the
 * drift. Its own uncertainty goes into every test against it.
 *
 * @param values θₐ of the group's unknowns, each in its unit; kept, not copied
 * @param covariance of the values, p×p row by row, in products of their units; all zero where they are exact; kept
 * @param residualSd s of a reading of weight 1, one for each relation of the group, in its response's unit, above 0; kept
 * @param degreesOfFreedom of each of these, may be infinite; kept
 * @param effectiveReadings that it rests on
 * @param autocorrelation of its innovations at lag 1, in (−1, 1); NaN: not known, then the run learns it before it tests
 * @param reading number of the reading at which it was adopted; 0: before the run
 * @param time of adoption in s since the first reading
 * @param by name of whoever adopted it by hand, else empty
 * @param reason why by hand, or which run it is from; else empty
 */
public record ReferenceModel(
        double[] values,
        double[] covariance,
        double[] residualSd,
        double[] degreesOfFreedom,
        double effectiveReadings,
        double autocorrelation,
        long reading,
        double time,
        How how,
        String by,
        String reason) {

    /** Below so many effective readings the limits are noticeably wider. */
    public static final double ENOUGH_READINGS = 1000;

    public ReferenceModel {
        int p = values.length;
        if (covariance.length != p * p) {
            throw new IllegalArgumentException("covariance has " + covariance.length + " entries, not " + p * p);
        }
        if (residualSd.length != degreesOfFreedom.length) {
            throw new IllegalArgumentException("residual standard deviations and degrees of freedom differ in number");
        }
    }

    /** Where it came from. */
    public enum How {
        AUTOMATIC("automatically"),
        BY_HAND("by hand"),
        FROM_RUN("from an earlier run"),
        TYPED("typed into the sheet");

        private final String words;

        How(String words) {
            this.words = words;
        }

        public String words() {
            return words;
        }
    }

    /** Whether it rests on so few readings that the limits of the tests against it are wider. */
    public boolean widens() {
        return effectiveReadings < ENOUGH_READINGS;
    }
}
