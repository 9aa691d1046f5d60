package benchtrue.source;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import benchtrue.reading.Reading;
import benchtrue.sheet.BenchSheet;
import benchtrue.sheet.Mistake;
import benchtrue.source.Source.Outcome;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.SplittableRandom;
import java.util.stream.Collectors;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class ReplaySourceTest {
    private static final BenchSheet PUMP = Sheets.of("n", "rev/min", "dp", "bar");

    @TempDir
    Path folder;

    /** What came, in a line each: {@code 2: 0.5 [1.0, 2.0]}, or the outcome and its problem. */
    private List<String> replay(BenchSheet sheet, byte[] bytes) throws IOException {
        Path file = Files.write(folder.resolve("readings.csv"), bytes);
        Opened opened = ReplaySource.open(file, sheet);
        assertThat(opened).isInstanceOf(Opened.Ready.class);
        List<String> came = new ArrayList<>();
        try (Source source = ((Opened.Ready) opened).source()) {
            Reading reading = new Reading(sheet.channels().size());
            for (Outcome outcome = source.next(reading); outcome != Outcome.END; outcome = source.next(reading)) {
                came.add(
                        outcome == Outcome.READING
                                ? reading.number + ": " + reading.time + " " + Arrays.toString(reading.values)
                                : outcome + source.problem().substring("readings.csv".length()));
            }
            assertThat(source.progress()).isEqualTo(1);
        }
        return came;
    }

    private List<String> replay(String text) throws IOException {
        return replay(PUMP, text.getBytes(StandardCharsets.UTF_8));
    }

    private Mistake refusal(BenchSheet sheet, byte[] bytes) throws IOException {
        Opened opened = ReplaySource.open(Files.write(folder.resolve("readings.csv"), bytes), sheet);
        assertThat(opened).isInstanceOf(Opened.Refused.class);
        return ((Opened.Refused) opened).mistakes().get(0);
    }

    private Mistake refusal(String text) throws IOException {
        return refusal(PUMP, text.getBytes(StandardCharsets.UTF_8));
    }

    private List<Mistake> notices(String text) throws IOException {
        Opened opened = ReplaySource.open(Files.writeString(folder.resolve("readings.csv"), text), PUMP);
        try (Source source = ((Opened.Ready) opened).source()) {
            assertThat(source.startedUtc()).isNull();
            return ((Opened.Ready) opened).notices();
        }
    }

    @Test
    void columnsAreFoundByNameInAnyOrder() throws IOException {
        assertThat(replay("time,dp,n\n5.25,120,1500\n5.5,121.5,1501\n"))
                .containsExactly("1: 0.0 [1500.0, 120.0]", "2: 0.25 [1501.0, 121.5]");
    }

    @Test
    void unitsInBracketsAreConvertedToThoseOfTheSheet() throws IOException {
        assertThat(replay("time [ms],dp [kPa],\"n [1000 rev/min]\"\n0,12000,1.5\n250,100,\n"))
                .containsExactly("1: 0.0 [1500.0, 120.0]", "2: 0.25 [NaN, 1.0]");
    }

    @Test
    void byteOrderMarkLineEndsQuotesAndBlanksMakeNoDifference() throws IOException {
        List<String> expected = List.of("1: 0.0 [1500.0, 120.0]", "2: 0.25 [1501.0, NaN]");
        assertThat(replay("\uFEFFtime,n,dp\r\n0,1500,120\r\n0.25,1501,NaN")).isEqualTo(expected);
        assertThat(replay("time,n,dp\r0,1500,120\r0.25,1501,nan\r")).isEqualTo(expected);
        assertThat(replay("\"time\", n ,dp\n\n0,\"1500\", 120\n\n0.25,1501,\n\n"))
                .isEqualTo(expected);
    }

    @Test
    void linesWithinQuotesBelongToTheRowAndCountAsLines() throws IOException {
        assertThat(replay("time,n,note,dp\n0,1,\"first\nsecond \"\"third\"\"\",2\nx,1,,2\n1,3,,4\n"))
                .containsExactly("1: 0.0 [1.0, 2.0]", "MALFORMED:4: time: \"x\" is no time", "2: 1.0 [3.0, 4.0]");
    }

    @Test
    void aQuoteThatIsNotClosedCostsOneLine() throws IOException {
        assertThat(replay("time,n,dp\n0,\"1,2\n1,3,4\n2,\"5\",6\n"))
                .containsExactly(
                        "MALFORMED:2: a quotation mark is not closed, or text follows a closing one",
                        "1: 0.0 [3.0, 4.0]",
                        "2: 1.0 [5.0, 6.0]");
    }

    @Test
    void rowsThatCannotBeReadAreToldWithTheirLineAndStopNothing() throws IOException {
        assertThat(replay(
                        "time,n,dp\n0,1,2\n0.5,1\n1,OL,2\n1.5,1,1e999\n2,0x1p3,1\n2.5,1d,1\n,1,2\n3,1,2,5,7\n4,3,4\n"))
                .containsExactly(
                        "1: 0.0 [1.0, 2.0]",
                        "MALFORMED:3: 2 cells where the header has 3",
                        "MALFORMED:4: n: \"OL\" is no number",
                        "MALFORMED:5: dp: \"1e999\" is no number",
                        "MALFORMED:6: n: \"0x1p3\" is no number",
                        "MALFORMED:7: n: \"1d\" is no number",
                        "MALFORMED:8: time is missing",
                        "MALFORMED:9: 5 cells where the header has 3; a number with a decimal comma takes two: quote it, or write a point",
                        "2: 4.0 [3.0, 4.0]");
    }

    @Test
    void aDecimalCommaIsReadWithinQuotesWhereTheSheetHasOne() throws IOException {
        byte[] bytes = "time,n,dp\n0,\"1,5\",2.5\n\"0,25\",\"1.5\",2\n".getBytes(StandardCharsets.UTF_8);
        assertThat(replay(Sheets.withDecimalComma("n", "rev/min", "dp", "bar"), bytes))
                .containsExactly("1: 0.0 [1.5, 2.5]", "2: 0.25 [1.5, 2.0]");
        assertThat(replay(PUMP, bytes))
                .containsExactly(
                        "MALFORMED:2: n: \"1,5\" is no number: the sheet declares no decimal comma"
                                + " (decimal_comma = true under [line])",
                        "MALFORMED:3: time: \"0,25\" is no time");
    }

    @Test
    void nulBytesAndInvalidUtf8SpoilOnlyTheirRow() throws IOException {
        ByteArrayOutputStream bytes = new ByteArrayOutputStream();
        bytes.writeBytes("time,n,dp\n0,1,2\n1,1\0".getBytes(StandardCharsets.ISO_8859_1));
        bytes.writeBytes(",2\n2,1,2\u00B0\n\0\0\0\n3,3,4\n".getBytes(StandardCharsets.ISO_8859_1));
        assertThat(replay(PUMP, bytes.toByteArray()))
                .containsExactly(
                        "1: 0.0 [1.0, 2.0]",
                        "MALFORMED:3: n: \"1\\x00\" is no number",
                        "MALFORMED:4: dp: \"2\\xB0\" is no number",
                        "MALFORMED:5: 1 cell where the header has 3",
                        "2: 3.0 [3.0, 4.0]");
    }

    @Test
    void aLineOfTenMegabytesIsPassedOverAndTheNextIsWhole() throws IOException {
        for (byte filling : new byte[] {'7', 0, ',', '"'}) {
            byte[] line = new byte[10_000_000];
            Arrays.fill(line, filling);
            ByteArrayOutputStream bytes = new ByteArrayOutputStream();
            bytes.writeBytes("time,n,dp\n0,1,2\n".getBytes(StandardCharsets.UTF_8));
            bytes.writeBytes(line);
            bytes.writeBytes("\n1,3,4\n".getBytes(StandardCharsets.UTF_8));
            List<String> came = replay(PUMP, bytes.toByteArray());
            assertThat(came).hasSize(3);
            assertThat(came.get(1)).startsWith("MALFORMED:3: ");
            assertThat(came.get(2)).isEqualTo("2: 1.0 [3.0, 4.0]");
        }
    }

    @Test
    void tenThousandColumnsAreRead() throws IOException {
        String[] channels = IntStream.range(0, 20_000)
                .mapToObj(i -> i % 2 == 0 ? "c" + i / 2 : "V")
                .toArray(String[]::new);
        String header = IntStream.range(0, 10_000).mapToObj(i -> ",c" + i).collect(Collectors.joining());
        String row = IntStream.range(0, 10_000).mapToObj(i -> "," + i + ".125").collect(Collectors.joining());
        byte[] bytes = ("time" + header + "\n0" + row + "\n1" + row + "\n").getBytes(StandardCharsets.UTF_8);
        List<String> came = replay(Sheets.of(channels), bytes);
        assertThat(came).hasSize(2);
        assertThat(came.get(1)).startsWith("2: 1.0 [0.125, 1.125, ").endsWith(", 9999.125]");
    }

    @Test
    void columnsThatTheSheetDoesNotNameAreNamedOnce() throws IOException {
        assertThat(notices("time,n,note,dp,T [K]\n0,1,,2,3\n").toString())
                .contains("readings.csv:1:8: ignored, as the sheet does not name them: note, T")
                .doesNotContain("below the header");
        assertThat(notices("time,n,dp").toString()).contains("there is no reading below the header");
        assertThat(replay("time,n,dp\n")).isEmpty();
    }

    @Test
    void mistakesInTheHeaderSayWhereAndWhatToDo() throws IOException {
        assertThat(refusal("").toString())
                .endsWith("readings.csv: the file is empty; it begins with a header row: time, then the channels");
        assertThat(refusal("time,n,pd\n").toString())
                .endsWith("readings.csv:1:8: there is no column for the channel dp; rename the column pd to dp");
        assertThat(refusal("time,n\n").remedy()).isEqualTo("add the column, or take the channel out of the sheet");
        assertThat(refusal("time,n,dp,n\n").toString())
                .endsWith(":1:11: the column n comes twice, as column 2 and 4; rename or remove one");
        assertThat(refusal("n,time,dp\n").remedy()).isEqualTo("put the column time first");
        assertThat(refusal("0,1500,120\n").remedy()).isEqualTo("begin the file with a header row: time,n,dp");
        assertThat(refusal("time;n;dp\n0;1;2\n").remedy())
                .startsWith("separate the columns with commas, not semicolons");
        assertThat(refusal("time,n,dp [K]\n").toString())
                .endsWith(
                        ":1:8: dp is in K here and in bar in the sheet; correct the unit in the brackets, or that of the sheet");
        assertThat(refusal("time [h],n,dp\n").message()).isEqualTo("time in h");
        assertThat(refusal(PUMP, "time,n,dp\n".getBytes(StandardCharsets.UTF_16))
                        .message())
                .isEqualTo("the file is in UTF-16");
        assertThat(ReplaySource.open(folder.resolve("none.csv"), PUMP).toString())
                .contains("there is no such file");
    }

    @Test
    void datesKeepTheirNanosecondsAndGiveTheStart() throws IOException {
        Path file = Files.writeString(folder.resolve("readings.csv"), """
                time,n,dp
                2027-02-28T23:59:59.999999999Z,1,2
                2027-03-01 01:00:00.000000001+01:00,1,2
                2027-03-01T00:00:00.25,1,2
                2027-02-29T00:00:00Z,1,2
                2027-03-01T00:00:01.123456789xZ,1,2
                17,1,2
                2027-03-01T00:01Z,1,2
                """);
        try (Source source = ((Opened.Ready) ReplaySource.open(file, PUMP)).source()) {
            Reading reading = new Reading(2);
            assertThat(source.next(reading)).isEqualTo(Outcome.READING);
            assertThat(source.startedUtc()).isEqualTo(Instant.parse("2027-02-28T23:59:59.999999999Z"));
            assertThat(source.next(reading)).isEqualTo(Outcome.READING);
            assertThat(reading.time).isEqualTo(2e-9);
            assertThat(source.next(reading)).isEqualTo(Outcome.READING);
            assertThat(reading.time).isEqualTo(0.250000001);
            assertThat(source.next(reading)).isEqualTo(Outcome.MALFORMED);
            assertThat(source.next(reading)).isEqualTo(Outcome.MALFORMED);
            assertThat(source.next(reading)).isEqualTo(Outcome.MALFORMED);
            assertThat(source.problem()).endsWith(":7: time: \"17\" is no date as in the rows before");
            assertThat(source.next(reading)).isEqualTo(Outcome.READING);
            assertThat(reading.time).isEqualTo(60.000000001);
        }
    }

    @Test
    void secondsSince1970LoseNothing() throws IOException {
        assertThat(replay("time,n,dp\n1788000000.123456789,1,2\n1788000000.123456790,1,2\n1788000000.1235567892,1,2\n"))
                .containsExactly("1: 0.0 [1.0, 2.0]", "2: 1.0E-9 [1.0, 2.0]", "3: 1.0E-4 [1.0, 2.0]");
    }

    @Test
    void timesThatRepeatOrGoBackALittleAreMalformed() throws IOException {
        assertThat(replay("time,n,dp\n0,1,2\n0.2,1,2\n0.2,1,2\n0.1,1,2\n0.4,1,2\n"))
                .containsExactly(
                        "1: 0.0 [1.0, 2.0]",
                        "2: 0.2 [1.0, 2.0]",
                        "MALFORMED:4: its time is that of the reading before",
                        "MALFORMED:5: its time lies 0.1 s before that of an earlier row: out of order",
                        "3: 0.4 [1.0, 2.0]");
    }

    @Test
    void aClockThatJumpsFarBackIsARestartAndRunTimeGoesOn() throws IOException {
        assertThat(replay("time,n,dp\n100,1,2\n100.5,1,2\n101,1,2\n3,5,6\n3.5,7,8\n"))
                .containsExactly(
                        "1: 0.0 [1.0, 2.0]",
                        "2: 0.5 [1.0, 2.0]",
                        "3: 1.0 [1.0, 2.0]",
                        "RESTART:5: the device's time goes back by 98 s: it started anew, or its clock was set; run time goes on",
                        "4: 1.5 [5.0, 6.0]",
                        "5: 2.0 [7.0, 8.0]");
    }

    @Test
    void oneRowWithAWildTimeIsNoRestart() throws IOException {
        assertThat(replay("time,n,dp\n100,1,2\n100.5,1,2\n3,1,2\n101,1,2\n9000,1,2\n101.5,1,2\n130,1,2\n130.5,1,2\n"))
                .containsExactly(
                        "1: 0.0 [1.0, 2.0]",
                        "2: 0.5 [1.0, 2.0]",
                        "MALFORMED:4: its time is 97.5 s from that of the row before, and the next row is not",
                        "3: 1.0 [1.0, 2.0]",
                        "MALFORMED:6: its time is 8899 s from that of the row before, and the next row is not",
                        "4: 1.5 [1.0, 2.0]",
                        "5: 30.0 [1.0, 2.0]",
                        "6: 30.5 [1.0, 2.0]");
    }

    @Test
    void aClockSetBackALittleIsARestartAtTheFifthRowInOrder() throws IOException {
        List<String> came = replay(
                "time,n,dp\n0,1,2\n0.1,1,2\n0.2,1,2\n0.3,1,2\n0.4,1,2\n0.5,1,2\n0.6,1,2\n0,1,2\n0.1,1,2\n0.2,1,2\n0.3,1,2\n0.4,9,9\n0.5,1,2\n");
        assertThat(came).filteredOn(line -> line.startsWith("MALFORMED")).hasSize(4);
        assertThat(came.subList(11, 14)).satisfies(tail -> {
            assertThat(tail.get(0)).startsWith("RESTART:13: ");
            assertThat(tail.get(1)).startsWith("8: 0.7 [9.0");
            assertThat(tail.get(2)).startsWith("9: 0.8 [1.0");
        });
    }

    @Test
    void numbersAreReadToTheNearestDouble() {
        SplittableRandom random = new SplittableRandom(20_270_301);
        for (int i = 0; i < 300_000; i++) {
            double value = Double.longBitsToDouble(random.nextLong());
            if (Double.isFinite(value)) {
                assertSame(Double.toString(value), value);
            }
            double plain = random.nextLong(2_000_000_000_000_000L) / Math.pow(10, random.nextInt(16));
            String text = new java.math.BigDecimal(plain)
                    .setScale(random.nextInt(20), java.math.RoundingMode.HALF_EVEN)
                    .toPlainString();
            assertSame(text, Double.parseDouble(text));
        }
    }

    /** Numbers half way between two doubles, or next to it; the expected values are the standard library's. */
    @Test
    void numbersAtTheLimitsAreReadToTheNearestDouble() {
        for (String text : List.of(
                "9007199254740993",
                "9007199254740992.5",
                "0.1",
                "-0",
                "+1.5",
                ".5",
                "5.",
                "1e22",
                "1e23",
                "1E-5",
                "000000000000000000000000000001.25",
                "0.000000000000000000000000000125",
                "4.9e-324",
                "2.4e-324",
                "1.7976931348623157e308",
                "123456789012345678901234567890.5",
                "8.5e-320",
                "0.500000000000000166533453693773481063544750213623046875",
                "1.00000000000000011102230246251565")) {
            assertSame(text, Double.parseDouble(text));
        }
        for (String text :
                List.of("1e", "e5", "--1", "1.2.3", "1,5", "+", "-", ".", "Infinity", "1f", "1_0", "1 2", "1e400")) {
            assertThat(read(text)).as(text).isEqualTo(Decimals.UNREADABLE);
        }
        for (String text : List.of("", "  ", "NaN", " nan\t")) {
            assertThat(read(text)).as(text).isNaN();
        }
    }

    private static void assertSame(String text, double expected) {
        if (Double.doubleToRawLongBits(read(text)) != Double.doubleToRawLongBits(expected)) {
            assertThat(read(text)).as(text).isEqualTo(expected);
        }
    }

    private static double read(String text) {
        byte[] bytes = ("x" + text + "y").getBytes(StandardCharsets.US_ASCII);
        return Decimals.parse(bytes, 1, bytes.length - 1, '.');
    }

    @Test
    void progressGrowsWithTheFile() throws IOException {
        Path file = folder.resolve("readings.csv");
        StringBuilder text = new StringBuilder("time,n,dp\n");
        for (int i = 0; i < 1000; i++) {
            text.append(String.format("%03d,1500,120%n", i));
        }
        Files.writeString(file, text);
        try (Source source = ((Opened.Ready) ReplaySource.open(file, PUMP)).source()) {
            Reading reading = new Reading(2);
            for (int i = 0; i < 500; i++) {
                assertThat(source.next(reading)).isEqualTo(Outcome.READING);
            }
            assertThat(source.progress()).isCloseTo(0.5, within(0.01));
        }
    }
}
