package benchtrue.run;

/** How a replay is driven. Leaves no trace in the record. */
public sealed interface Control extends Message {
    record Pause() implements Control {}

    record Resume() implements Control {}

    /** One reading, then paused again. */
    record Step() implements Control {}

    record Faster() implements Control {}

    record Slower() implements Control {}

    /** As fast as it goes until the next alarm is raised, then paused. */
    record NextAlarm() implements Control {}

    /** As fast as it goes to this time of the run, from the start where it lies behind, then paused. */
    record JumpTo(double seconds) implements Control {}

    /** Back to the start. */
    record Restart() implements Control {}

    /** Compute the closing summary over what has been read so far and show it. */
    record Summarise() implements Control {}

    /** Observe the channels from now on, for the set-up; until another one begins or it ends. */
    record BeginSpell() implements Control {}

    record EndSpell() implements Control {}

    /** End the run here. */
    record Close() implements Control {}
}
