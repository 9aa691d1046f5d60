package benchtrue.record;

import static org.assertj.core.api.Assertions.assertThat;

import benchtrue.sheet.SheetReader;
import java.nio.charset.StandardCharsets;
import java.util.Objects;
import org.junit.jupiter.api.Test;

class PollTextTest {
    private static String page(String poll) {
        String sheet = """
                title = "rig"
                [channels]
                I = { unit = "A" }
                V = { unit = "V" }
                [[relations]]
                equation = "V = R*I"
                [line]
                baud = 9600
                """ + poll;
        return SheetPage.of(Objects.requireNonNull(SheetReader.read("rig.toml", sheet.getBytes(StandardCharsets.UTF_8))
                .sheet()));
    }

    @Test
    void aSheetShowsItsQueries() {
        assertThat(page("""
                [poll]
                kind = "scpi"
                [poll.channels]
                I = { query = "SENS:CURR:DATA?" }
                V = { query = "FETC?" }
                """)).contains("""
                Questions
                ---------
                  Asked over SCPI every 1 s, one after the other; an answer may take 2 s.
                  I  SENS:CURR:DATA?
                  V  FETC?
                """);
    }

    @Test
    void aSheetShowsItsRegisters() {
        assertThat(page("""
                [poll]
                kind = "modbus"
                period = 0.05
                [poll.channels]
                I = { address = 1, register = 107, type = "int16", scale = 0.001 }
                V = { address = 17, function = 4, register = 8, type = "float32", order = "CDAB" }
                """)).contains("""
                  Asked over Modbus RTU every 0.05 s, one after the other; an answer may take
                  0.5 s.
                     address  function     register  type     order  scale
                  I        1  3 (holding)       107  int16           0.001
                  V       17  4 (input)           8  float32  CDAB       1
                """);
    }
}
