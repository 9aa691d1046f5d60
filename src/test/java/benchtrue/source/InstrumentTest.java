package benchtrue.source;

import static org.assertj.core.api.Assertions.assertThat;

import java.math.BigDecimal;
import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import java.util.HexFormat;
import org.jspecify.annotations.Nullable;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** The simulated instruments by themselves. */
class InstrumentTest {
    private static final HexFormat HEX = HexFormat.ofDelimiter(" ").withUpperCase();
    private static final @Nullable BigDecimal[] CELLS = {new BigDecimal("5.55"), new BigDecimal("-0.50")};

    private final PolledRig modbusRig = new PolledRig(PolledRig.MODBUS);
    private final Instrument modbus = Instrument.of(modbusRig.poll());
    private final Instrument scpi = Instrument.of(new PolledRig(PolledRig.SCPI).poll());

    private static byte[] checked(String hex) {
        byte[] body = HEX.parseHex(hex);
        byte[] frame = Arrays.copyOf(body, body.length + 2);
        Crc16.append(frame, body.length);
        return frame;
    }

    private String answered(byte[] request) {
        byte[] answer = modbus.answer(request, request.length, CELLS);
        if (answer.length == 0) {
            return "";
        }
        assertThat(Crc16.holds(answer, answer.length)).isTrue();
        return HEX.formatHex(answer, 0, answer.length - 2);
    }

    private String said(String text) {
        byte[] bytes = text.getBytes(StandardCharsets.US_ASCII);
        return new String(scpi.answer(bytes, bytes.length, CELLS), StandardCharsets.US_ASCII);
    }

    /** Codes of Modbus Application Protocol V1.1b3, chapter 7; 555 and its registers are those of 6.3. */
    @ParameterizedTest
    @CsvSource({
        "01 03 00 6B 00 01, 01 03 02 02 2B", // 5.55 at 0.01
        "11 04 00 08 00 02, 11 04 04 00 00 BF 00", // -0.5, low word first
        "01 03 00 6A 00 01, 01 83 02",
        "01 03 00 6B 00 02, 01 83 02",
        "11 04 00 08 00 01, 11 84 02",
        "01 04 00 6B 00 01, 01 84 02",
        "01 03 00 6B 00 00, 01 83 03",
        "01 03 00 6B 00 7E, 01 83 03",
        "01 06 00 6B 00 01, 01 86 01",
        "01 10 00 6B 00 01 02 00 05, 01 90 01",
        "02 03 00 6B 00 01, ''"
    })
    void modbusAnswersReadingsAndRefusesTheRest(String request, String answer) {
        assertThat(answered(checked(request))).isEqualTo(answer);
    }

    @Test
    void modbusTakesARequestInPiecesAndForgetsHalfOfOneInASilence() {
        byte[] request = checked("01 03 00 6B 00 01");
        assertThat(answered(Arrays.copyOf(request, 3))).isEmpty();
        assertThat(answered(Arrays.copyOfRange(request, 3, 8))).isEqualTo("01 03 02 02 2B");
        assertThat(answered(Arrays.copyOf(request, 3))).isEmpty();
        modbus.silence();
        assertThat(answered(request)).isEqualTo("01 03 02 02 2B");
        byte[] damaged = request.clone();
        damaged[4] ^= 1;
        assertThat(answered(damaged)).isEmpty();
    }

    @Test
    void whatHasNoValueFails() {
        byte[] request = checked("01 03 00 6B 00 01");
        byte[] answer = modbus.answer(request, request.length, new BigDecimal[2]);
        assertThat(HEX.formatHex(answer, 0, 3)).isEqualTo("01 83 04");
    }

    @Test
    void scpiAnswersTheSheetsQueriesAndNothingElse() {
        assertThat(said("SENS:CURR:DATA?\n")).isEqualTo("5.55\n");
        assertThat(said("fetc?\r\n")).isEqualTo("-0.50\n");
        assertThat(said("OUTP ON\n*RST\n")).isEmpty();
        assertThat(said("FET")).isEmpty();
        assertThat(said("C?\n")).isEqualTo("-0.50\n");
        byte[] query = "FETC?\n".getBytes(StandardCharsets.US_ASCII);
        assertThat(new String(scpi.answer(query, query.length, new BigDecimal[2]), StandardCharsets.US_ASCII))
                .isEqualTo("9.91E37\n");
    }

    @Test
    void scpiReportsWhatItDidNotUnderstand() {
        PolledRig rig = new PolledRig(PolledRig.SCPI.replace("period", "errors = \"SYST:ERR?\"\nperiod"));
        Instrument instrument = Instrument.of(rig.poll());
        byte[] messages = "OUTP ON\nSYST:ERR?\nSYST:ERR?\n".getBytes(StandardCharsets.US_ASCII);
        assertThat(instrument.answer(messages, messages.length, CELLS))
                .asString(StandardCharsets.US_ASCII)
                .isEqualTo("-113,\"Undefined header\"\n0,\"No error\"\n");
    }

    @Test
    void aCableIsCutFromTimeToTimeInTheMiddleOfALine() {
        Cable cable = new Cable(new CableFaults(10, 2, 0), 1);
        byte[] line = "1.5,2.5\r\n".getBytes(StandardCharsets.US_ASCII);
        assertThat(cable.carry(line, 0)).isEqualTo(line);
        assertThat(cable.carry(line, 9.9)).isEqualTo(line);
        assertThat(cable.carry(line, 10)).asString(StandardCharsets.US_ASCII).isEqualTo("1.5,");
        assertThat(cable.carry(line, 11.9)).isEmpty();
        assertThat(cable.carry(line, 12)).isEqualTo(line);
        assertThat(cable.carry(line, 20.5)).hasSize(4);
    }

    @Test
    void aBadCableTurnsOneBitAsOftenAsDeclared() {
        Cable cable = new Cable(new CableFaults(Double.POSITIVE_INFINITY, 0, 0.25), 1);
        byte[] line = new byte[9];
        int damaged = 0;
        for (int i = 0; i < 4000; i++) {
            byte[] arrived = cable.carry(line, i);
            int bits = 0;
            for (byte one : arrived) {
                bits += Integer.bitCount(one & 0xFF);
            }
            assertThat(bits).isBetween(0, 1);
            damaged += bits;
        }
        // Binomial: 1000 with a standard deviation of 27; four of them.
        assertThat(damaged).isBetween(890, 1110);
        assertThat(line).containsOnly(0);
    }
}
