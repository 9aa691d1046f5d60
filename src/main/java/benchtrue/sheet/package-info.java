/** The bench sheet: from the file to settings that validate themselves, with line and column of every mistake. */
package benchtrue.sheet;
