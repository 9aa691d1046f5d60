package benchtrue.source;

import benchtrue.sheet.LineSpec;
import java.util.Arrays;
import java.util.concurrent.ArrayBlockingQueue;
import java.util.concurrent.TimeUnit;
import java.util.concurrent.atomic.AtomicLong;
import org.jspecify.annotations.Nullable;

/**
 * The thread at the line: reads bytes, stamps and splits them, hands lines on and opens the port again when it is gone. It
 * waits for nothing but the line: where nobody takes what it hands on, lines are dropped and counted.
 */
final class SerialReader implements Runnable, FrameSink, KeptPort.Listener {
    /** Lines that may wait: some seconds of a fast instrument. */
    private static final int WAITING = 1 << 18;

    private static final int BUFFER = 1 << 13;

    private final LineSpec spec;
    private final KeptPort port;
    private final ArrivalClock clock;
    private final Recording recording;
    private final ArrayBlockingQueue<Arrival> arrivals = new ArrayBlockingQueue<>(WAITING);
    private final AtomicLong lost = new AtomicLong();
    private boolean first = true;

    /** @param link open */
    SerialReader(String port, LineSpec spec, PortLink link, ArrivalClock clock, Recording recording) {
        this.spec = spec;
        this.port = new KeptPort(port, spec, link, this);
        this.clock = clock;
        this.recording = recording;
    }

    @Override
    public void run() {
        byte[] buffer = new byte[BUFFER];
        for (PortLink open = port.open(); open != null; open = port.open()) {
            read(open, buffer);
        }
    }

    @Override
    public void gone(String why) {
        put(new Arrival(clock.stamp(System.nanoTime()), null, false, why));
    }

    @Override
    public void back() {
        put(new Arrival(clock.stamp(System.nanoTime()), null, true, ""));
    }

    private void read(PortLink open, byte[] buffer) {
        Framer framer = new Framer(spec);
        first = true;
        while (!port.isClosed()) {
            int count = open.read(buffer);
            if (count < 0) {
                port.lost();
                return;
            }
            framer.add(buffer, 0, count, System.nanoTime(), this);
        }
    }

    @Override
    public void frame(byte[] bytes, int from, int to, int end, long firstByteNanos, boolean cutShort) {
        long stamp = clock.stamp(firstByteNanos);
        recording.raw(stamp, Arrays.copyOf(bytes, end));
        put(new Arrival(stamp, Arrays.copyOfRange(bytes, from, to), !first && !cutShort, ""));
        first = false;
    }

    private void put(Arrival arrival) {
        if (!arrivals.offer(arrival)) {
            lost.incrementAndGet();
        }
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
        port.close();
    }
}
