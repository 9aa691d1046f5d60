package benchtrue.screen;

import benchtrue.record.Recorder;
import benchtrue.run.Closing;
import benchtrue.run.Control;
import benchtrue.run.Desk;
import benchtrue.run.EstimateRow;
import benchtrue.run.Event;
import benchtrue.run.Options;
import benchtrue.run.RunListener;
import benchtrue.run.Runner;
import benchtrue.run.Setup;
import benchtrue.sheet.BenchSheet;
import benchtrue.sheet.SheetReader;
import benchtrue.sheet.SheetReading;
import benchtrue.source.BareLines;
import benchtrue.source.Recorded;
import benchtrue.source.SerialSource;
import benchtrue.source.TerminalPair;
import com.googlecode.lanterna.TerminalSize;
import com.googlecode.lanterna.screen.TerminalScreen;
import com.googlecode.lanterna.terminal.virtual.DefaultVirtualTerminal;
import java.io.OutputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Collections;
import java.util.List;
import java.util.Objects;
import java.util.concurrent.FutureTask;
import java.util.concurrent.TimeUnit;
import java.util.concurrent.atomic.AtomicLongArray;
import java.util.concurrent.locks.LockSupport;
import org.HdrHistogram.Histogram;

/**
 * From the moment a line is written to its estimate and alarm decision, at 1000 lines/s over a pseudo-terminal with panes being
 * drawn, beside a loop that only reads lines from another pair, in one run. Arguments: seconds (30).
 */
public final class LatencyBench {
    private static final int RATE = 1000;
    private static final int WARM_UP = 5000;
    private static final String SHEET = """
            title = "Latency"
            [channels]
            sent = { unit = "us" }
            I = { unit = "A" }
            V = { unit = "V", noise = 0.01 }
            [[relations]]
            equation = "V = R*I + V0"
            memory = "60 s"
            [line]
            """;

    private final Histogram whole = new Histogram(3);
    private final Histogram bare = new Histogram(3);
    private final long start = System.nanoTime();
    private final AtomicLongArray sent = new AtomicLongArray(1 << 24);

    public static void main(String[] arguments) throws Exception {
        new LatencyBench().run(arguments.length > 0 ? Integer.parseInt(arguments[0]) : 30);
    }

    private long micros() {
        return (System.nanoTime() - start) / 1000;
    }

    private void run(int seconds) throws Exception {
        Path folder = Files.createTempDirectory("latency");
        Path other = Files.createDirectory(folder.resolve("other"));
        SheetReading read = SheetReader.read("sheet", SHEET.getBytes(StandardCharsets.UTF_8));
        BenchSheet sheet = Objects.requireNonNull(read.sheet(), read.mistakes().toString());
        try (TerminalPair pair = new TerminalPair(folder);
                TerminalPair second = new TerminalPair(other);
                Recorder recorder = new Recorder(folder, sheet, 0, System.err::println);
                OutputStream far = Files.newOutputStream(Path.of(pair.far()));
                OutputStream farOther = Files.newOutputStream(Path.of(second.far()))) {
            SerialSource source = SerialSource.open(pair.near(), sheet, Recorded.NOTHING, recorder);
            Desk desk = new Desk();
            Setup setup = new Setup(sheet, true, "serial", "latency", null, Collections.singletonList(null));
            Options options = new Options(Double.POSITIVE_INFINITY, true, List.of());
            Runner runner = new Runner(setup, () -> source, () -> source, options, new Timed(), desk);
            FutureTask<Closing> run = new FutureTask<>(runner::run);
            new Thread(run, "run").start();
            Thread drawing = new Thread(() -> draw(desk), "screen");
            drawing.setDaemon(true);
            drawing.start();
            Thread reading = new Thread(() -> BareLines.read(second.near(), t -> record(bare, t)), "bare");
            reading.setDaemon(true);
            reading.start();
            TimeUnit.SECONDS.sleep(2);
            send(far, farOther, seconds * RATE);
            TimeUnit.MILLISECONDS.sleep(500);
            print("estimate and decision", whole);
            print("reading lines only   ", bare);
            desk.send(new Control.Close());
        }
        System.exit(0);
    }

    private void record(Histogram histogram, double sent) {
        histogram.recordValue(Math.max(0, micros() - (long) sent));
    }

    private void send(OutputStream far, OutputStream other, int count) throws Exception {
        long next = System.nanoTime();
        for (int i = 0; i < count; i++) {
            next += TimeUnit.SECONDS.toNanos(1) / RATE;
            while (System.nanoTime() < next) {
                LockSupport.parkNanos(next - System.nanoTime());
            }
            int current = 1 + i / 7 % 5;
            if (i == WARM_UP) {
                whole.reset();
                bare.reset();
            }
            sent.set(i, micros());
            far.write((micros() + "," + current + "," + (2 * current + 0.1 + 0.01 * Math.sin(i)) + "\n")
                    .getBytes(StandardCharsets.US_ASCII));
            other.write((micros() + "," + current + ",1\n").getBytes(StandardCharsets.US_ASCII));
        }
    }

    private static void print(String what, Histogram histogram) {
        System.out.printf(
                "%s: %d lines, median %d µs, p99 %d µs, p99.9 %d µs, greatest %d µs%n",
                what,
                histogram.getTotalCount(),
                histogram.getValueAtPercentile(50),
                histogram.getValueAtPercentile(99),
                histogram.getValueAtPercentile(99.9),
                histogram.getMaxValue());
    }

    private static void draw(Desk desk) {
        try {
            TerminalScreen screen = new TerminalScreen(new DefaultVirtualTerminal(new TerminalSize(120, 36)));
            screen.startScreen();
            new RunScreen(screen, desk, false, "", c -> "").show(() -> false);
        } catch (Exception e) {
            throw new IllegalStateException(e);
        }
    }

    /** Told after estimate and decision of each reading. */
    private final class Timed implements RunListener {
        @Override
        public void reading(EstimateRow row) {
            record(whole, sent.get((int) row.reading)); // the first line after opening is no reading
        }

        @Override
        public void event(Event event) {}

        @Override
        public void closed(Closing closing) {}
    }
}
