package benchtrue.cli;

import static org.assertj.core.api.Assertions.assertThat;

import benchtrue.source.TerminalPair;
import java.io.IOException;
import java.io.OutputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Duration;
import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;
import java.util.concurrent.TimeUnit;
import org.awaitility.Awaitility;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.Timeout;
import org.junit.jupiter.api.io.TempDir;

/** Live runs of the finished jar on a real pseudo-terminal pair. */
@Tag("end-to-end")
@Timeout(900)
final class WatchTest {
    private static final int CUTS = Integer.getInteger("cuts", 8);
    private static final int KILLS = Integer.getInteger("kills", 8);

    @TempDir
    private Path folder;

    private Path sheet;
    private Path run;
    private Path out;

    @BeforeEach
    void writeTheSheet() throws IOException {
        sheet = Files.writeString(folder.resolve("resistor.toml"), Bench.SHEET);
        run = folder.resolve("run");
        out = folder.resolve("out.txt");
    }

    private Process watch(TerminalPair pair) throws IOException {
        Process process =
                Bench.start(out, "watch", sheet.toString(), "--plain", "--port", pair.near(), "--out", run.toString());
        awaitFile("raw.log");
        awaitOpen();
        return process;
    }

    private void awaitFile(String name) {
        Awaitility.await().atMost(Duration.ofSeconds(30)).until(() -> Files.exists(run.resolve(name)));
    }

    private void awaitOpen() {
        Awaitility.await()
                .atMost(Duration.ofSeconds(30))
                .until(() -> Files.readString(out).contains("Listening to"));
        sleep(200);
    }

    private static void sleep(long millis) {
        try {
            TimeUnit.MILLISECONDS.sleep(millis);
        } catch (InterruptedException e) {
            throw new IllegalStateException(e);
        }
    }

    private void awaitRecorded(int count) {
        Awaitility.await()
                .atMost(Duration.ofSeconds(90))
                .pollInterval(Duration.ofMillis(100))
                .until(() -> Bench.recorded(run).size() >= count);
    }

    private static void end(Process process) throws InterruptedException, IOException {
        new ProcessBuilder("kill", "-TERM", Long.toString(process.pid()))
                .start()
                .waitFor();
        assertThat(process.waitFor(60, TimeUnit.SECONDS)).isTrue();
    }

    private static List<String> sent(int from, int to) {
        List<String> lines = new ArrayList<>();
        for (int i = from; i < to; i++) {
            lines.add(Bench.line(i));
        }
        return lines;
    }

    private void assertReplayGivesTheSameEstimates() throws IOException, InterruptedException {
        Path again = folder.resolve("again");
        Bench.run(folder.resolve("replay.txt"), "replay", run.toString(), "--out", again.toString(), "--yes");
        assertThat(again.resolve("estimates.csv")).hasSameBinaryContentAs(run.resolve("estimates.csv"));
    }

    @Test
    void losesAndAltersNothingAtTheSpeedOfThePair() throws Exception {
        int count = Integer.getInteger("lines", 200_000);
        try (TerminalPair pair = new TerminalPair(folder);
                OutputStream far = Files.newOutputStream(Path.of(pair.far()))) {
            Process process = watch(pair);
            for (int i = 0; i < count; i += 1000) {
                far.write(Bench.lines(i, Math.min(count, i + 1000)));
            }
            awaitRecorded(count - 1);
            end(process);
        }
        // The first line after opening could be a part of one: kept raw, not used.
        assertThat(Bench.recorded(run)).isEqualTo(sent(1, count));
        try (var raw = Files.lines(run.resolve("raw.log"))) {
            assertThat(raw.map(l -> l.substring(l.indexOf('\t') + 1)).toList())
                    .isEqualTo(
                            sent(0, count).stream().map(l -> l + "\\x0D\\x0A").toList());
        }
        assertThat(run.resolve("summary.txt")).isNotEmptyFile();
        assertReplayGivesTheSameEstimates();
    }

