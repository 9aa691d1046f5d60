package benchtrue.source;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import benchtrue.reading.Reading;
import benchtrue.sheet.BenchSheet;
import benchtrue.sheet.Dialect;
import benchtrue.sheet.SheetReader;
import benchtrue.sheet.SheetReading;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Objects;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** What lines become under the dialects that a sheet can declare. */
final class LineParserTest {
    @TempDir
    private Path folder;

    private SheetReading reading(String line) throws IOException {
        Path file = folder.resolve("sheet.toml");
        Files.writeString(file, """
                title = "Two channels"
                [channels]
                I = { unit = "A", resolution = 0.01 }
                T = { unit = "°C", resolution = 0.1 }
                [[relations]]
                equation = "T = a*I + b"
                [rehearsal]
                seed = 3
                rate = 10
                duration = "20 s"
                [rehearsal.truth]
                a = 2
                b = 20
                [rehearsal.channels.I]
                steps = [[0, 1.5], [10, -2.25]]
                [line]
                """ + line.replace("; ", "\n"));
        return SheetReader.read(file);
    }

    private BenchSheet sheet(String line) throws IOException {
        SheetReading reading = reading(line);
        assertThat(reading.mistakes()).isEmpty();
        return Objects.requireNonNull(reading.sheet());
    }

    private String parsed(String dialect, byte[] line) throws IOException {
        Reading into = new Reading(2);
        String wrong = new LineParser(sheet(dialect)).parse(line, 0, line.length, into);
        return wrong.isEmpty() ? Arrays.toString(into.values) : wrong;
    }

    @ParameterizedTest
    @CsvSource(
            delimiter = '|',
            ignoreLeadingAndTrailingWhitespace = true,
            value = {
                "baud = 9600 | 1.5,20.25 | [1.5, 20.25]",
                "baud = 9600 | +1.5 , -20.25 | [1.5, -20.25]",
                "baud = 9600 | + 1.5,- 20.25 | [1.5, -20.25]",
                "baud = 9600 | 1.5-,20.25+ | [-1.5, 20.25]",
                "baud = 9600 | \u22121.5,2E+01 | [-1.5, 20.0]",
                "baud = 9600 | 1.5,NaN | [1.5, NaN]",
                "baud = 9600 | 1.5, | [1.5, NaN]",
                "baud = 9600 | 1500 mA,20.25 °C | [1.5, 20.25]",
                "baud = 9600 | 1.5 A,293.15 K | [1.5, 20.0]",
                "baud = 9600 | 1.5 V,20 | I: the unit \"V\" does not fit A of the sheet",
                "baud = 9600 | 1.5 Foo,20 | I: \"Foo\" behind the number is no unit",
                "baud = 9600 | OL,20 | I: \"OL\" is no number",
                "baud = 9600 | 1.5 | 1 field where 2 are declared: \"1.5\"",
                "baud = 9600 | 1,2,3 | 3 fields where 2 are declared: \"1,2,3\"",
                "missing = [\"----\", \"Err\"] | ----,Err | [NaN, NaN]",
                "words = { overload = \"OL\", stable = \"ST\" } | ST,OL,20 | [NaN, 20.0]",
                "words = { stable = \"ST\" } | ST , 1.5,20 | [1.5, 20.0]",
                "separator = \";\" | 1.5;20 | [1.5, 20.0]",
                "separator = \" \" |   1.5   20   | [1.5, 20.0]",
                "separator = \" \" | 1.5\t20 | [1.5, 20.0]",
                "separator = \"::\" | 1.5::20 | [1.5, 20.0]",
                "separator = \";\"; decimal_comma = true | 1,5;20,25 | [1.5, 20.25]",
                "separator = \";\"; decimal_comma = true; grouping = true | 1.234,5;2.000 | [1234.5, 2000.0]",
                "separator = \";\"; grouping = true | 1,234.5;2,000 | [1234.5, 2000.0]",
                "separator = \";\" | 1,234;20 | I: \"1,234\" is no number",
                "fields = [\"T\", \"-\", \"I\"] | 20,x,1.5 | [1.5, 20.0]",
                "named = true | T=20,I=1.5,x=3 | [1.5, 20.0]",
                "named = true; separator = \" \" | I=1.5 T=20 | [1.5, 20.0]",
                "named = true | T = 20 | [NaN, 20.0]",
                "named = true | x=3 | no channel of the sheet is named in \"x=3\"",
                "pattern = '^A(.{5})B(.{4})' | A+1.50B20.0 | [1.5, 20.0]",
                "pattern = 'I:(\\S+) T:(\\S+)' | ?? I:1.5 T:20 ok | [1.5, 20.0]",
                "pattern = 'I:(\\S+) T:(\\S+)' | I:1.5 | the pattern does not fit \"I:1.5\""
            })
    void readsTheDeclaredDialect(String dialect, String line, String expected) throws IOException {
        assertThat(parsed(dialect, line.getBytes(StandardCharsets.UTF_8))).isEqualTo(expected);
    }

