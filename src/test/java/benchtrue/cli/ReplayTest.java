package benchtrue.cli;

import static org.assertj.core.api.Assertions.assertThat;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import com.fasterxml.jackson.core.JsonFactory;
import com.fasterxml.jackson.core.JsonParser;
import com.fasterxml.jackson.core.JsonToken;
import java.io.BufferedWriter;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.stream.Stream;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.Timeout;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Replays with the finished jar, piped: plain lines, files, exit statuses. */
@Tag("end-to-end")
@Timeout(240)
final class ReplayTest {
    private static final String FIRST = "replays/gear-pump";

    @TempDir
    private Path folder;

    private record Ended(int status, String out, String err) {}

    private Ended run(String... arguments) throws IOException, InterruptedException {
        return run(List.of(java(System.getProperty("java.home"))), arguments);
    }

    private static String java(String home) {
        return Path.of(home, "bin", "java").toString();
    }

    private Ended run(List<String> java, String... arguments) throws IOException, InterruptedException {
        List<String> command = new ArrayList<>(java);
        command.addAll(List.of("-jar", System.getProperty("benchtrue.jar")));
        command.addAll(List.of(arguments));
        Path out = folder.resolve("out");
        Path err = folder.resolve("err");
        ProcessBuilder builder =
                new ProcessBuilder(command).redirectOutput(out.toFile()).redirectError(err.toFile());
        builder.environment().put("LC_ALL", "C.UTF-8");
        int status = builder.start().waitFor();
        return new Ended(status, Files.readString(out), Files.readString(err));
    }

    @Test
    void theFirstRigEndsWithItsAlarmAndItsCause() throws Exception {
        Ended ended = run("replay", FIRST);
        assertThat(ended.status()).isEqualTo(3);
        assertThat(ended.out())
                .contains("380.8 s  RAISED step")
                .contains("c has stepped by -0.00497")
                .contains("They agree")
                .contains("TEST RECORD");
        assertThat(ended.err()).isEmpty();
    }

    @Test
    void theSameFolderGivesTheSameFilesToTheByte() throws Exception {
        for (String rig : List.of("gear-pump", "valve-stem", "pressure-transmitter")) {
            Path once = folder.resolve(rig + "-1");
            Path twice = folder.resolve(rig + "-2");
            run("replay", "replays/" + rig, "--out", once.toString());
            Ended ended = run("replay", "replays/" + rig, "--out", twice.toString());
            assertThat(ended.err()).isEmpty();
            for (String file : List.of("estimates.csv", "events.csv", "summary.json", "summary.txt")) {
                assertThat(twice.resolve(file)).hasSameBinaryContentAs(once.resolve(file));
            }
        }
    }

    @Test
    void severalRunsAreOneLineEachAndOneArray() throws Exception {
        Ended lines = run(
                "replay",
                FIRST,
                "replays/prt-self-heating",
                folder.resolve("none").toString());
        assertThat(lines.status()).isEqualTo(3);
        assertThat(lines.out().lines()).hasSize(2).allMatch(l -> l.matches("[a-z-]+: \\d, .*"));
        assertThat(lines.err()).contains("there is no such run folder");
        Ended json = run("replay", FIRST, "replays/prt-self-heating", "--json");
        assertThat(topLevel(json.out())).isEqualTo("[{{]");
        assertThat(topLevel(run("replay", FIRST, "--json").out())).isEqualTo("{");
    }

    /** Checks the whole text; what it is made of at its top. */
    private static String topLevel(String json) throws IOException {
        StringBuilder shape = new StringBuilder();
        try (JsonParser parser = new JsonFactory().createParser(json)) {
            int depth = 0;
            for (JsonToken token = parser.nextToken(); token != null; token = parser.nextToken()) {
                if (token == JsonToken.START_ARRAY || token == JsonToken.START_OBJECT) {
                    shape.append(depth == 0 || (depth == 1 && shape.charAt(0) == '[') ? token.asString() : "");
                    depth++;
                } else if (token == JsonToken.END_ARRAY || token == JsonToken.END_OBJECT) {
                    depth--;
                    shape.append(depth == 0 && token == JsonToken.END_ARRAY ? token.asString() : "");
                }
            }
        }
        return shape.toString();
    }

    @Test
    void withoutACommandItSaysHowItIsUsed() throws Exception {
        Ended ended = run();
        assertThat(ended.status()).isEqualTo(2);
        assertThat(ended.out()).contains("Usage: benchtrue").contains("replay replays/gear-pump");
    }

    @Test
    void whoeverStopsReadingIsNotShoutedAt() throws Exception {
        Path err = folder.resolve("err");
        String command = java(System.getProperty("java.home")) + " -jar " + System.getProperty("benchtrue.jar")
                + " replay " + FIRST + " 2>" + err + " | head -1";
        Process shell = new ProcessBuilder("sh", "-c", command).start();
        assertThat(new String(shell.getInputStream().readAllBytes(), StandardCharsets.UTF_8).lines())
                .hasSize(1);
        shell.waitFor();
        assertThat(err).isEmptyFile();
    }

