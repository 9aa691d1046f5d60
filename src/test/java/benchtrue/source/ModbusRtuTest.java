package benchtrue.source;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import benchtrue.sheet.PollSpec;
import benchtrue.sheet.PollSpec.NumberType;
import benchtrue.sheet.PollSpec.Register;
import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import java.util.HexFormat;
import java.util.List;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Frames are those of the Modbus Application Protocol V1.1b3 with an address before and the check behind them. */
class ModbusRtuTest {
    private static final HexFormat HEX = HexFormat.ofDelimiter(" ");

    private static ModbusRtu modbus(Register register) {
        return new ModbusRtu(new PollSpec.Modbus(List.of(register), false), Sheets.line("8E1"));
    }

    private static Register holding(int register, NumberType type, double scale) {
        return new Register(17, 3, register, type, "ABCD", scale, List.of());
    }

    /** With its check. */
    private static byte[] frame(String hex) {
        byte[] body = HEX.parseHex(hex);
        byte[] frame = Arrays.copyOf(body, body.length + 2);
        Crc16.append(frame, body.length);
        return frame;
    }

    private static Poller.Reply reply(Register register, byte[] bytes) {
        return modbus(register).reply(0, bytes, bytes.length);
    }

    private static Poller.Result result(Register register, byte[] bytes) {
        return ((Poller.Answer) reply(register, bytes)).results().get(0);
    }

    private static double value(Register register, String hex) {
        return ((Poller.Value) result(register, frame(hex))).value();
    }

    /** The catalogue of parametrised CRC algorithms (reveng.sourceforge.io) gives this check of CRC-16/MODBUS over 123456789. */
    @Test
    void theCheckIsThatOfTheCatalogue() {
        byte[] digits = "123456789".getBytes(StandardCharsets.US_ASCII);
        assertThat(Crc16.of(digits, digits.length)).isEqualTo(0x4B37);
    }

    /** Modbus over Serial Line V1.02, 6.2.2: for address 2, function 7 the check is 1241 (hexadecimal), sent low byte first: 41 12. */
    @Test
    void theCheckIsSentLowByteFirst() {
        assertThat(HEX.formatHex(frame("02 07"))).isEqualTo("02 07 41 12");
        assertThat(Crc16.holds(HEX.parseHex("02 07 41 12"), 4)).isTrue();
        assertThat(Crc16.holds(HEX.parseHex("02 07 12 41"), 4)).isFalse();
    }

    /** V1.1b3, 6.3: registers 108–110 are asked for as 03 00 6B 00 03; here one of them. 6.4: input register 9 as 04 00 08 00 01. */
    @Test
    void questionsAreThoseOfTheSpecification() {
        assertThat(modbus(holding(0x6B, NumberType.INT16, 1)).request(0)).isEqualTo(frame("11 03 00 6B 00 01"));
        Register input = new Register(1, 4, 8, NumberType.UINT16, "ABCD", 1, List.of());
        assertThat(modbus(input).request(0)).isEqualTo(frame("01 04 00 08 00 01"));
        assertThat(modbus(holding(0xFFFE, NumberType.FLOAT32, 1)).request(0)).isEqualTo(frame("11 03 FF FE 00 02"));
    }

    /** V1.1b3, 6.3: register 108 holds 02 2B, decimal 555; 6.4: input register 9 holds 00 0A, decimal 10. */
    @Test
    void answersAreThoseOfTheSpecification() {
        assertThat(value(holding(0x6B, NumberType.INT16, 1), "11 03 02 02 2B")).isEqualTo(555);
        Register input = new Register(1, 4, 8, NumberType.UINT16, "ABCD", 0.5, List.of());
        assertThat(value(input, "01 04 02 00 0A")).isEqualTo(5);
    }