    @Test
    void readsLatin1WhereItIsDeclared() throws IOException {
        byte[] line = "1.5 A,20.25 °C".getBytes(StandardCharsets.ISO_8859_1);
        assertThat(parsed("encoding = \"Latin-1\"", line)).isEqualTo("[1.5, 20.25]");
        assertThat(parsed("baud = 9600", line)).contains("is no unit");
    }

    /**
     * NMEA 0183: a sentence with its checksum, and one whose checksum was recomputed. CRCs: the check values of "123456789" in
     * the catalogue of parametrised CRC algorithms (G. Cook): CRC-16/MODBUS 4B37, CRC-16/IBM-3740 29B1, CRC-32/ISO-HDLC
     * CBF43926. From memory.
     */
    @Test
    void checksumsAreThoseOfTheirStandards() {
        byte[] sentence = "$GPGLL,5300.97914,N,00259.98174,E,125926,A*28".getBytes(StandardCharsets.US_ASCII);
        assertThat(Checksums.of(Dialect.Checksum.NMEA, sentence, 0, sentence.length - 2))
                .isEqualTo(0x28);
        byte[] heading = "$HEHDT,178.3,T*".getBytes(StandardCharsets.US_ASCII);
        assertThat(Checksums.of(Dialect.Checksum.NMEA, heading, 0, heading.length))
                .isEqualTo(0x22);
        byte[] digits = "123456789".getBytes(StandardCharsets.US_ASCII);
        assertThat(Checksums.of(Dialect.Checksum.CRC16_MODBUS, digits, 0, 9)).isEqualTo(0x4B37);
        assertThat(Checksums.of(Dialect.Checksum.CRC16_CCITT, digits, 0, 9)).isEqualTo(0x29B1);
        assertThat(Checksums.of(Dialect.Checksum.CRC32, digits, 0, 9)).isEqualTo(0xCBF43926L);
        assertThat(Checksums.of(Dialect.Checksum.SUM8, digits, 0, 9)).isEqualTo(0xDD);
        assertThat(Checksums.of(Dialect.Checksum.XOR8, digits, 0, 9)).isEqualTo(0x31);
    }

    @Test
    void aWrongOrMissingChecksumIsSaid() throws IOException {
        String dialect = "checksum = \"nmea\"; fields = [\"-\", \"I\", \"T\"]";
        BenchSheet sheet = sheet(dialect);
        LineParser parser = new LineParser(sheet);
        byte[] right = "$BENCH,1.5,20*4E".getBytes(StandardCharsets.US_ASCII);
        int sum = 0;
        for (int i = 1; right[i] != '*'; i++) {
            sum ^= right[i];
        }
        byte[] good = String.format("$BENCH,1.5,20*%02X", sum).getBytes(StandardCharsets.US_ASCII);
        Reading into = new Reading(2);
        assertThat(parser.parse(good, 0, good.length, into)).isEmpty();
        assertThat(parser.provesItself()).isTrue();
        assertThat(into.values).containsExactly(1.5, 20);
        byte[] bad = String.format("$BENCH,1.6,20*%02X", sum).getBytes(StandardCharsets.US_ASCII);
        assertThat(parser.parse(bad, 0, bad.length, into)).contains("the checksum is");
        byte[] none = "$BENCH,1.5,20".getBytes(StandardCharsets.US_ASCII);
        assertThat(parser.parse(none, 0, none.length, into)).contains("no checksum");
        assertThat(into.values).containsExactly(1.5, 20);
    }

    @ParameterizedTest
    @CsvSource(
            delimiter = '|',
            value = {
                "fields = [\"I\", \"X\"] | X",
                "fields = [\"I\"] | T is not in fields",
                "fields = [\"I\", \"I\", \"T\"] | twice",
                "pattern = '(\\S+' | regular expression",
                "pattern = '(\\S+)' | 1 groups for 2 fields",
                "checksum = \"crc\" | crc",
                "encoding = \"UTF-16\" | UTF-16",
                "end = \"CR\" | CR",
                "separator = \"\" | separator",
                "decimal_comma = true | decimal mark",
                "named = true; fields = [\"I\", \"T\"] | named"
            })
    void aDialectThatCannotBeIsRefused(String dialect, String said) throws IOException {
        SheetReading reading = reading(dialect);
        assertThat(reading.mistakes()).anySatisfy(m -> assertThat(m.toString()).contains(said));
    }