    @Test
    void recordedActsAreAppliedAgain() throws Exception {
        Path run = folder.resolve("run");
        Files.createDirectories(run);
        for (String file : List.of("sheet.toml", "readings.csv")) {
            Files.copy(Path.of(FIRST, file), run.resolve(file));
        }
        Files.writeString(run.resolve("acts.csv"), """
                reading,time,act,argument,text
                1000,199.8,mark,,oil at 40 degC
                1200,239.8,memory,60 s,
                1500,299.8,segment,,hose changed
                2000,399.8,acknowledge,1,gauge looked at
                """);
        Path out = folder.resolve("out-run");
        Ended ended = run("replay", run.toString(), "--out", out.toString());
        assertThat(ended.out())
                .contains("oil at 40 degC")
                .contains("hose changed")
                .contains("gauge looked at");
        assertThat(out.resolve("acts.csv")).hasSameTextualContentAs(run.resolve("acts.csv"));
        Files.copy(out.resolve("acts.csv"), run.resolve("acts.csv"), StandardCopyOption.REPLACE_EXISTING);
        Path again = folder.resolve("out-again");
        run("replay", run.toString(), "--out", again.toString());
        for (String file : List.of("acts.csv", "estimates.csv", "events.csv", "summary.json", "summary.txt")) {
            assertThat(again.resolve(file)).hasSameBinaryContentAs(out.resolve(file));
        }
        Path without = folder.resolve("out-without");
        run("replay", FIRST, "--out", without.toString());
        assertThat(Files.mismatch(without.resolve("estimates.csv"), out.resolve("estimates.csv")))
                .isNotEqualTo(-1);
    }

    @Test
    void aFolderOfTheUsersIsNeverWrittenOver() throws Exception {
        Ended own = run("replay", FIRST, "--out", FIRST);
        assertThat(own.status()).isEqualTo(2);
        assertThat(own.err()).contains("this folder holds a run");
        Path foreign = Files.createDirectories(folder.resolve("foreign"));
        Files.writeString(foreign.resolve("events.csv"), "mine");
        Ended ended = run("replay", FIRST, "--out", foreign.toString());
        assertThat(ended.status()).isEqualTo(2);
        assertThat(ended.err()).contains("events.csv").contains("--yes");
        assertThat(foreign.resolve("events.csv")).hasContent("mine");
    }

    @ParameterizedTest
    @CsvSource(
            delimiter = '|',
            value = {
                "replay | RUN",
                "replay replays/gear-pump --pace 0 | --pace",
                "replay replays/gear-pump --factor 1.5 | --factor",
                "replay replays/gear-pump --memory soon | --memory",
                "replay replays/gear-pump --every 0 | --every",
                "replay replays/gear-pump --every 5 | --every",
                "replay replays/nothing | there is no such run folder",
                "replay docs | holds no run",
                "replay replays/gear-pump --nonsense | --nonsense",
                "nonsense | nonsense",
                "check | SHEET",
                "check nothing.toml | nothing.toml",
                "rehearse replays/gear-pump/sheet.toml | --out",
                "watch replays/gear-pump/sheet.toml | [line]",
                "watch replays/dosing-vessel/sheet.toml | --port",
                "watch | SHEET",
                "watch replays/dosing-vessel/sheet.toml --pace 2 | --pace"
            })
    void wrongUsageIsSaidInWordsAndEndsWithTwo(String arguments, String said) throws Exception {
        Ended ended = run(arguments.split(" ", -1));
        assertThat(ended.status()).isEqualTo(2);
        assertThat(ended.err()).contains(said).doesNotContain("at benchtrue.").doesNotContain("Exception");
    }

    @Test
    void memoryDoesNotGrowWithTheLengthOfAReplay() throws Exception {
        Path run = Files.createDirectories(folder.resolve("long"));
        Files.writeString(run.resolve("sheet.toml"), Bench.SHEET);
        try (BufferedWriter csv = Files.newBufferedWriter(run.resolve("readings.csv"))) {
            csv.write("time,I,V\n");
            for (int i = 0; i < 1_000_000; i++) {
                csv.write(String.format(Locale.ROOT, "%.3f,%s%n", i * 0.01, Bench.line(i)));
            }
        }
        Ended ended = run(List.of(java(System.getProperty("java.home")), "-Xmx48m"), "replay", run.toString());
        assertThat(ended.err()).isEmpty();
        assertThat(ended.out()).contains("1000000 seen").contains("They agree");
    }

    @Test
    void runsOnTheNewestJavaOfThisMachineWithoutAWarning() throws Exception {
        Path homes = Path.of("/usr/lib/jvm");
        assumeTrue(Files.isDirectory(homes));
        try (Stream<Path> found = Files.list(homes)) {
            for (Path home :
                    found.filter(h -> Files.isExecutable(h.resolve("bin/java"))).toList()) {
                Ended ended = run(List.of(java(home.toString())), "replay", FIRST);
                assertThat(ended.status()).as("%s", home).isEqualTo(3);
                assertThat(ended.err()).as("%s", home).isEmpty();
            }
        }
    }
}
