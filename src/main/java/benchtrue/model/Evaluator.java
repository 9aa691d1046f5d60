package benchtrue.model;

/** A compiled expression with the memory of one run. */
@FunctionalInterface
public interface Evaluator {
    /** The value in the expression's unit; NaN where something it needs is missing. To be called once for each reading. */
    double evaluate(Observation observation);
}
