package benchtrue.cli;

import benchtrue.run.Control;
import benchtrue.run.Desk;
import java.util.concurrent.CountDownLatch;
import java.util.concurrent.TimeUnit;

/**
 * Lets a run that is told to end by a signal end as by its own key: files closed, terminal restored, summary printed. The
 * program stays until that is done.
 */
final class Departure {
    private static final long PATIENCE = 20;

    private final CountDownLatch gone = new CountDownLatch(1);
    private final Thread hook;

    private Departure(Desk desk) {
        hook = new Thread(() -> leave(desk), "departure");
        Runtime.getRuntime().addShutdownHook(hook);
    }

    static Departure of(Desk desk) {
        return new Departure(desk);
    }

    private void leave(Desk desk) {
        desk.send(new Control.Close());
        try {
            gone.await(PATIENCE, TimeUnit.SECONDS);
        } catch (InterruptedException e) {
            Thread.currentThread().interrupt();
        }
    }

    /** All that must be seen has been printed. */
    void done() {
        gone.countDown();
        try {
            Runtime.getRuntime().removeShutdownHook(hook);
        } catch (IllegalStateException e) {
            // It is running: a signal is what ends the program.
        }
    }
}
