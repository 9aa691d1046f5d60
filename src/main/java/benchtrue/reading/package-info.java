/** What arrived: one reading with its number, its time and a value for each channel. Imports nothing of ours. */
package benchtrue.reading;
