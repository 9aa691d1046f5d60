package benchtrue.run;

/** Told of all that happens in a run, in order, on the thread of the engine. */
public interface RunListener {
    /**
     * After each reading.
     *
     * @param engine the state after the reading; read it now, it changes with the next
     */
    void reading(Engine engine);

    void event(Event event);

    void closed(Closing closing);
}
