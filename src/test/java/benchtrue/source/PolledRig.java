package benchtrue.source;

import static org.assertj.core.api.Assertions.assertThat;

import benchtrue.sheet.BenchSheet;
import benchtrue.sheet.LineSpec;
import benchtrue.sheet.PollSpec;
import benchtrue.sheet.Rehearsal;
import benchtrue.sheet.SheetReader;
import benchtrue.sheet.SheetReading;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.util.Objects;
import java.util.concurrent.CompletableFuture;
import java.util.concurrent.CompletionException;

/** A rig that is asked: V = 2·I without noise, I rising by 0.01 A with each of 100 readings a second. */
final class PolledRig {
    static final String SCPI = """
            [poll]
            kind = "scpi"
            period = 0.02
            timeout = 0.4
            [poll.channels]
            I = { query = "SENS:CURR:DATA?" }
            V = { query = "FETC?" }
            """;

    static final String MODBUS = """
            [poll]
            kind = "modbus"
            period = 0.02
            timeout = 0.4
            [poll.channels]
            I = { address = 1, register = 107, type = "int16", scale = 0.01 }
            V = { address = 17, function = 4, register = 8, type = "float32", order = "CDAB" }
            """;

    /** Both values in one instrument, one behind the other. */
    static final String BLOCK = """
            [poll]
            kind = "modbus"
            period = 0.02
            timeout = 0.4
            [poll.channels]
            I = { address = 1, register = 107, type = "int16", scale = 0.01 }
            V = { address = 1, register = 108, type = "float32" }
            """;

    private final BenchSheet sheet;

    /** @param poll the sheet's [poll] */
    PolledRig(String poll) {
        SheetReading reading = SheetReader.read("rig.toml", ("""
                title = "asked"
                [channels]
                I = { unit = "A", resolution = 0.01 }
                V = { unit = "V", resolution = 0.01 }
                [[relations]]
                equation = "V = R*I"
                [line]
                baud = 19200
                frame = "8E1"
                [rehearsal]
                rate = 100
                duration = 20
                [rehearsal.truth]
                R = 2
                [rehearsal.channels]
                I = { ramps = [[0, 0], [20, 20]] }
                """ + poll).getBytes(StandardCharsets.UTF_8));
        assertThat(reading.mistakes()).isEmpty();
        sheet = Objects.requireNonNull(reading.sheet());
    }

    BenchSheet sheet() {
        return sheet;
    }

    LineSpec line() {
        return Objects.requireNonNull(sheet.line());
    }

    PollSpec poll() {
        return Objects.requireNonNull(sheet.poll());
    }

    Rehearsal rehearsal() {
        return Objects.requireNonNull(sheet.rehearsal());
    }

    PolledLine over(SerialLink link) {
        return new PolledLine(sheet, poll(), Poller.of(poll(), line()), link, Ticker.SYSTEM);
    }

    /** Answers on the port until it is gone or the rehearsal is over. */
    CompletableFuture<Long> answering(String port, double pace, CableFaults faults) {
        return CompletableFuture.supplyAsync(() -> {
            try {
                return PollAnswerer.answer(sheet, rehearsal(), poll(), line(), port, pace, faults, 1);
            } catch (IOException | InterruptedException e) {
                throw new CompletionException(e);
            }
        });
    }
}
