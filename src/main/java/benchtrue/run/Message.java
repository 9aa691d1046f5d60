package benchtrue.run;

/** What the screen tells the run: an act, which belongs to the record, or a control of the replay, which does not. */
public sealed interface Message permits Act, Control {}
