package benchtrue.run;

import java.util.concurrent.TimeUnit;
import org.jspecify.annotations.Nullable;

/**
 * The loop of a run: what was asked, next reading, its turn, show. All of a run but its source's reader happens on the thread
 * that calls {@link #run}.
 */
public final class Runner {
    private static final long FRAME = TimeUnit.MILLISECONDS.toNanos(50);
    private static final double[] PACES = {0.5, 1, 2, 5, 10, 20, 50, 100, 200, 500, 1000, Double.POSITIVE_INFINITY};

    private final Setup setup;
    private final SourceMaker maker;
    private final SourceMaker record;
    private final Options options;
    private final RunListener listener;
    private final Desk desk;
    private final Pacer pacer;
    private Session session;
    private Views views;
    private double pace;
    private double jumpTo = Double.NEGATIVE_INFINITY;
    private boolean paused;
    private boolean toNextAlarm;
    private boolean oneStep;
    private boolean closed;
    private @Nullable Closing closing;
    private long lastShown = Long.MIN_VALUE;
    private long lastReadingNanos;

    /** @param record opens what was recorded, for the closing: of a replay the same file again */
    public Runner(
            Setup setup, SourceMaker maker, SourceMaker record, Options options, RunListener listener, Desk desk) {
        this.setup = setup;
        this.maker = maker;
        this.record = record;
        this.options = options;
        this.listener = listener;
        this.desk = desk;
        pace = options.pace();
        pacer = new Pacer(pace);
        session = new Session(setup, maker, options.acts(), listener);
        views = new Views(session.engine());
    }

    /** Runs to the end of the source or until it is closed; the summary has then been told to the listener. */
    public Closing run() throws InterruptedException {
        try {
            lastReadingNanos = System.nanoTime();
            pacer.restart(0, lastReadingNanos);
            while (!closed && (options.shown() || !session.ended())) {
                obey(desk.poll());
                advance();
                show(false);
            }
            return finish();
        } finally {
            session.close();
        }
    }

    private void advance() throws InterruptedException {
        if (paused || session.ended()) {
            close();
            obey(desk.poll(FRAME));
            return;
        }
        if (!session.due()) {
            session.fetch();
        }
        if (session.due()) {
            takeInItsTime();
        }
    }

    private void takeInItsTime() throws InterruptedException {
        long now = System.nanoTime();
        long wait = hurries() ? 0 : pacer.wait(session.dueTime(), now);
        if (wait > 0) {
            obey(desk.poll(Math.min(wait, FRAME)));
            return;
        }
        long alarms = session.engine().alarmsRaised();
        session.take();
        lastReadingNanos = now;
        closing = null;
        if (options.shown()) {
            views.reading();
        }
        boolean reached = session.engine().time() >= jumpTo && jumpTo != Double.NEGATIVE_INFINITY;
        if (oneStep || reached || (toNextAlarm && session.engine().alarmsRaised() > alarms)) {
            pause();
        }
    }

    /** Whether it goes as fast as it can to something that was asked for. */
    private boolean hurries() {
        return oneStep || toNextAlarm || jumpTo != Double.NEGATIVE_INFINITY;
    }

    private void pause() {
        paused = true;
        oneStep = false;
        toNextAlarm = false;
        jumpTo = Double.NEGATIVE_INFINITY;
    }

    private void obey(@Nullable Message first) {
        for (Message message = first; message != null; message = desk.poll()) {
            if (message instanceof Act act) {
                session.act(act);
                closing = null;
            } else if (message instanceof Control control) {
                obey(control);
            }
            lastShown = Long.MIN_VALUE;
        }
    }

    private void obey(Control control) {
        if (control instanceof Control.Close) {
            closed = true;
        } else if (control instanceof Control.Summarise) {
            closing = session.engine().reading() == 0 ? null : summarise();
        } else if (control instanceof Control.BeginSpell || control instanceof Control.EndSpell) {
            views.observe(control instanceof Control.BeginSpell);
        } else if (!setup.live()) {
            drive(control);
        }
    }

    private void drive(Control control) {
        if (control instanceof Control.Pause) {
            pause();
        } else if (control instanceof Control.Faster || control instanceof Control.Slower) {
            pace = next(control instanceof Control.Faster);
        } else if (control instanceof Control.Restart) {
            again();
        } else if (control instanceof Control.JumpTo jump) {
            if (jump.seconds() < session.engine().time()) {
                again();
            }
            jumpTo = jump.seconds();
            paused = false;
        } else {
            oneStep = control instanceof Control.Step;
            toNextAlarm = control instanceof Control.NextAlarm;
            paused = false;
        }
        double time = session.engine().time();
        pacer.pace(pace, Double.isNaN(time) ? 0 : time, System.nanoTime());
    }

    private double next(boolean faster) {
        double best = pace;
        for (double candidate : PACES) {
            if (faster ? candidate > pace : candidate < pace) {
                best = candidate;
                if (faster) {
                    return best;
                }
            }
        }
        return best;
    }

    /** Back to the first reading: nothing of the pass before is left. */
    private void again() {
        session.close();
        listener.restarted();
        session = new Session(setup, maker, options.acts(), listener);
        views = new Views(session.engine());
        closing = null;
        paused = false;
    }

    /** The summary of a run that is over is computed once, before anybody asks. */
    private void close() {
        if (session.ended() && closing == null) {
            closing = summarise();
        }
    }

    private Closing summarise() {
        return new Closer(session.engine(), record, session.lost()).close();
    }

    private Closing finish() {
        Closing last = closing == null ? summarise() : closing;
        closing = last;
        listener.closed(last);
        show(true);
        return last;
    }

    private void show(boolean always) {
        long now = System.nanoTime();
        if (!options.shown() || !(always || lastShown == Long.MIN_VALUE || now - lastShown >= FRAME)) {
            return;
        }
        lastShown = now;
        double age = setup.live() ? (now - lastReadingNanos) * 1e-9 : Double.NaN;
        desk.show(views.snapshot(phase(), pace, session.source(), age, closing));
    }

    private Snapshot.Phase phase() {
        if (session.ended() || closed) {
            return Snapshot.Phase.ENDED;
        }
        if (session.gone()) {
            return Snapshot.Phase.LOST;
        }
        if (session.engine().reading() == 0) {
            return Snapshot.Phase.WAITING;
        }
        return paused ? Snapshot.Phase.PAUSED : Snapshot.Phase.RUNNING;
    }
}
