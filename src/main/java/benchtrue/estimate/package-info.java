/**
 * The numbers that are signed: the recursion, its covariance, the batch fit beside it, tests of residuals, verdicts and
 * advice. Touches no clock, thread, file or console.
 */
package benchtrue.estimate;
