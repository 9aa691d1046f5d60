package benchtrue.cli;

import benchtrue.run.Closing;
import benchtrue.run.EstimateRow;
import benchtrue.run.Event;
import benchtrue.run.RunListener;
import benchtrue.run.TimedAct;
import java.util.stream.Stream;
import org.jspecify.annotations.Nullable;

/** Tells what happens to all that want to know. */
final class Listeners implements RunListener {
    private final RunListener[] listeners;

    Listeners(@Nullable RunListener... listeners) {
        this.listeners = Stream.of(listeners).filter(l -> l != null).toArray(RunListener[]::new);
    }

    @Override
    public boolean wants(long reading) {
        for (RunListener listener : listeners) {
            if (listener.wants(reading)) {
                return true;
            }
        }
        return false;
    }

    @Override
    public void reading(EstimateRow row) {
        for (RunListener listener : listeners) {
            if (listener.wants(row.reading)) {
                listener.reading(row);
            }
        }
    }

    @Override
    public void event(Event event) {
        for (RunListener listener : listeners) {
            listener.event(event);
        }
    }

    @Override
    public void act(TimedAct act) {
        for (RunListener listener : listeners) {
            listener.act(act);
        }
    }

    @Override
    public void restarted() {
        for (RunListener listener : listeners) {
            listener.restarted();
        }
    }

    @Override
    public void closed(Closing closing) {
        for (RunListener listener : listeners) {
            listener.closed(closing);
        }
    }
}