    @Test
    void comesBackEachTimeTheFarEndDoes() throws Exception {
        Path place = folder.resolve("pair");
        Files.createDirectory(place);
        Process process;
        try (TerminalPair pair = new TerminalPair(place)) {
            process = watch(pair);
        }
        int line = 0;
        List<String> expected = new ArrayList<>();
        for (int cut = 0; cut < CUTS; cut++) {
            try (TerminalPair pair = new TerminalPair(place);
                    OutputStream far = Files.newOutputStream(Path.of(pair.far()))) {
                sleep(1500); // an open port within 2 s of its return
                far.write(Bench.lines(line, line + 20));
                expected.addAll(sent(line + 1, line + 20));
                line += 20;
                awaitRecorded(expected.size());
            }
        }
        Duration used = process.info().totalCpuDuration().orElse(Duration.ZERO);
        sleep(2000);
        Duration after = process.info().totalCpuDuration().orElse(Duration.ZERO);
        assertThat(after.minus(used)).as("no busy loop while the line is gone").isLessThan(Duration.ofMillis(700));
        end(process);
        assertThat(Bench.recorded(run)).isEqualTo(expected);
        String events = Files.readString(run.resolve("events.csv"));
        assertThat(events.lines().filter(l -> l.contains("source lost")).count())
                .isGreaterThanOrEqualTo(CUTS);
        assertThat(events.lines().filter(l -> l.contains("source back")).count())
                .isEqualTo(CUTS);
        assertReplayGivesTheSameEstimates();
    }

    @Test
    void killedAtAnyInstantItMissesAtMostTheLast50MillisecondsAndGoesOn() throws Exception {
        SplittableRandom random = new SplittableRandom(17);
        try (TerminalPair pair = new TerminalPair(folder);
                OutputStream far = Files.newOutputStream(Path.of(pair.far()))) {
            Process process = watch(pair);
            int line = 0;
            int kept = 0;
            long rawBefore = 0;
            List<int[]> alive = new ArrayList<>();
            for (int kill = 0; kill < KILLS; kill++) {
                long until = System.nanoTime() + TimeUnit.MILLISECONDS.toNanos(300 + random.nextInt(700));
                int first = line;
                List<Long> times = new ArrayList<>();
                while (System.nanoTime() < until) {
                    times.add(System.nanoTime());
                    far.write(Bench.lines(line, line + 1));
                    line++;
                    sleep(2);
                }
                long killedAt = System.nanoTime();
                process.destroyForcibly().waitFor();
                long allowed = 50_000_000L + longestGap(times);
                int safe =
                        (int) times.stream().filter(t -> killedAt - t > allowed).count();
                long inRaw = rawLines();
                assertThat(inRaw - rawBefore)
                        .as("kill %d, the program said:%n%s", kill, Files.readString(out))
                        .isGreaterThanOrEqualTo(safe);
                rawBefore = inRaw;
                int now = Bench.recorded(run).size();
                alive.add(new int[] {first + 1, now - kept});
                kept = now;
                Bench.run(folder.resolve("replay.txt"), "replay", run.toString(), "--plain");
                assertThat(folder.resolve("replay.txt")).content().contains("TEST RECORD");
                process = Bench.start(out, "watch", "--resume", run.toString(), "--plain", "--port", pair.near());
                awaitOpen();
            }
            far.write(Bench.lines(line, line + 5));
            awaitRecorded(kept + 4);
            end(process);
            List<String> expected = new ArrayList<>();
            alive.forEach(a -> expected.addAll(sent(a[0], a[0] + a[1])));
            assertThat(Bench.recorded(run).subList(0, expected.size())).isEqualTo(expected);
        }
        String acts = Files.readString(run.resolve("acts.csv"));
        // A resumption that was killed before its first reading left no segment.
        assertThat(acts.lines().filter(l -> l.contains("resumed")).count())
                .isPositive()
                .isLessThanOrEqualTo(KILLS);
        assertReplayGivesTheSameEstimates();
    }

