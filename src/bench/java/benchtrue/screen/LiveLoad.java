package benchtrue.screen;

import benchtrue.source.TerminalPair;
import java.io.IOException;
import java.io.InputStream;
import java.io.OutputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Locale;
import java.util.Map;
import java.util.TreeMap;
import java.util.concurrent.TimeUnit;
import java.util.concurrent.atomic.AtomicLong;
import java.util.stream.Stream;

/**
 * The finished jar in a terminal of its own, watching 1000 lines/s in panes: bytes to the terminal for each frame, and the share
 * of a core that each of its threads takes; the one named java draws. Needs socat and script. Arguments: columns, rows, seconds.
 */
public final class LiveLoad {
    private static final int RATE = 1000;
    private static final int FRAMES = 20;
    private static final int WARM_UP_SECONDS = 20;
    private static final double TICKS = 100;
    private static final String SHEET = """
            title = "Load"
            [channels]
            I = { unit = "A" }
            V = { unit = "V", noise = 0.01 }
            [[relations]]
            equation = "V = R*I + V0"
            memory = "60 s"
            [line]
            """;

    private LiveLoad() {}

    public static void main(String[] arguments) throws Exception {
        int seconds = Integer.parseInt(arguments[2]);
        Path folder = Files.createTempDirectory("load");
        Path sheet = Files.writeString(folder.resolve("sheet.toml"), SHEET);
        try (TerminalPair pair = new TerminalPair(folder);
                OutputStream far = Files.newOutputStream(Path.of(pair.far()))) {
            String command = "stty rows " + arguments[1] + " cols " + arguments[0]
                    + "; exec java -jar target/benchtrue.jar watch " + sheet + " --port " + pair.near() + " --out "
                    + folder.resolve("run");
            ProcessBuilder builder = new ProcessBuilder("script", "-qfec", command, "/dev/null");
            builder.environment().putAll(Map.of("TERM", "xterm-256color", "LC_ALL", "C.UTF-8"));
            Process terminal = builder.start();
            AtomicLong bytes = new AtomicLong();
            start(() -> count(terminal.getInputStream(), bytes));
            start(() -> send(far));
            for (int i = 0; i < 3; i++) {
                TimeUnit.SECONDS.sleep(3);
                terminal.getOutputStream().write(0x1b); // leaves the checks before the run, whenever they come
                terminal.getOutputStream().flush();
            }
            TimeUnit.SECONDS.sleep(WARM_UP_SECONDS);
            ProcessHandle java = terminal.descendants()
                    .filter(p -> p.info().command().orElse("").endsWith("java"))
                    .findFirst()
                    .orElseThrow();
            Map<String, Double> before = threads(java.pid());
            long drawn = bytes.get();
            TimeUnit.SECONDS.sleep(seconds);
            threads(java.pid()).forEach((thread, cpu) -> {
                double share = (cpu - before.getOrDefault(thread, 0.0)) / seconds;
                if (share > 0.005) {
                    System.out.printf(Locale.ROOT, "%5.1f %% of a core: %s%n", 100 * share, thread);
                }
            });
            System.out.printf(
                    Locale.ROOT,
                    "%.0f bytes a frame at 20 frames/s%n",
                    (bytes.get() - drawn) / (double) seconds / FRAMES);
            java.destroy();
        }
        System.exit(0);
    }

    private static void start(Runnable work) {
        Thread thread = new Thread(work);
        thread.setDaemon(true);
        thread.start();
    }

    private static void count(InputStream in, AtomicLong bytes) {
        try {
            byte[] buffer = new byte[1 << 16];
            for (int count = in.read(buffer); count >= 0; count = in.read(buffer)) {
                bytes.addAndGet(count);
            }
        } catch (IOException e) {
            System.err.println(e.getMessage());
        }
    }

    private static void send(OutputStream far) {
        try {
            long start = System.nanoTime();
            for (long i = 0; true; i++) {
                long due = start + i * TimeUnit.SECONDS.toNanos(1) / RATE;
                TimeUnit.NANOSECONDS.sleep(due - System.nanoTime());
                long current = 1 + i / 7 % 5;
                double volts = 2 * current + 0.1 + 0.01 * Math.sin(i);
                far.write(
                        String.format(Locale.ROOT, "%d,%.5f%n", current, volts).getBytes(StandardCharsets.US_ASCII));
            }
        } catch (IOException | InterruptedException e) {
            System.err.println("sending ended: " + e.getMessage());
        }
    }

    /** CPU seconds of each thread. */
    private static Map<String, Double> threads(long pid) throws IOException {
        Map<String, Double> seconds = new TreeMap<>();
        try (Stream<Path> tasks = Files.list(Path.of("/proc", Long.toString(pid), "task"))) {
            for (Path task : tasks.toList()) {
                String stat = Files.readString(task.resolve("stat"));
                int end = stat.lastIndexOf(')');
                String[] fields = stat.substring(end + 2).split(" ", -1);
                double ticks = Double.parseDouble(fields[11]) + Double.parseDouble(fields[12]);
                seconds.put(stat.substring(stat.indexOf('(') + 1, end) + " " + task.getFileName(), ticks / TICKS);
            }
        }
        return seconds;
    }
}
