package benchtrue.record;

import benchtrue.sheet.BenchSheet;
import benchtrue.sheet.Channel;
import benchtrue.source.Failure;
import benchtrue.source.RawBytes;
import benchtrue.source.Recording;
import com.fasterxml.jackson.core.io.NumberOutput;
import java.io.Closeable;
import java.io.IOException;
import java.nio.file.Path;
import java.time.Instant;
import java.time.ZoneOffset;
import java.time.format.DateTimeFormatter;
import java.util.Arrays;
import java.util.Locale;
import java.util.concurrent.ArrayBlockingQueue;
import java.util.concurrent.CountDownLatch;
import java.util.concurrent.TimeUnit;
import java.util.concurrent.atomic.AtomicLong;
import java.util.function.Consumer;
import java.util.stream.Collectors;

/**
 * raw.log and readings.csv of a live run, written by a thread of its own: whole lines, in the files within some 10 ms, forced
 * onto the disk once a second. What the disk does not take is dropped and told; once it takes again, the record goes on.
 */
public final class Recorder implements Recording, Closeable {
    static final String RAW = "raw.log";
    static final String READINGS = "readings.csv";

    private static final int WAITING = 1 << 18;
    private static final long LOOK_MILLIS = 10;
    private static final long FORCE_NANOS = TimeUnit.SECONDS.toNanos(1);
    private static final double MICROS = 1e6;
    private static final DateTimeFormatter STAMP = DateTimeFormatter.ofPattern(
                    "uuuu-MM-dd'T'HH:mm:ss.SSSSSS'Z'", Locale.ROOT)
            .withZone(ZoneOffset.UTC);

    /** A line of raw.log, values of a reading, a line that was not read ({@code values} empty), or a call to settle. */
    private record Entry(long utcMicros, byte[] raw, double[] values, CountDownLatch settled) {}

    private static final byte[] NO_BYTES = {};
    private static final double[] NO_VALUES = {};
    private static final CountDownLatch NOBODY = new CountDownLatch(0);

    private final ArrayBlockingQueue<Entry> entries = new ArrayBlockingQueue<>(WAITING);
    private final AtomicLong dropped = new AtomicLong();
    private final Consumer<String> trouble;
    private final AppendedFile raw;
    private final AppendedFile readings;
    private final int channels;
    private final Thread thread;
    private long zero;
    private volatile boolean closed;

    /**
     * Opens the files, or goes on with those that are there.
     *
     * @param zeroMicros µs since 1970 at which the arrivals of raw.log begin to count
     * @param trouble may be called by the recorder's thread
     * @throws IOException where a file cannot be opened
     */
    public Recorder(Path folder, BenchSheet sheet, long zeroMicros, Consumer<String> trouble) throws IOException {
        this.trouble = trouble;
        zero = zeroMicros;
        channels = sheet.channels().size();
        raw = new AppendedFile(folder.resolve(RAW));
        readings = new AppendedFile(folder.resolve(READINGS));
        if (readings.isEmpty()) {
            readings.add(sheet.channels().stream().map(Channel::name).collect(Collectors.joining(",", "time,", "\n")));
            readings.write();
        }
        thread = new Thread(this::work, "recorder");
        thread.setDaemon(true);
        thread.start();
    }

    @Override
    public void raw(long utcMicros, byte[] line) {
        put(new Entry(utcMicros, line, NO_VALUES, NOBODY));
    }

    @Override
    public void reading(long utcMicros, double[] values) {
        put(new Entry(utcMicros, NO_BYTES, Arrays.copyOf(values, values.length), NOBODY));
    }

    @Override
    public void unread(long utcMicros) {
        put(new Entry(utcMicros, NO_BYTES, NO_VALUES, NOBODY));
    }

    private void put(Entry entry) {
        if (!entries.offer(entry)) {
            dropped.incrementAndGet();
        }
    }

    /** Returns when all that was recorded so far is in the files, or cannot get there. */
    public void settle() {
        CountDownLatch settled = new CountDownLatch(1);
        try {
            entries.put(new Entry(0, NO_BYTES, NO_VALUES, settled));
            settled.await();
        } catch (InterruptedException e) {
            Thread.currentThread().interrupt();
        }
    }

    private void work() {
        long forced = System.nanoTime();
        while (!(closed && entries.isEmpty())) {
            try {
                Entry first = entries.poll(LOOK_MILLIS, TimeUnit.MILLISECONDS);
                if (first != null) {
                    take(first);
                }
            } catch (InterruptedException e) {
                closed = true;
            }
            write();
            if (System.nanoTime() - forced >= FORCE_NANOS) {
                forced = System.nanoTime();
                force();
            }
        }
        force();
        raw.close();
        readings.close();
    }

    /** One entry, and all others that wait. */
    private void take(Entry first) {
        int most = 1 << 12;
        for (Entry entry = first; entry != null; entry = --most > 0 ? entries.poll() : null) {
            if (entry.settled().getCount() > 0) {
                write();
                entry.settled().countDown();
            } else if (entry.raw().length > 0) {
                raw.add(rawLine(entry));
            } else {
                readings.add(row(entry));
            }
        }
    }

    private String rawLine(Entry entry) {
        if (zero == 0) {
            zero = entry.utcMicros();
        }
        return String.format(Locale.ROOT, "%.6f\t", (entry.utcMicros() - zero) / MICROS) + RawBytes.text(entry.raw())
                + "\n";
    }

    private String row(Entry entry) {
        long micros = entry.utcMicros();
        Instant time =
                Instant.ofEpochSecond(Math.floorDiv(micros, 1_000_000L), Math.floorMod(micros, 1_000_000L) * 1000L);
        StringBuilder row = new StringBuilder(STAMP.format(time));
        if (entry.values().length == 0) {
            return row.append(",unread")
                    .append(",".repeat(channels - 1))
                    .append('\n')
                    .toString();
        }
        for (double value : entry.values()) {
            row.append(',').append(Double.isNaN(value) ? "" : NumberOutput.toString(value, true));
        }
        return row.append('\n').toString();
    }

    private void write() {
        tell(raw.write(), raw);
        tell(readings.write(), readings);
        long lost = dropped.getAndSet(0);
        if (lost > 0) {
            trouble.accept(lost + " lines could not be recorded: the disk is too slow. The run goes on.");
        }
    }

    private void force() {
        tell(raw.force(), raw);
        tell(readings.force(), readings);
    }

    private void tell(AppendedFile.Change change, AppendedFile file) {
        switch (change) {
            case NONE -> {}
            case FAILED ->
                trouble.accept(file.path() + ": cannot be written (" + Failure.words(file.failure())
                        + "). The run goes on, its record does not: free space or bring the folder back.");
            case BACK -> trouble.accept(file.path() + ": is written again; " + file.missing() + " lines are missing");
        }
    }

    /** Writes what waits, forces it onto the disk and ends. */
    @Override
    public void close() {
        closed = true;
        try {
            thread.join();
        } catch (InterruptedException e) {
            Thread.currentThread().interrupt();
        }
    }
}
