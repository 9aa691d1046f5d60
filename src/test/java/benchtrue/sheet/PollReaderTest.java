package benchtrue.sheet;

import static org.assertj.core.api.Assertions.assertThat;

import benchtrue.sheet.PollSpec.NumberType;
import benchtrue.sheet.PollSpec.Register;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Objects;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class PollReaderTest {
    private static final String HEAD = """
            title = "rig"
            [channels]
            I = { unit = "A" }
            V = { unit = "V" }
            [[relations]]
            equation = "V = R*I + V0"
            """;

    private static final String SCPI = HEAD + """
            [line]
            baud = 9600
            [poll]
            kind = "scpi"
            [poll.channels]
            I = { query = "SENS:CURR:DC:DATA?" }
            V = { query = "FETC? (@102)" }
            """;

    private static final String MODBUS = HEAD + """
            [line]
            baud = 19200
            frame = "8E1"
            [poll]
            kind = "modbus"
            period = 0.5
            timeout = "2 s"
            [poll.channels]
            V = { address = 247, function = 4, register = 8, type = "float32", order = "CDAB" }
            I = { address = 1, register = 107, type = "int16", scale = 0.01, missing = [-32768] }
            """;

    private static SheetReading read(String text) {
        return SheetReader.read("rig.toml", text.getBytes(StandardCharsets.UTF_8));
    }

    private static PollSpec poll(String text) {
        SheetReading reading = read(text);
        assertThat(reading.mistakes()).isEmpty();
        return Objects.requireNonNull(Objects.requireNonNull(reading.sheet()).poll());
    }

    private static List<String> mistakes(String sheet, String from, String to) {
        assertThat(sheet).contains(from);
        SheetReading reading = read(sheet.replace(from, to));
        return reading.mistakes().stream().map(Mistake::toString).toList();
    }

    @Test
    void queriesAreThoseOfTheSheetInTheOrderOfItsChannels() {
        assertThat(poll(SCPI))
                .isEqualTo(new PollSpec(
                        1, 2, new PollSpec.Scpi(List.of("SENS:CURR:DC:DATA?", "FETC? (@102)"), "\n", null)));
        assertThat(poll(SCPI.replace("\"scpi\"", "\"scpi\"\nterminator = \"CRLF\""))
                        .asking())
                .isInstanceOfSatisfying(
                        PollSpec.Scpi.class,
                        scpi -> assertThat(scpi.terminator()).isEqualTo("\r\n"));
    }

    @Test
    void registersSayWhereAValueStandsAndWhatItMeans() {
        assertThat(poll(MODBUS))
                .isEqualTo(new PollSpec(
                        0.5,
                        2,
                        new PollSpec.Modbus(
                                List.of(
                                        new Register(1, 3, 107, NumberType.INT16, "ABCD", 0.01, List.of(-32768.0)),
                                        new Register(247, 4, 8, NumberType.FLOAT32, "CDAB", 1, List.of())),
                                false)));
    }

    @Test
    void aSheetWithoutPollHasNone() {
        assertThat(Objects.requireNonNull(read(HEAD).sheet()).poll()).isNull();
    }

    @ParameterizedTest
    @ValueSource(
            strings = {
                "*TST?",
                "*CAL?",
                "CAL?",
                "CAL:ALL?",
                ":CALIBRATION:DATE?",
                "cali1:all?",
                "SENS:CAL:AUTO?",
                "TEST:ALL?",
                "DIAG:TEMP?"
            })
    void whatMakesTheInstrumentActIsRefused(String query) {
        assertThat(mistakes(SCPI, "SENS:CURR:DC:DATA?", query))
                .containsExactly(
                        "rig.toml:12:7: \"" + query + "\" makes the instrument calibrate or test itself, which is"
                                + " never asked for here; ask for a measured value, as READ? does");
    }

    @ParameterizedTest
    @ValueSource(
            strings = {
                "OUTP ON",
                "*RST",
                "VOLT 5",
                "?",
                "READ",
                "MEAS:VOLT? 10,0.001\\nOUTP ON",
                "READ?;OUTP ON",
                "READ?°"
            })
    void whatIsNoSingleQueryIsRefused(String query) {
        assertThat(mistakes(SCPI, "SENS:CURR:DC:DATA?", query))
                .singleElement()
                .asString()
                .startsWith("rig.toml:12:7: ");
    }

    @ParameterizedTest
    @ValueSource(
            strings = {"READ?", "*IDN?", ":FETCh?", "CALC:AVER:AVER?", "MEASUREMENT1?", "SENS2:DATA? \\\"VOLT\\\""})
    void whatOnlyMeasuresIsTakenAsItIs(String query) {
        SheetReading reading = read(SCPI.replace("SENS:CURR:DC:DATA?", query));
        assertThat(reading.mistakes()).isEmpty();
        assertThat(reading.notices()).noneMatch(notice -> notice.message().contains("sets the instrument up"));
    }

    @Test
    void aQueryThatSetsTheInstrumentUpIsWarnedOf() {
        assertThat(read(SCPI.replace("SENS:CURR:DC:DATA?", "MEAS:CURR:DC?")).notices())
                .extracting(Mistake::toString)
                .contains(
                        "rig.toml:12:7: \"MEAS:CURR:DC?\" sets the instrument up anew each time it is asked; set it up by"
                                + " hand and ask with READ? or FETC? where it has them");
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', textBlock = """
            address = 1,         | address = 248,    | 16:7: address of I in [poll.channels] must be a whole number from 1 to 247; see what the instrument is set to
            address = 1,         | address = 0,      | 16:7: address of I in [poll.channels] must be a whole number from 1 to 247; see what the instrument is set to
            address = 1,         | address = 1.5,    | 16:7: address of I in [poll.channels] must be a whole number from 1 to 247; see what the instrument is set to
            address = 1,         | ''                | 16:8: I in [poll.channels] has no address; add address = 1: see what the instrument is set to
            function = 4         | function = 6      | 15:22: function of V in [poll.channels] must be a whole number from 3 to 4; 3 reads holding registers, 4 input registers
            register = 8,        | register = 65535, | 15:36: register of V in [poll.channels] must be a whole number from 0 to 65534; count from 0: what a manual calls 40108 is 107
            type = "int16"       | type = "int17"    | 16:36: "int17" is no type; did you mean int16?
            , scale = 0.01       | , order = "CDAB"  | 16:52: order of I in [poll.channels] is for values of two registers; leave it out
            scale = 0.01         | scale = 0         | 16:52: scale of I in [poll.channels] makes every value the same; write it as scale = 0.1
            scale = 0.01         | sale = 0.01       | 16:52: unknown key sale in I in [poll.channels]; did you mean scale?
            kind = "modbus"      | kind = "modbu"    | 11:1: "modbu" is no kind; did you mean modbus?
            """)
    void whatIsWrongWithARegisterHasItsPlace(String from, String to, String mistake) {
        assertThat(mistakes(MODBUS, from, to)).contains("rig.toml:" + mistake);
    }

    @Test
    void everyChannelIsAskedForAndNoOther() {
        assertThat(mistakes(SCPI, "V = { q", "W = { q"))
                .containsExactly(
                        "rig.toml:11:1: [poll.channels] does not say how to ask for V; add V = { … } to it",
                        "rig.toml:13:1: unknown key W in [poll.channels]; known here: I, V");
        assertThat(mistakes(SCPI, "[poll.channels]", "[poll.chanels]"))
                .contains("rig.toml:10:1: [poll] does not say what is asked; add a [poll.channels] with every channel");
    }

    @Test
    void aPeriodOrTimeoutOfNothingIsRefused() {
        assertThat(mistakes(MODBUS, "period = 0.5", "period = 0"))
                .containsExactly(
                        "rig.toml:12:1: period of [poll] must be above 0 and not above a day; write it as period = \"1 s\"");
    }

    @Test
    void theLineIsAPortAndNoMore() {
        assertThat(mistakes(SCPI, "baud = 9600", "separator = \";\""))
                .containsExactly(
                        "rig.toml:8:1: separator of [line] is for lines, and with [poll] there are answers; leave it out");
        assertThat(mistakes(MODBUS, "\"8E1\"", "\"7E1\""))
                .containsExactly("rig.toml:9:1: Modbus RTU needs 8 data bits; write it as frame = \"8E1\", or as the"
                        + " instrument has it");
    }

    @Test
    void theLineMustBeDescribed() {
        assertThat(mistakes(SCPI, "[line]\nbaud = 9600\n", ""))
                .containsExactly(
                        "rig.toml:7:1: [poll] needs a [line]; add one with baud and frame as the instrument has them");
    }

    @Test
    void theQuestionForErrorsIsAQueryToo() {
        assertThat(poll(SCPI.replace("\"scpi\"", "\"scpi\"\nerrors = \"SYST:ERR?\""))
                        .asking())
                .isInstanceOfSatisfying(
                        PollSpec.Scpi.class, scpi -> assertThat(scpi.errors()).isEqualTo("SYST:ERR?"));
        assertThat(mistakes(SCPI, "\"scpi\"", "\"scpi\"\nerrors = \"*CLS\""))
                .containsExactly(
                        "rig.toml:11:1: \"*CLS\" is no query, and nothing else is sent; end its header in \"?\","
                                + " and set the instrument up by hand");
    }

    @Test
    void theSheetOfTheManualIsSound() throws IOException {
        String manual = Files.readString(Path.of("docs/polling.md"));
        int from = manual.indexOf("```toml\ntitle") + "```toml\n".length();
        String sheet = manual.substring(from, manual.indexOf("```", from));
        assertThat(poll(sheet).asking()).isInstanceOf(PollSpec.Modbus.class);
        assertThat(Objects.requireNonNull(read(sheet).sheet()).rehearsal()).isNotNull();
    }
}
