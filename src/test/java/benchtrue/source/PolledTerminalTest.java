package benchtrue.source;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.concurrent.CompletableFuture;
import java.util.concurrent.CompletionException;
import java.util.concurrent.TimeUnit;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.Timeout;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Questions and answers over a pair of pseudo-terminals, with the simulated rig at the other end. */
@Tag("end-to-end")
@Timeout(60)
class PolledTerminalTest {
    private static final int ROUNDS = 50;

    @TempDir
    Path folder;

    @ParameterizedTest
    @ValueSource(strings = {PolledRig.SCPI, PolledRig.MODBUS, PolledRig.BLOCK})
    void theRigAnswersWithWhatItIndicatesAtTheTime(String poll) throws Exception {
        PolledRig rig = new PolledRig(poll);
        try (TerminalPair pair = new TerminalPair(folder);
                PortLink link = PortLink.open(pair.near(), rig.line())) {
            CompletableFuture<Long> answers = rig.answering(pair.far(), 1, CableFaults.NONE);
            PolledLine line = rig.over(link);
            Polled first = awaited(line);
            Polled last = first;
            for (int round = 0; round < ROUNDS; round++) {
                Polled next = line.next();
                assertThat(next.problems()).isEmpty();
                assertThat(next.values()[0]).isGreaterThanOrEqualTo(last.values()[0]);
                // The rig goes on between the question for I and that for V.
                double between = (next.stamps()[1] - next.stamps()[0]) / 1e9;
                assertThat(next.values()[1] - 2 * next.values()[0]).isBetween(-1e-4, 2 * between + 0.04);
                last = next;
            }
            double seconds = (last.nanos() - first.nanos()) / 1e9;
            assertThat(seconds).isCloseTo(ROUNDS * 0.02, within(0.3));
            assertThat(last.values()[0] - first.values()[0]).as("1 A/s").isCloseTo(seconds, within(0.1));
            assertThat(answers).isNotDone();
            pair.pull();
            assertThatThrownBy(answers::join).hasRootCauseInstanceOf(IOException.class);
        }
    }

    /** The answerer may take a moment to open its port. */
    private static Polled awaited(PolledLine line) throws IOException, InterruptedException {
        Polled polled = line.next();
        while (!polled.answered()) {
            polled = line.next();
        }
        return polled;
    }

    @Test
    void aCutCableIsSilentAndThenAnswersAgain() throws Exception {
        PolledRig rig = new PolledRig(PolledRig.SCPI);
        try (TerminalPair pair = new TerminalPair(folder);
                PortLink link = PortLink.open(pair.near(), rig.line())) {
            CompletableFuture<Long> answers = rig.answering(pair.far(), 1, new CableFaults(2, 0.5, 0));
            PolledLine line = rig.over(link);
            awaited(line);
            Polled lost = line.next();
            while (lost.answered()) {
                lost = line.next();
            }
            assertThat(lost.problems())
                    .hasSize(1)
                    .first()
                    .asString()
                    .contains("within 0.4 s")
                    .contains("asked again in");
            Polled again = awaited(line);
            assertThat(again.nanos() - lost.nanos()).isLessThan(TimeUnit.SECONDS.toNanos(2));
            pair.pull();
            assertThatThrownBy(answers::join).isInstanceOf(CompletionException.class);
        }
    }

    @Test
    void damagedModbusAnswersAreNeverValues() throws Exception {
        PolledRig rig = new PolledRig(PolledRig.MODBUS);
        try (TerminalPair pair = new TerminalPair(folder);
                PortLink link = PortLink.open(pair.near(), rig.line())) {
            CompletableFuture<Long> answers = rig.answering(pair.far(), 1, new CableFaults(1e9, 0, 0.1));
            PolledLine line = rig.over(link);
            awaited(line);
            int damaged = 0;
            for (int round = 0; round < ROUNDS; round++) {
                Polled next = line.next();
                damaged += next.problems().size();
                assertThat(next.values()[0])
                        .satisfiesAnyOf(
                                v -> assertThat(v).isNaN(), v -> assertThat(v).isBetween(0.0, 20.0));
                assertThat(next.values()[1])
                        .satisfiesAnyOf(
                                v -> assertThat(v).isNaN(), v -> assertThat(v).isBetween(0.0, 40.0));
            }
            assertThat(damaged).isPositive();
            pair.pull();
            assertThatThrownBy(answers::join).isInstanceOf(CompletionException.class);
        }
    }

    @Test
    void aPulledCableEndsTheLineAndItsReturnBeginsAnother() throws Exception {
        PolledRig rig = new PolledRig(PolledRig.MODBUS);
        for (int i = 0; i < 3; i++) {
            TerminalPair pair = new TerminalPair(folder);
            try (PortLink link = PortLink.open(pair.near(), rig.line())) {
                CompletableFuture<Long> answers = rig.answering(pair.far(), 1, CableFaults.NONE);
                PolledLine line = rig.over(link);
                awaited(line);
                pair.pull();
                assertThatThrownBy(() -> {
                            while (true) {
                                line.next();
                            }
                        })
                        .isInstanceOf(IOException.class)
                        .hasMessage("the port is gone");
                assertThatThrownBy(answers::join).isInstanceOf(CompletionException.class);
            }
        }
    }

    @Test
    void theRehearsalEnds() throws Exception {
        PolledRig rig = new PolledRig(PolledRig.SCPI);
        try (TerminalPair pair = new TerminalPair(folder);
                PortLink link = PortLink.open(pair.near(), rig.line())) {
            CompletableFuture<Long> answers = rig.answering(pair.far(), 10, CableFaults.NONE);
            PolledLine line = rig.over(link);
            while (!answers.isDone()) {
                line.next();
            }
            assertThat(answers.join()).as("questions in 2 s").isBetween(50L, 204L);
        }
    }

    @Test
    void aFloodIsNoAnswerAndDoesNoHarm() throws Exception {
        PolledRig rig = new PolledRig(PolledRig.SCPI);
        byte[] flood = "\33[2J\0\377".repeat(20_000).getBytes(StandardCharsets.ISO_8859_1);
        try (TerminalPair pair = new TerminalPair(folder);
                PortLink link = PortLink.open(pair.near(), rig.line())) {
            PolledLine line = rig.over(link);
            PortLink far = PortLink.open(pair.far(), rig.line());
            CompletableFuture<Void> flooding = CompletableFuture.runAsync(() -> {
                try {
                    far.write(flood, flood.length);
                } catch (IOException e) {
                    throw new CompletionException(e);
                }
            });
            Polled during = line.next();
            assertThat(during.answered()).isFalse();
            assertThat(during.problems()).containsExactly("I: bytes without end, no answer; asked again in 0.4 s");
            while (!flooding.isDone()) {
                line.next();
            }
            far.close();
            CompletableFuture<Long> answers = rig.answering(pair.far(), 1, CableFaults.NONE);
            assertThat(awaited(line).problems()).isEmpty();
            pair.pull();
            assertThatThrownBy(answers::join).isInstanceOf(CompletionException.class);
        }
    }
}