    /** IEEE 754: 3F 9D F3 B6 is 1.234 in single precision (computed with another language's struct module). */
    @ParameterizedTest
    @CsvSource({
        "FLOAT32, ABCD, 3F 9D F3 B6, 1.234",
        "FLOAT32, CDAB, F3 B6 3F 9D, 1.234",
        "FLOAT32, BADC, 9D 3F B6 F3, 1.234",
        "FLOAT32, DCBA, B6 F3 9D 3F, 1.234",
        "INT32, ABCD, FF FF FF FE, -2",
        "INT32, CDAB, E2 40 00 01, 123456",
        "UINT32, ABCD, FF FF FF FE, 4294967294",
        "INT16, ABCD, FF FE, -2",
        "UINT16, ABCD, FF FE, 65534"
    })
    void registersMakeNumbersAndNumbersRegisters(NumberType type, String order, String hex, double number) {
        Register register = new Register(17, 3, 0, type, order, 1, List.of());
        String count = type.registers() == 1 ? "02 " : "04 ";
        assertThat(value(register, "11 03 " + count + hex)).isCloseTo(number, within(Math.ulp((float) number) / 2.0));
        assertThat(HEX.formatHex(RegisterValues.bytes(register, number))).isEqualToIgnoringCase(hex);
    }

    @Test
    void aNumberThatARegisterCannotHoldIsItsNearest() {
        Register register = holding(0, NumberType.INT16, 1);
        assertThat(HEX.formatHex(RegisterValues.bytes(register, 1e6))).isEqualTo("7f ff");
        assertThat(HEX.formatHex(RegisterValues.bytes(register, -1e6))).isEqualTo("80 00");
    }

    /** V1.1b3, chapter 7: an exception has the function's highest bit set, and 02 is ILLEGAL DATA ADDRESS. */
    @Test
    void anExceptionIsSaidInWords() {
        Register register = holding(0x6B, NumberType.FLOAT32, 1);
        assertThat(result(register, frame("11 83 02")))
                .isEqualTo(new Poller.NoValue("it has no such register (exception 2)"));
        assertThat(result(register, frame("11 83 06"))).isEqualTo(new Poller.NoValue("it is busy (exception 6)"));
    }

    @Test
    void anAnswerIsAwaitedToItsEnd() {
        Register register = holding(0x6B, NumberType.FLOAT32, 1);
        byte[] whole = frame("11 03 04 3F 9D F3 B6");
        for (int length = 0; length < whole.length; length++) {
            assertThat(modbus(register).reply(0, whole, length)).isInstanceOf(Poller.Unfinished.class);
        }
        assertThat(reply(register, whole)).isInstanceOf(Poller.Answer.class);
    }

    @Test
    void noFlippedBitGoesUnnoticed() {
        Register register = holding(0x6B, NumberType.FLOAT32, 1);
        byte[] whole = frame("11 03 04 3F 9D F3 B6");
        for (int bit = 0; bit < whole.length * Byte.SIZE; bit++) {
            byte[] damaged = whole.clone();
            damaged[bit / Byte.SIZE] ^= (byte) (1 << bit % Byte.SIZE);
            assertThat(reply(register, damaged)).as("bit %d", bit).isInstanceOf(Poller.Garbled.class);
        }
    }

    @Test
    void anotherInstrumentsOrAnotherQuestionsAnswerIsNotTaken() {
        Register register = holding(0x6B, NumberType.FLOAT32, 1);
        assertThat(reply(register, frame("12 03 04 3F 9D F3 B6")))
                .isEqualTo(new Poller.Garbled("an answer of address 18, which was not asked"));
        assertThat(reply(register, frame("11 04 04 3F 9D F3 B6"))).isInstanceOf(Poller.Garbled.class);
        assertThat(result(register, frame("11 03 04 7F C0 00 00"))).isInstanceOf(Poller.NoValue.class);
    }

    @Test
    void anEchoOfTheQuestionIsPassedOver() {
        for (NumberType type : NumberType.values()) {
            Register register = holding(0x6B, type, 1);
            byte[] answer = frame(type.registers() == 1 ? "11 03 02 02 2B" : "11 03 04 00 00 02 2B");
            byte[] echo = modbus(register).request(0);
            byte[] both = Arrays.copyOf(echo, echo.length + answer.length);
            System.arraycopy(answer, 0, both, echo.length, answer.length);
            for (int length = 0; length < both.length; length++) {
                assertThat(modbus(register).reply(0, both, length)).isInstanceOf(Poller.Unfinished.class);
            }
            assertThat(reply(register, both)).isInstanceOf(Poller.Answer.class);
        }
    }

