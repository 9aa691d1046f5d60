/** The loop from reading to estimate, alarm and snapshot; the threads and the clock that drive it; what the operator did. */
package benchtrue.run;
