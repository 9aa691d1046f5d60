/**
 * What is wrong, since when and how sure: tests of innovations, the reference model, channel faults, and the state of each
 * alarm. Touches no clock, thread, file or console.
 */
package benchtrue.alarm;
