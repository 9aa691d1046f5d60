/** Panes drawn from immutable snapshots; keys turned into messages to the run. */
package benchtrue.screen;
