package benchtrue.run;

/** Told of all that happens in a run, in order, on the thread of the engine. */
public interface RunListener {
    /** Whether the row of this reading is to be filled and told; uncertainties cost time. */
    default boolean wants(long reading) {
        return true;
    }

    /** After each wanted reading; {@code row} is filled again with the next, so read it now. */
    void reading(EstimateRow row);

    void event(Event event);

    /** The operator did something, now or when the run was recorded. */
    default void act(TimedAct act) {}

    /** The run goes back to its first reading: all that was told is void. */
    default void restarted() {}

    /** The run is over. */
    void closed(Closing closing);
}
