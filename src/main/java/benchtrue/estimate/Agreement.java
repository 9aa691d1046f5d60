package benchtrue.estimate;

/**
 * Whether the recursive and the batch solution agree.
 *
 * @param differenceInU (recursive − batch) in units of the standard uncertainty, for each unknown; 0 where both are equal
 * @param largestDifferenceInU the largest of these without their signs
 * @param judgement in words, how it was judged
 */
public record Agreement(double[] differenceInU, double largestDifferenceInU, boolean agrees, String judgement) {}
