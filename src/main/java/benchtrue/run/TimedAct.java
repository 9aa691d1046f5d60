package benchtrue.run;

/**
 * An act of the operator with its place in the run.
 *
 * @param reading number of the last reading before it; 0: before the first
 * @param time of that reading in s since the first
 */
public record TimedAct(long reading, double time, Act act) {}
