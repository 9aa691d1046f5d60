package benchtrue.model;

/** Turns observations of one run into rows: response, regressors and weight. Reuses its arrays. */
public final class Regressor {
    private final double[] regressors = new double[0];

    /**
     * Evaluates the relation once; to be called once for each reading.
     *
     * @return false where something is missing or not finite: then the row is not to be used
     */
    public boolean evaluate(Observation observation) {
        return false;
    }

    /** In the response's unit, known terms of the right side already taken off. */
    public double response() {
        return Double.NaN;
    }

    /** One for each unknown of the relation, in the response's unit for each unit of the unknown. Reused. */
    public double[] regressors() {
        return regressors;
    }

    /** Above 0; 1 where the sheet gives none. */
    public double weight() {
        return 1;
    }
}
