/** Where readings come from: replay files, serial lines, polled instruments, the simulated rig. */
package benchtrue.source;
