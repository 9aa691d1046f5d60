package benchtrue.model;

/** Turns observations of one run into rows: response, regressors and weight. Reuses its arrays. */
public final class Regressor {
    private final Evaluator responseEvaluator;
    private final Evaluator weightEvaluator;
    private final Evaluator[] evaluators;
    private final double[] regressors;
    private double response = Double.NaN;
    private double weight = 1;

    Regressor(Evaluator response, Evaluator[] regressors, Evaluator weight) {
        responseEvaluator = response;
        weightEvaluator = weight;
        evaluators = regressors;
        this.regressors = new double[regressors.length];
    }

    /**
     * Evaluates the relation once; to be called once for each reading, because what remembers earlier readings counts calls.
     *
     * @return false where something is missing or not finite, or the weight is not above 0: then the row is not to be used
     */
    public boolean evaluate(Observation observation) {
        response = responseEvaluator.evaluate(observation);
        weight = weightEvaluator.evaluate(observation);
        // 0·x is 0 for a finite x and NaN for all others.
        double sound = 0 * response;
        for (int i = 0; i < evaluators.length; i++) {
            double regressor = evaluators[i].evaluate(observation);
            regressors[i] = regressor;
            sound += 0 * regressor;
        }
        return sound == 0 && weight > 0 && weight < Double.POSITIVE_INFINITY;
    }

    /** In the response's unit, known terms of the right side already taken off. */
    public double response() {
        return response;
    }

    /** One for each unknown of the relation, in the response's unit for each unit of the unknown. Reused. */
    public double[] regressors() {
        return regressors;
    }

    /** 1 where the sheet gives none. */
    public double weight() {
        return weight;
    }
}
