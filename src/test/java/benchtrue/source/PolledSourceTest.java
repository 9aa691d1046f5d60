package benchtrue.source;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import benchtrue.reading.Reading;
import benchtrue.source.Source.Outcome;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.concurrent.CompletableFuture;
import java.util.concurrent.TimeUnit;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.Timeout;
import org.junit.jupiter.api.io.TempDir;

/** A live run of instruments that are asked, over pseudo-terminals. */
@Tag("end-to-end")
@Timeout(60)
class PolledSourceTest {
    @TempDir
    Path folder;

    private final PolledRig rig = new PolledRig(PolledRig.SCPI);
    private final Reading reading = new Reading(2);
    private final Kept kept = new Kept();

    /** What was recorded. */
    private static final class Kept implements Recording {
        private final List<String> raw = Collections.synchronizedList(new ArrayList<>());
        private final List<Long> times = new ArrayList<>();
        private final List<double[]> values = new ArrayList<>();
        private int unread;

        @Override
        public void raw(long utcMicros, byte[] line) {
            raw.add(new String(line, StandardCharsets.US_ASCII));
        }

        @Override
        public void reading(long utcMicros, double[] recorded) {
            times.add(utcMicros);
            values.add(recorded.clone());
        }

        @Override
        public void unread(long utcMicros) {
            times.add(utcMicros);
            unread++;
        }
    }

    private Outcome awaited(Source source, Outcome wanted) {
        while (true) {
            Outcome outcome = source.next(reading);
            if (outcome == wanted) {
                return outcome;
            }
        }
    }

    @Test
    void readingsAreThoseThatAreRecorded() throws Exception {
        try (TerminalPair pair = new TerminalPair(folder)) {
            CompletableFuture<Long> answers = rig.answering(pair.far(), 1, CableFaults.NONE);
            try (PolledSource source = PolledSource.open(pair.near(), rig.sheet(), Recorded.NOTHING, kept)) {
                double before = -1;
                for (int number = 1; number <= 50; number++) {
                    awaited(source, Outcome.READING);
                    assertThat(reading.number).isEqualTo(number);
                    assertThat(reading.time).isGreaterThan(before);
                    assertThat(reading.values).containsExactly(kept.values.get(number - 1));
                    before = reading.time;
                }
                assertThat(source.startedUtc()).isNotNull();
                assertThat(before).as("50 rounds of 20 ms").isBetween(0.9, 3.0);
            }
            assertThat(kept.times).isSorted().doesNotHaveDuplicates();
            assertThat(kept.raw).hasSizeGreaterThanOrEqualTo(100).allMatch(line -> line.endsWith("\n"));
            pair.pull();
            assertThatThrownBy(answers::join).hasRootCauseInstanceOf(IOException.class);
        }
    }

    @Test
    void aPulledCableIsLostAndItsReturnIsAskedAgain() throws Exception {
        TerminalPair first = new TerminalPair(folder);
        CompletableFuture<Long> answers = rig.answering(first.far(), 1, CableFaults.NONE);
        try (PolledSource source = PolledSource.open(first.near(), rig.sheet(), Recorded.NOTHING, kept)) {
            awaited(source, Outcome.READING);
            first.pull();
            awaited(source, Outcome.LOST);
            assertThat(source.problem()).isEqualTo(first.near() + ": the line is gone");
            assertThatThrownBy(answers::join).hasRootCauseInstanceOf(IOException.class);
            try (TerminalPair second = new TerminalPair(folder)) {
                CompletableFuture<Long> again = rig.answering(second.far(), 1, CableFaults.NONE);
                long start = System.nanoTime();
                awaited(source, Outcome.READING);
                assertThat(System.nanoTime() - start).isLessThan(TimeUnit.SECONDS.toNanos(3));
                second.pull();
                assertThatThrownBy(again::join).hasRootCauseInstanceOf(IOException.class);
            }
        }
    }

    @Test
    void aQuestionWithoutAnswerCountsAsALineThatCouldNotBeRead() throws Exception {
        try (TerminalPair pair = new TerminalPair(folder);
                PolledSource source = PolledSource.open(pair.near(), rig.sheet(), Recorded.NOTHING, kept)) {
            awaited(source, Outcome.MALFORMED);
            assertThat(source.problem()).isEqualTo(pair.near() + ": I: no answer within 0.4 s; asked again in 0.4 s");
            assertThat(kept.unread).isEqualTo(1);
            assertThat(source.startedUtc()).isNull();
        }
    }
}
