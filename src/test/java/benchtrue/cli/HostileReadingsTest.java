package benchtrue.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.concurrent.TimeUnit;
import java.util.stream.Collectors;
import java.util.stream.IntStream;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.Timeout;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** What loggers, editors and spreadsheets make of files, replayed with the finished jar: no good row is lost, nothing hangs. */
@Tag("end-to-end")
@Timeout(120)
final class HostileReadingsTest {
    private static final int ROWS = 60;
    private static final String HEADER = "time,I,V";

    @TempDir
    private Path folder;

    private Path run;
    private Path out;

    private static String row(int i) {
        return i + "," + Bench.line(i);
    }

    private static String rows(String end) {
        return IntStream.range(0, ROWS).mapToObj(i -> row(i) + end).collect(Collectors.joining());
    }

    private int replay(byte[] readings) throws IOException, InterruptedException {
        Files.write(run.resolve("readings.csv"), readings);
        Process process = Bench.start(out, "replay", run.toString());
        assertThat(process.waitFor(100, TimeUnit.SECONDS)).isTrue();
        assertThat(printed())
                .doesNotContain("\tat ")
                .doesNotContain("Exception")
                .doesNotContain("a fault of");
        return process.exitValue();
    }

    private int replay(String readings) throws IOException, InterruptedException {
        return replay(readings.getBytes(StandardCharsets.UTF_8));
    }

    /** Without the line ends of the page. */
    private String printed() throws IOException {
        return Files.readString(out).replaceAll("[ \n]+", " ");
    }

    @BeforeEach
    void sheet() throws IOException {
        run = Files.createDirectories(folder.resolve("run"));
        out = folder.resolve("printed");
        Files.writeString(run.resolve("sheet.toml"), Bench.SHEET);
    }

    @ParameterizedTest
    @ValueSource(strings = {"\n", "\r\n"})
    void markLineEndsAndAnUnendedLastLineCostNothing(String end) throws Exception {
        String text = "\uFEFF" + HEADER + end + rows(end);
        assertThat(replay(text)).isZero();
        assertThat(printed())
                .contains("60 seen")
                .contains("0 lines could not be read")
                .contains("They agree");
        assertThat(replay(text.substring(0, text.length() - end.length()))).isZero();
        assertThat(printed()).contains("60 seen").contains("0 lines could not be read");
    }

    @Test
    void aLineOfTenMegabytesIsOneBadRow() throws Exception {
        assertThat(replay(HEADER + "\n" + row(0) + "\n0.5," + "9".repeat(10_000_000) + ",1\n"
                        + rows("\n").substring(row(0).length() + 1)))
                .isZero();
        assertThat(printed()).contains("60 seen").contains("1 lines could not be read");
    }

    @Test
    void tenThousandColumnsThatNobodyAskedForAreIgnored() throws Exception {
        String more = IntStream.range(0, 9_997).mapToObj(i -> ",x" + i).collect(Collectors.joining());
        String cells = ",1".repeat(9_997);
        assertThat(replay(HEADER + more + "\n" + rows(cells + "\n"))).isZero();
        assertThat(printed()).contains("60 seen").contains("0 lines could not be read");
        assertThat(printed().length()).isLessThan(20_000);
    }

    @Test
    void badRowsAreCountedAndTheGoodOnesBetweenThemKept() throws Exception {
        StringBuilder text = new StringBuilder(HEADER).append('\n');
        String[] bad = {"5,1.0", "soon,1.0,2.1", "5,1.0,2.1,9", "5,one,2.1", "\u0000\u0001", "5,\"1.0,2.1"};
        for (int i = 0; i < ROWS; i++) {
            text.append(row(i)).append('\n');
            if (i % 10 == 9) {
                text.append(bad[i / 10]).append('\n');
            }
        }
        assertThat(replay(text.toString())).isZero();
        assertThat(printed())
                .contains("60 seen")
                .contains("6 lines could not be read")
                .contains("readings.csv:12: 2 cells where the header has 3");
    }

    @Test
    void timesThatStandStillOrGoBackAreBadRows() throws Exception {
        String text = HEADER + "\n" + rows("\n").replace("\n30,", "\n29,").replace("\n40,", "\n38.5,");
        replay(text);
        assertThat(printed()).contains("58 seen").contains("2 lines could not be read");
    }

    @ParameterizedTest
    @ValueSource(
            strings = {
                "",
                "\n\n",
                "time;I;V\n0;1,0;2,1\n",
                "time\tI\tV\n0\t1.0\t2.1\n",
                "0,1.0,2.1\n1,2.0,4.1\n",
                "I,V,time\n1,2,0\n",
                "time,I,I,V\n0,1,1,2\n",
                "time,I [bar],V\n0,1,2\n",
                "time,A,B\n0,1,2\n",
                "time [h],I,V\n0,1,2\n"
            })
    void aHeaderThatDoesNotFitIsToldWithItsPlaceAndARemedy(String text) throws Exception {
        assertThat(replay(text)).isEqualTo(2);
        assertThat(printed()).contains("readings.csv").contains("; ");
    }

    @Test
    void aFileInAnotherEncodingIsToldSo() throws Exception {
        assertThat(replay((HEADER + "\n" + rows("\n")).getBytes(StandardCharsets.UTF_16)))
                .isEqualTo(2);
        assertThat(printed()).contains("UTF-16").contains("save it as UTF-8");
    }

    @Test
    void decimalCommasWithoutALineThatSaysSoAreBadRows() throws Exception {
        String commas = rows("\n").replaceAll("(?m)^(\\d+),([\\d.]+),([-\\d.]+)$", "$1,\"$2\",\"$3\"");
        replay(HEADER + "\n" + commas.replace(".", ","));
        assertThat(printed()).contains("60 lines could not be read");
    }
}
