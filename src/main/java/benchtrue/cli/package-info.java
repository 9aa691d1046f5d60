/** Commands, wiring and exit statuses; imported by nobody. */
package benchtrue.cli;