    /** What the simulated instrument sends in a dialect is what the parser reads in it. */
    @ParameterizedTest
    @ValueSource(
            strings = {
                "baud = 9600",
                "separator = \";\"; decimal_comma = true",
                "separator = \" \"",
                "named = true",
                "fields = [\"T\", \"-\", \"I\"]",
                "end = \"ETX\"",
                "checksum = \"nmea\"",
                "checksum = \"xor8\"",
                "checksum = \"sum8\"; separator = \";\"",
                "checksum = \"crc16-modbus\"",
                "checksum = \"crc16-ccitt\"; end = \"ETX\"",
                "checksum = \"crc32\"; encoding = \"Latin-1\"",
                "words = { stable = \"ST\", unstable = \"US\", gross = \"G\" }"
            })
    void readsWhatTheSimulatedInstrumentSends(String dialect) throws IOException {
        BenchSheet sheet = sheet(dialect);
        RehearsedLines lines = new RehearsedLines(sheet, Objects.requireNonNull(sheet.rehearsal()), 3);
        LineTrial trial = new LineTrial(sheet);
        Source rig = SimulatedRig.source(sheet, Objects.requireNonNull(sheet.rehearsal()), 3);
        Reading expected = new Reading(2);
        int count = 0;
        while (lines.next()) {
            assertThat(rig.next(expected)).isEqualTo(Source.Outcome.READING);
            List<LineTrial.Tried> tried = trial.of(lines.bytes());
            assertThat(tried).hasSize(1);
            assertThat(tried.get(0).becomes())
                    .isEqualTo("I = " + expected.values[0] + " A, T = " + expected.values[1] + " °C");
            count++;
        }
        assertThat(count).isEqualTo(200);
    }

    @Test
    void framesDoNotDependOnHowBytesComeInPieces() throws IOException {
        SplittableRandom random = new SplittableRandom(5);
        for (String end : List.of("line", "ETX")) {
            StringBuilder text = new StringBuilder();
            List<String> expected = new ArrayList<>();
            for (int i = 0; i < 500; i++) {
                String line = "x".repeat(random.nextInt(60)) + i;
                expected.add(line);
                text.append(
                        end.equals("ETX")
                                ? "noise\u0002" + line + "\u0003\r\n"
                                : line + List.of("\r\n", "\n", "\r").get(random.nextInt(3)));
            }
            text.append(end.equals("ETX") ? "" : "!\n");
            byte[] bytes = text.toString().getBytes(StandardCharsets.US_ASCII);
            Framer framer = new Framer(
                    Objects.requireNonNull(sheet("end = \"" + end + "\"").line()));
            List<String> found = new ArrayList<>();
            for (int at = 0; at < bytes.length; ) {
                int to = Math.min(bytes.length, at + 1 + random.nextInt(90));
                framer.add(
                        bytes,
                        at,
                        to,
                        at,
                        (held, from, until, behind, nanos, cut) ->
                                found.add(new String(held, from, until - from, StandardCharsets.US_ASCII)));
                at = to;
            }
            assertThat(found.subList(0, 500)).isEqualTo(expected);
        }
    }

    @Test
    void aLineWithoutEndIsCutAndTheNextIsWhole() throws IOException {
        Framer framer = new Framer(Objects.requireNonNull(sheet("baud = 9600").line()));
        List<String> found = new ArrayList<>();
        byte[] bytes = ("7".repeat(1 << 20) + "\n1,2\n").getBytes(StandardCharsets.US_ASCII);
        framer.add(
                bytes,
                0,
                bytes.length,
                0,
                (held, from, to, behind, nanos, cut) -> found.add((to - from) + (cut ? " cut" : "")));
        assertThat(found).containsExactly(Framer.LONGEST + " cut", "3");
    }

    @Test
    void unitsOfTemperatureConvertWithTheirOffset() throws IOException {
        Reading into = new Reading(2);
        byte[] line = "1 A,212 degF".getBytes(StandardCharsets.US_ASCII);
        assertThat(new LineParser(sheet("baud = 9600")).parse(line, 0, line.length, into))
                .isEmpty();
        assertThat(into.values[1]).isEqualTo(100, within(1e-9));
    }
}
