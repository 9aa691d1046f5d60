package benchtrue.run;

import benchtrue.reading.Reading;
import benchtrue.source.Source;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.util.List;

/** One pass of a run from its first reading: source, engine and what the screen sees of them. Going back begins another one. */
final class Session implements AutoCloseable {
    private final Source source;
    private final Engine engine;
    private final RunListener listener;
    private final Reading pending;
    private final List<TimedAct> acts;
    private int nextAct;
    private boolean due;
    private boolean begun;
    private boolean ended;
    private boolean lost;
    private boolean gone;

    Session(Setup setup, SourceMaker maker, List<TimedAct> acts, RunListener listener) {
        source = maker.open();
        engine = new Engine(setup, listener);
        this.listener = listener;
        this.acts = acts;
        pending = engine.newReading();
    }

    /** Asks the source once; afterwards a reading may be due, or the source may have ended. */
    void fetch() {
        switch (source.next(pending)) {
            case READING -> {
                due = true;
                come();
            }
            case MALFORMED -> engine.malformed(source.problem());
            case RESTART -> engine.restarted(source.problem());
            case WAITING -> {}
            case LOST -> leave();
            case END -> end(false);
            case FAILED -> {
                engine.source("source lost", source.problem());
                end(true);
            }
        }
    }

    private void come() {
        if (!begun) {
            begun = true;
            engine.started(source.startedUtc());
        }
        if (gone) {
            gone = false;
            engine.source("source back", "readings arrive again");
        }
    }

    private void leave() {
        if (!gone) {
            gone = true;
            engine.source("source lost", source.problem());
        }
    }

    private void end(boolean early) {
        applyUntil(Long.MAX_VALUE);
        ended = true;
        lost = early;
    }

    /** Takes the reading that is due into the run. */
    void take() {
        applyUntil(pending.number);
        due = false;
        engine.step(pending);
    }

    /** The acts that were recorded before this reading. */
    private void applyUntil(long number) {
        while (nextAct < acts.size() && acts.get(nextAct).reading() < number) {
            act(acts.get(nextAct++).act());
        }
    }

    void act(Act act) {
        listener.act(new TimedAct(engine.reading(), Double.isNaN(engine.time()) ? 0 : engine.time(), act));
        engine.apply(act);
    }

    boolean due() {
        return due;
    }

    /** Run time of the reading that is due. */
    double dueTime() {
        return pending.time;
    }

    boolean ended() {
        return ended;
    }

    /** Whether it ended before the source did. */
    boolean lost() {
        return lost || gone;
    }

    boolean gone() {
        return gone;
    }

    Engine engine() {
        return engine;
    }

    Source source() {
        return source;
    }

    @Override
    public void close() {
        try {
            source.close();
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }
}
