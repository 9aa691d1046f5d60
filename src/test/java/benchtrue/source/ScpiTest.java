package benchtrue.source;

import static org.assertj.core.api.Assertions.assertThat;

import benchtrue.sheet.PollSpec;
import java.nio.charset.StandardCharsets;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class ScpiTest {
    private final Scpi scpi = new Scpi(new PollSpec.Scpi(List.of("READ?", "SENS:TEMP?"), "\n", null));

    /** What is said of the channel; the reply itself where it is no answer. */
    private Object reply(String text) {
        byte[] bytes = text.getBytes(StandardCharsets.ISO_8859_1);
        Poller.Reply reply = scpi.reply(0, bytes, bytes.length);
        return reply instanceof Poller.Answer answer ? answer.results().get(0) : reply;
    }

    @Test
    void aMessageIsOneQueryAndItsTerminator() {
        assertThat(new String(scpi.request(1), StandardCharsets.US_ASCII)).isEqualTo("SENS:TEMP?\n");
        assertThat(new String(
                        new Scpi(new PollSpec.Scpi(List.of("READ?"), "\r\n", null)).request(0),
                        StandardCharsets.US_ASCII))
                .isEqualTo("READ?\r\n");
    }

    /** The three forms of decimal numbers of IEEE 488.2-1992, 8.7.2 to 8.7.4: NR1, NR2, NR3. */
    @ParameterizedTest
    @CsvSource({"12, 12", "-12, -12", "+1.50, 1.5", ".5, 0.5", "+1.23456789E-03, 0.00123456789", "4e1, 40", "5., 5"})
    void numbersComeInThreeForms(String text, double number) {
        assertThat(reply(text + "\n")).isEqualTo(new Poller.Value(number));
        assertThat(reply(" " + text + " \r\n")).isEqualTo(new Poller.Value(number));
    }

    /** SCPI-1999 volume 1, 7.2.1: infinity is 9.9E37, not a number 9.91E37. */
    @ParameterizedTest
    @CsvSource({"+9.90000000E+37, overload", "-9.9E37, overload", "9.91E37, not a number"})
    void overloadAndNotANumberAreNoValues(String text, String why) {
        assertThat(reply(text + "\n"))
                .isInstanceOfSatisfying(
                        Poller.NoValue.class, none -> assertThat(none.why()).endsWith(why));
        assertThat(reply("9.89E37\n")).isEqualTo(new Poller.Value(9.89e37));
    }

    @ParameterizedTest
    @ValueSource(strings = {"OL", "1.5,2.5", "1.5 V", "NaN", "0x10", "1d", "1,5", "--", "1e999"})
    void whatIsNotOneFiniteNumberIsNoValue(String text) {
        assertThat(reply(text + "\n")).isInstanceOf(Poller.NoValue.class);
    }

    @Test
    void whatAnInstrumentSendsIsQuotedHarmlessly() {
        assertThat(reply("\33[2J" + "x".repeat(100) + "\n"))
                .isEqualTo(new Poller.NoValue("it answers \"?[2J" + "x".repeat(36) + "…\", which is not one number"));
    }

    @Test
    void anAnswerEndsWithItsTerminator() {
        assertThat(reply("")).isInstanceOf(Poller.Unfinished.class);
        assertThat(reply("+1.5\r")).isInstanceOf(Poller.Unfinished.class);
        assertThat(reply("\n\r\n")).isInstanceOf(Poller.Unfinished.class);
        assertThat(reply("\n+1.5\n")).isEqualTo(new Poller.Value(1.5));
        assertThat(reply("1".repeat(5000))).isInstanceOf(Poller.Garbled.class);
    }

    @Test
    void anEchoOfTheQueryIsPassedOver() {
        assertThat(reply("READ?\r\n")).isInstanceOf(Poller.Unfinished.class);
        assertThat(reply("READ?\r\n+1.5\r\n")).isEqualTo(new Poller.Value(1.5));
    }
}
