package benchtrue.estimate;

/**
 * One contribution of an uncertainty budget.
 *
 * @param standardUncertainty in the unit of the result
 * @param degreesOfFreedom may be any real number above 0, infinite for a declared one
 */
public record Component(String name, double standardUncertainty, double degreesOfFreedom) {}