    /** Modbus over Serial Line V1.02, 2.5.1.1: 3.5 characters of 11 bits; above 19 200 baud 1.750 ms. */
    @Test
    void theSilenceBeforeAMessageIsThatOfTheSpecification() {
        assertThat(ModbusRtu.silenceNanos(9600, "8E1") / 1e6).isCloseTo(4.0104, within(1e-4));
        assertThat(ModbusRtu.silenceNanos(19_200, "8N2") / 1e6).isCloseTo(2.0052, within(1e-4));
        assertThat(ModbusRtu.silenceNanos(9600, "8N1") / 1e6).isCloseTo(3.6458, within(1e-4));
        assertThat(ModbusRtu.silenceNanos(115_200, "8E1")).isEqualTo(1_750_000);
    }

    @Test
    void wholeNumbersAreScaledAsDecimals() {
        assertThat(value(holding(0x6B, NumberType.INT16, 0.001), "11 03 02 07 D2"))
                .isEqualTo(2.002);
        assertThat(value(holding(0x6B, NumberType.UINT32, 1e-6), "11 03 04 FF FF FF FF"))
                .isEqualTo(4294.967295);
        assertThat(value(holding(0x6B, NumberType.INT16, -0.1), "11 03 02 00 03"))
                .isEqualTo(-0.3);
    }

    /** Noise on the line: whatever comes, it is answered by one of the four kinds of reply. */
    @Test
    void noBytesAreTakenForAValueByChance() {
        Register register = holding(0x6B, NumberType.FLOAT32, 1);
        Noise noise = new Noise(7, 0);
        for (int i = 0; i < 20_000; i++) {
            byte[] bytes = new byte[(int) (noise.uniform() * 40)];
            for (int k = 0; k < bytes.length; k++) {
                bytes[k] = (byte) (noise.uniform() * 256);
            }
            assertThat(reply(register, bytes)).isInstanceOfAny(Poller.Unfinished.class, Poller.Garbled.class);
        }
    }

    private static List<List<Integer>> questions(boolean single, Register... registers) {
        ModbusRtu modbus = new ModbusRtu(new PollSpec.Modbus(List.of(registers), single), Sheets.line("8E1"));
        return IntStream.range(0, modbus.questions())
                .mapToObj(q -> Arrays.stream(modbus.channels(q)).boxed().toList())
                .toList();
    }

    @Test
    void onlyValuesWithoutAGapBetweenThemShareAQuestion() {
        Register zero = holding(0, NumberType.FLOAT32, 1);
        Register two = holding(2, NumberType.INT16, 1);
        Register four = holding(4, NumberType.INT16, 1);
        Register elsewhere = new Register(18, 3, 3, NumberType.INT16, "ABCD", 1, List.of());
        Register input = new Register(17, 4, 3, NumberType.INT16, "ABCD", 1, List.of());
        assertThat(questions(false, two, elsewhere, four, zero, input))
                .containsExactly(List.of(3, 0), List.of(1), List.of(2), List.of(4));
        assertThat(questions(false, two, two)).as("twice the same").containsExactly(List.of(0), List.of(1));
        assertThat(questions(true, two, zero)).containsExactly(List.of(0), List.of(1));
    }

    /** V1.1b3, 6.3: 1 to 125 registers. */
    @Test
    void noQuestionAsksForMoreThanTheSpecificationAllows() {
        Register[] many = IntStream.range(0, 126)
                .mapToObj(i -> holding(i, NumberType.INT16, 1))
                .toArray(Register[]::new);
        assertThat(questions(false, many)).extracting(List::size).containsExactly(125, 1);
    }

    @Test
    void aNumberThatStandsForNoneIsNoValue() {
        Register register = new Register(17, 3, 0, NumberType.INT16, "ABCD", 0.1, List.of(-32768.0, 32767.0));
        assertThat(result(register, frame("11 03 02 80 00")))
                .isEqualTo(new Poller.NoValue("it answers -32768, which the sheet declares as missing"));
        assertThat(result(register, frame("11 03 02 7F FE"))).isEqualTo(new Poller.Value(3276.6));
    }
}
