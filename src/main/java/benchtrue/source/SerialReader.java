package benchtrue.source;

import benchtrue.sheet.LineSpec;
import java.io.IOException;
import java.util.Arrays;
import java.util.concurrent.ArrayBlockingQueue;
import java.util.concurrent.TimeUnit;
import java.util.concurrent.atomic.AtomicLong;
import org.jspecify.annotations.Nullable;

/**
 * The thread at the line: reads bytes, stamps and splits them, hands lines on and opens the port again when it is gone. It
 * waits for nothing but the line: where nobody takes what it hands on, lines are dropped and counted.
 */
final class SerialReader implements Runnable, FrameSink {
    /** Lines that may wait: some seconds of a fast instrument. */
    private static final int WAITING = 1 << 18;

    private static final int BUFFER = 1 << 13;
    private static final long FIRST_PAUSE_MILLIS = 100;
    private static final long LONGEST_PAUSE_MILLIS = 1000;

    private final String port;
    private final LineSpec spec;
    private final ArrivalClock clock;
    private final Recording recording;
    private final ArrayBlockingQueue<Arrival> arrivals = new ArrayBlockingQueue<>(WAITING);
    private final AtomicLong lost = new AtomicLong();
    private volatile @Nullable PortLink link;
    private volatile boolean closed;
    private boolean first = true;

    /** @param link open */
    SerialReader(String port, LineSpec spec, PortLink link, ArrivalClock clock, Recording recording) {
        this.port = port;
        this.spec = spec;
        this.link = link;
        this.clock = clock;
        this.recording = recording;
    }

    @Override
    public void run() {
        byte[] buffer = new byte[BUFFER];
        while (!closed) {
            PortLink open = link;
            if (open == null) {
                open = reopened();
            }
            if (open != null) {
                read(open, buffer);
            }
        }
    }

    private void read(PortLink open, byte[] buffer) {
        Framer framer = new Framer(spec);
        first = true;
        while (!closed) {
            int count = open.read(buffer);
            if (count < 0) {
                open.close();
                link = null;
                if (!closed) {
                    put(new Arrival(clock.stamp(System.nanoTime()), null, false, "the line is gone"));
                }
                return;
            }
            framer.add(buffer, 0, count, System.nanoTime(), this);
        }
    }

    @Override
    public void frame(byte[] bytes, int from, int to, int end, long firstByteNanos, boolean cutShort) {
        long stamp = clock.stamp(firstByteNanos);
        recording.raw(stamp, Arrays.copyOfRange(bytes, from, end));
        put(new Arrival(stamp, Arrays.copyOfRange(bytes, from, to), !first && !cutShort, ""));
        first = false;
    }

    private void put(Arrival arrival) {
        if (!arrivals.offer(arrival)) {
            lost.incrementAndGet();
        }
    }

    /** A fresh port for each attempt: an old one may hang on a name that now means another device. */
    private @Nullable PortLink reopened() {
        long pause = FIRST_PAUSE_MILLIS;
        String told = "";
        while (!closed) {
            try {
                TimeUnit.MILLISECONDS.sleep(pause);
                PortLink fresh = PortLink.open(port, spec);
                link = fresh;
                if (closed) {
                    fresh.close();
                    return null;
                }
                put(new Arrival(clock.stamp(System.nanoTime()), null, true, ""));
                return fresh;
            } catch (IOException e) {
                String why = String.valueOf(e.getMessage());
                if (!why.equals(told)) {
                    told = why;
                    put(new Arrival(clock.stamp(System.nanoTime()), null, false, why));
                }
                pause = Math.min(2 * pause, LONGEST_PAUSE_MILLIS);
            } catch (InterruptedException e) {
                closed = true;
            }
        }
        return null;
    }

    /** The next that arrived, or null where nothing does within the time. */
    @Nullable
    Arrival poll(long millis) throws InterruptedException {
        return arrivals.poll(millis, TimeUnit.MILLISECONDS);
    }

    long lost() {
        return lost.get();
    }

    int queued() {
        return arrivals.size();
    }

    void close() {
        closed = true;
        PortLink open = link;
        if (open != null) {
            open.close();
        }
    }
}
