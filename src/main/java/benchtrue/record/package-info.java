/** What is kept: estimates, events and summaries as files and text. */
package benchtrue.record;