    /** Whole lines of raw.log. */
    private long rawLines() throws IOException {
        return Files.readString(run.resolve("raw.log"))
                .chars()
                .filter(c -> c == '\n')
                .count();
    }

    /** What a machine that is busy with other work adds to every delay. */
    private static long longestGap(List<Long> times) {
        long longest = 0;
        for (int i = 1; i < times.size(); i++) {
            longest = Math.max(longest, times.get(i) - times.get(i - 1));
        }
        return longest;
    }

    @Test
    void whatADeviceMaySendIsShownAndStoredHarmlessly() throws Exception {
        String fields = "1,2,3,4,5,6,7,8,9,10,11,12,13,14,15,16,17,18,19,20";
        String wildest = String.join("\r\n", "\u001b[2J\u001b]0;x\u0007", "1.0\0,2.1", fields, "");
        byte[] wild = wildest.getBytes(StandardCharsets.ISO_8859_1);
        byte[] invalid = {
            (byte) 0xC3, 0x28, (byte) 0xFF, (byte) 0xFE, '\r', '\n', (byte) 0xB1, (byte) 0x2C, (byte) 0xB2, '\r', '\n'
        };
        byte[] endless = "7".repeat(1 << 20).getBytes(StandardCharsets.US_ASCII);
        try (TerminalPair pair = new TerminalPair(folder);
                OutputStream far = Files.newOutputStream(Path.of(pair.far()))) {
            Process process = watch(pair);
            far.write(Bench.lines(0, 100));
            far.write(wild);
            far.write(invalid);
            far.write(endless);
            far.write("\r\n".getBytes(StandardCharsets.US_ASCII));
            far.write(Bench.lines(100, 200));
            awaitRecorded(199);
            end(process);
        }
        assertThat(Bench.recorded(run)).isEqualTo(sent(1, 200));
        for (String file : List.of("raw.log", "events.csv", "readings.csv", "summary.txt")) {
            String text = Files.readString(run.resolve(file), StandardCharsets.UTF_8);
            assertThat(text.chars()).allMatch(c -> c == '\n' || c == '\t' || !Character.isISOControl(c));
        }
        assertThat(Files.readString(out).chars()).allMatch(c -> c == '\n' || !Character.isISOControl(c));
        assertThat(run.resolve("raw.log"))
                .content()
                .contains("\\x1B[2J\\x1B]0;x\\x07")
                .contains("\\xC3(\\xFF\\xFE");
    }

    @Test
    void aPortThatIsNotThereIsSaidSo() throws Exception {
        String said = Bench.run(
                out, "watch", sheet.toString(), "--port", folder.resolve("none").toString(), "--out", run.toString());
        assertThat(said).contains("none: there is no such port").contains("benchtrue ports");
    }

    @Test
    void whenTheDiskIsFullTheRunGoesOnAndSaysSo() throws Exception {
        try (TerminalPair pair = new TerminalPair(folder);
                OutputStream far = Files.newOutputStream(Path.of(pair.far()))) {
            Process process = watch(pair);
            far.write(Bench.lines(0, 100));
            awaitRecorded(99);
            Files.delete(run.resolve("readings.csv"));
            far.write(Bench.lines(100, 200));
            Awaitility.await()
                    .atMost(Duration.ofSeconds(20))
                    .until(() -> Files.readString(out).contains("readings.csv: cannot be written"));
            far.write(Bench.lines(200, 300));
            sleep(500);
            assertThat(process.isAlive()).isTrue();
            new ProcessBuilder("kill", "-TERM", Long.toString(process.pid()))
                    .start()
                    .waitFor();
            process.waitFor();
        }
        assertThat(Files.readAllLines(run.resolve("raw.log"))).hasSizeGreaterThanOrEqualTo(300);
    }
}
