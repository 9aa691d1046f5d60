package benchtrue.source;

import benchtrue.sheet.BenchSheet;
import benchtrue.sheet.LineSpec;
import benchtrue.sheet.PollSpec;
import java.io.IOException;
import java.util.concurrent.ArrayBlockingQueue;
import java.util.concurrent.TimeUnit;
import java.util.concurrent.atomic.AtomicLong;
import org.jspecify.annotations.Nullable;

/** The thread that asks: round after round, it hands on what came and opens the port again when it is gone. */
final class PolledReader implements Runnable, KeptPort.Listener {
    /** Hours of rounds at the usual pace. */
    private static final int WAITING = 1 << 14;

    private final BenchSheet sheet;
    private final PollSpec poll;
    private final Poller poller;
    private final KeptPort port;
    private final ArrivalClock clock;
    private final Recording recording;
    private final ArrayBlockingQueue<Event> events = new ArrayBlockingQueue<>(WAITING);
    private final AtomicLong lost = new AtomicLong();
    private volatile @Nullable Thread thread;

    /** What is handed on; times are µs since 1970-01-01T00:00Z and rise from one to the next. */
    sealed interface Event {}

    record Answers(long utcMicros, double[] values) implements Event {}

    /** A question without a sound answer, or whose answer is no value. */
    record Trouble(long utcMicros, String problem) implements Event {}

    record Gone(String why) implements Event {}

    record Back() implements Event {}

    /** @param link open */
    PolledReader(
            String port,
            BenchSheet sheet,
            PollSpec poll,
            LineSpec line,
            PortLink link,
            ArrivalClock clock,
            Recording recording) {
        this.sheet = sheet;
        this.poll = poll;
        poller = Poller.of(poll, line);
        this.port = new KeptPort(port, line, link, this);
        this.clock = clock;
        this.recording = recording;
    }

    @Override
    public void run() {
        thread = Thread.currentThread();
        for (PortLink open = port.open(); open != null; open = port.open()) {
            ask(open);
        }
    }

    private void ask(PortLink open) {
        PolledLine line = new PolledLine(sheet, poll, poller, open, Ticker.SYSTEM);
        try {
            while (!port.isClosed()) {
                hand(line.next());
            }
        } catch (IOException e) {
            port.lost();
        } catch (InterruptedException e) {
            port.close(); // the run is over
        }
    }

    private void hand(Polled polled) {
        long first = Long.MIN_VALUE;
        for (int channel = 0; channel < polled.answers().length; channel++) {
            if (polled.answers()[channel].length > 0) {
                long stamp = clock.stamp(polled.stamps()[channel]);
                first = first == Long.MIN_VALUE ? stamp : first;
                recording.raw(stamp, polled.answers()[channel]);
            }
        }
        if (polled.answered()) {
            put(new Answers(first, polled.values()));
        }
        for (String problem : polled.problems()) {
            put(new Trouble(clock.stamp(System.nanoTime()), problem));
        }
    }

    @Override
    public void gone(String why) {
        put(new Gone(why));
    }

    @Override
    public void back() {
        put(new Back());
    }

    private void put(Event event) {
        if (!events.offer(event)) {
            lost.incrementAndGet();
        }
    }

    /** The next, or null where nothing comes within the time. */
    @Nullable
    Event next(long millis) throws InterruptedException {
        return events.poll(millis, TimeUnit.MILLISECONDS);
    }

    long lost() {
        return lost.get();
    }

    int queued() {
        return events.size();
    }

    void close() {
        port.close();
        Thread asking = thread;
        if (asking != null) {
            asking.interrupt(); // it may wait for the next round
        }
    }
}
