/**
 * The physics that the user wrote: units, the equation, its unknowns, what is asked of them, and the row of regressors that
 * a reading becomes. Touches no clock, thread, file or console.
 */
package benchtrue.model;
