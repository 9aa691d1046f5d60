package benchtrue.run;

import java.util.concurrent.LinkedBlockingQueue;
import java.util.concurrent.TimeUnit;
import java.util.concurrent.atomic.AtomicReference;
import org.jspecify.annotations.Nullable;

/** Where screen and run meet: messages go one way, snapshots the other. Neither ever waits for the other. */
public final class Desk {
    private final LinkedBlockingQueue<Message> inbox = new LinkedBlockingQueue<>();
    private final AtomicReference<@Nullable Snapshot> latest = new AtomicReference<>();

    /** What the operator wants; taken by the run between two readings. */
    public void send(Message message) {
        inbox.add(message);
    }

    /** Null until the run has shown itself. */
    public @Nullable Snapshot snapshot() {
        return latest.get();
    }

    void show(Snapshot snapshot) {
        latest.set(snapshot);
    }

    @Nullable
    Message poll() {
        return inbox.poll();
    }

    /** Waits for a message, at most so long. */
    @Nullable
    Message poll(long nanos) throws InterruptedException {
        return inbox.poll(nanos, TimeUnit.NANOSECONDS);
    }
}
