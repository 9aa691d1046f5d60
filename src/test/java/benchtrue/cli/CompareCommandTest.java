package benchtrue.cli;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import com.fasterxml.jackson.core.JsonFactory;
import com.fasterxml.jackson.core.JsonParser;
import com.fasterxml.jackson.core.JsonToken;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/**
 * Runs of 100 readings of V = R·(1 A) that lie 10 mV above and below by turns, so that by hand R is their mean, its standard
 * uncertainty 0.01/√99 Ω and, with t(0.975, 99) = 1.9842 (any table of Student's t), U = 1.9942 mΩ.
 */
class CompareCommandTest {
    private static final double U = 1.98422 * 0.01 / Math.sqrt(99);

    @TempDir
    private Path folder;

    private final ByteArrayOutputStream out = new ByteArrayOutputStream();
    private final ByteArrayOutputStream err = new ByteArrayOutputStream();

    private String made(String name, String start, double resistance, String limits) throws IOException {
        Path run = Files.createDirectories(folder.resolve(name));
        Files.writeString(run.resolve("sheet.toml"), """
                title = "Resistor"
                [channels]
                I = { unit = "A" }
                V = { unit = "V" }
                [[relations]]
                equation = "V = R*I"
                [relations.unknowns]
                R = { unit = "ohm"%s }
                """.formatted(limits));
        StringBuilder csv = new StringBuilder("time,I,V\n");
        Instant first = Instant.parse(start);
        for (int i = 0; i < 100; i++) {
            csv.append(first.plusSeconds(i))
                    .append(",1,")
                    .append(String.format("%.4f", resistance + (i % 2 == 0 ? 0.01 : -0.01)))
                    .append('\n');
        }
        Files.writeString(run.resolve("readings.csv"), csv);
        return run.toString();
    }

    private int compare(String... arguments) {
        out.reset();
        return Main.run(
                Stream.concat(Stream.of("compare"), Stream.of(arguments)).toArray(String[]::new),
                new Output(new PrintStream(out), new PrintStream(err), false),
                Map.of());
    }

    private String printed() {
        return out.toString(StandardCharsets.UTF_8);
    }

    /** The values of one field, in the order of the text. */
    private List<String> values(String field) throws IOException {
        List<String> values = new ArrayList<>();
        try (JsonParser json = new JsonFactory().createParser(printed())) {
            for (JsonToken token = json.nextToken(); token != null; token = json.nextToken()) {
                if (token.isScalarValue() && field.equals(json.currentName())) {
                    values.add(json.getText());
                }
            }
        }
        return values;
    }

    @Test
    void neighboursWithinTheirUncertaintiesAreNoFinding() throws IOException {
        String first = made("first", "2027-03-01T08:00:00Z", 2, "");
        String second = made("second", "2027-04-01T08:00:00Z", 2.001, "");
        assertThat(compare(first, second, "--json")).isZero();
        // E_n = (x − X)/√(U² + U²): ISO 13528:2015, 9.7 (from memory)
        List<String> agreement = values("en");
        assertThat(agreement.get(0)).isEqualTo("null");
        assertThat(Double.parseDouble(agreement.get(1))).isCloseTo(0.001 / (U * Math.sqrt(2)), within(1e-4));
        assertThat(err.size()).isZero();
    }

    @Test
    void runsAreOrderedByTheirStartAndThoseThatDisagreeAreFound() throws IOException {
        String late = made("late", "2027-05-01T08:00:00Z", 2.1, "");
        String early = made("early", "2027-03-01T08:00:00Z", 2, "");
        assertThat(compare(late, early, "--json")).isEqualTo(3);
        assertThat(values("name")).containsSubsequence("R", "early", "late");
        assertThat(Double.parseDouble(values("en").get(1))).isCloseTo(0.1 / (U * Math.sqrt(2)), within(1e-2));
        assertThat(compare(late, early)).isEqualTo(3);
        assertThat(printed()).contains("2.0000 ± 0.0020").contains("2.1000 ± 0.0020");
    }

    @Test
    void aTrendIsDrawnOnToItsLimit() throws IOException {
        String limits = ", limits = [1.9, 2.02]";
        String[] runs = new String[4];
        for (int i = 0; i < runs.length; i++) {
            runs[i] = made("run" + i, "2027-03-0" + (1 + 2 * i) + "T08:00:00Z", 2 + 0.002 * i, limits);
        }
        compare(runs);
        // By hand: 1 mΩ a day, so 2.02 Ω on day 20. Its U is 1.96·(10/√99) mΩ/√20 days = 0.440 mΩ a day, and from day 6
        // on
        // 14 mΩ are left: 6 + 14/1.440 = 15.72 and 6 + 14/0.560 = 31.0 days
        assertThat(printed().replaceAll("\\s+", " "))
                .contains("Trend 0.00100 ± 0.00044 ohm a day")
                .contains("reaches the limit 2.02 on day 20.00 (between 15.72 and 31.02)");
    }

    @Test
    void nothingIsWrittenAndWithoutACommonUnknownNothingIsCompared() throws IOException {
        String first = made("first", "2027-03-01T08:00:00Z", 2, "");
        assertThat(compare(first, "replays/gear-pump")).isEqualTo(4);
        assertThat(Path.of(first)).isDirectoryNotContaining("glob:**.json");
        try (Stream<Path> files = Files.list(Path.of(first))) {
            assertThat(files).hasSize(2);
        }
    }

    @Test
    void oneRunIsWrongUsage() throws IOException {
        assertThat(compare(made("first", "2027-03-01T08:00:00Z", 2, ""))).isEqualTo(2);
        assertThat(err.toString(StandardCharsets.UTF_8)).contains("two RUN folders");
    }
}
