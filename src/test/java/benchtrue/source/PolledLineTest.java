package benchtrue.source;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import benchtrue.sheet.BenchSheet;
import benchtrue.sheet.PollSpec;
import benchtrue.sheet.PollSpec.NumberType;
import benchtrue.sheet.PollSpec.Register;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Deque;
import java.util.List;
import org.junit.jupiter.api.Test;

/** Against an instrument that the test plays, on a clock that the test moves. */
class PolledLineTest {
    private static final long MILLI = 1_000_000;

    private final BenchSheet sheet = Sheets.of("I", "A", "V", "V");
    private final FakeLine line = new FakeLine();

    /** What is to come, and when; each question takes the next of the replies. */
    private static final class FakeLine implements SerialLink, Ticker {
        private record Coming(long at, byte[] bytes) {}

        private final List<String> asked = new ArrayList<>();
        private final List<Long> askedAt = new ArrayList<>();
        private final Deque<String> replies = new ArrayDeque<>();
        private final Deque<Coming> coming = new ArrayDeque<>();
        private long delay = 10 * MILLI;
        private long now = 1;
        private boolean gone;

        @Override
        public long nanos() {
            return now;
        }

        @Override
        public void sleep(long nanos) {
            now += Math.max(0, nanos);
        }

        @Override
        public int read(byte[] into) {
            long end = now + PortLink.WAIT_MILLIS * MILLI;
            if (gone) {
                return -1;
            }
            if (coming.isEmpty() || coming.element().at > end) {
                now = end;
                return 0;
            }
            Coming next = coming.remove();
            now = Math.max(now, next.at);
            System.arraycopy(next.bytes, 0, into, 0, next.bytes.length);
            return next.bytes.length;
        }

        @Override
        public void write(byte[] bytes, int length) {
            asked.add(new String(bytes, 0, length, StandardCharsets.ISO_8859_1));
            askedAt.add(now / MILLI);
            String reply = replies.isEmpty() ? "" : replies.remove();
            if (!reply.isEmpty()) {
                coming.add(new Coming(now + delay, reply.getBytes(StandardCharsets.ISO_8859_1)));
            }
        }

        @Override
        public void discard() {
            coming.removeIf(c -> c.at <= now);
        }
    }

    private PolledLine scpi() {
        PollSpec spec = new PollSpec(1, 0.5, new PollSpec.Scpi(List.of("I?", "V?"), "\n", null));
        return new PolledLine(sheet, spec, Poller.of(spec, Sheets.line("8N1")), line, line);
    }

    private PolledLine modbus() {
        Register one = new Register(1, 3, 0, NumberType.INT16, "ABCD", 1, List.of());
        Register two = new Register(2, 3, 0, NumberType.INT16, "ABCD", 1, List.of());
        PollSpec spec = new PollSpec(0.1, 0.5, new PollSpec.Modbus(List.of(one, two), false));
        return new PolledLine(sheet, spec, Poller.of(spec, Sheets.line("8N1")), line, line);
    }

    private static String frame(int... body) {
        byte[] frame = new byte[body.length + 2];
        for (int i = 0; i < body.length; i++) {
            frame[i] = (byte) body[i];
        }
        Crc16.append(frame, body.length);
        return new String(frame, StandardCharsets.ISO_8859_1);
    }

    @Test
    void oneQuestionAfterTheOtherAndEachAnswerHasItsOwnStamp() throws Exception {
        PolledLine polled = scpi();
        line.replies.addAll(List.of("1.5\n", "3.25\n"));
        Polled round = polled.next();
        assertThat(line.asked).containsExactly("I?\n", "V?\n");
        assertThat(round.values()).containsExactly(1.5, 3.25);
        assertThat(round.stamps()).containsExactly(1 + 10 * MILLI, 1 + 20 * MILLI);
        assertThat(round.nanos()).isEqualTo(1 + 10 * MILLI);
        assertThat(round.answers()[1]).asString(StandardCharsets.US_ASCII).isEqualTo("3.25\n");
        assertThat(round.problems()).isEmpty();
        assertThat(round.answered()).isTrue();
    }

    @Test
    void roundsKeepTheirPeriod() throws Exception {
        PolledLine polled = scpi();
        line.replies.addAll(List.of("1\n", "2\n", "1\n", "2\n", "1\n", "2\n"));
        for (int i = 0; i < 3; i++) {
            polled.next();
        }
        assertThat(line.askedAt).containsExactly(0L, 10L, 1000L, 1010L, 2000L, 2010L);
    }

    @Test
    void aRoundThatTakesLongerThanThePeriodIsFollowedAtOnce() throws Exception {
        PolledLine polled = modbus();
        line.delay = 150 * MILLI;
        for (int i = 0; i < 2; i++) {
            line.replies.addAll(List.of(frame(1, 3, 2, 0, 5), frame(2, 3, 2, 0, 6)));
            assertThat(polled.next().values()).containsExactly(5, 6);
        }
        // The silence of 3.5 characters lies between an answer and the next question.
        assertThat(line.askedAt.get(2)).isBetween(300L, 310L);
    }

    @Test
    void aLateAnswerIsNotTakenForTheNextOne() throws Exception {
        PolledLine polled = scpi();
        line.delay = 700 * MILLI;
        line.replies.add("111\n");
        Polled first = polled.next();
        assertThat(first.values()).containsExactly(Double.NaN, Double.NaN);
        assertThat(first.answered()).isFalse();
        assertThat(first.problems()).containsExactly("I: no answer within 0.5 s; asked again in 0.5 s");
        line.delay = 10 * MILLI;
        line.replies.addAll(List.of("1\n", "2\n"));
        assertThat(polled.next().values()).containsExactly(1, 2);
        assertThat(line.asked).containsExactly("I?\n", "I?\n", "V?\n");
    }

    @Test
    void aSilentInstrumentIsAskedLessAndLessOften() throws Exception {
        PolledLine polled = scpi();
        for (int i = 0; i < 6; i++) {
            polled.next();
        }
        List<Long> gaps = new ArrayList<>();
        for (int i = 1; i < line.askedAt.size(); i++) {
            gaps.add((line.askedAt.get(i) - line.askedAt.get(i - 1)) / 100);
        }
        // A timeout of 0.5 s, which ends with a read of 0.2 s, then 0.5, 1, 2, 4, 5 s.
        assertThat(gaps).containsExactly(11L, 16L, 26L, 46L, 56L);
        line.replies.addAll(List.of("1\n", "2\n", "", "1\n"));
        assertThat(polled.next().problems()).isEmpty();
        assertThat(polled.next().problems()).containsExactly("I: no answer within 0.5 s; asked again in 0.5 s");
    }

    @Test
    void aSilentInstrumentDoesNotKeepTheOthersWaiting() throws Exception {
        PolledLine polled = modbus();
        line.replies.addAll(List.of("", frame(2, 3, 2, 0, 6)));
        Polled first = polled.next();
        assertThat(first.values()).containsExactly(Double.NaN, 6);
        assertThat(first.problems()).containsExactly("I: no answer within 0.5 s; asked again in 0.5 s");
        line.replies.add(frame(2, 3, 2, 0, 7));
        long start = line.now;
        Polled second = polled.next();
        assertThat(second.values()).containsExactly(Double.NaN, 7);
        assertThat(second.problems()).isEmpty();
        assertThat(line.now - start).isLessThan(200 * MILLI);
    }

    @Test
    void aGarbledAnswerIsNoValueAndIsSaid() throws Exception {
        PolledLine polled = modbus();
        line.replies.addAll(List.of(frame(2, 3, 2, 0, 5), frame(2, 0x83, 4)));
        Polled round = polled.next();
        assertThat(round.values()).containsExactly(Double.NaN, Double.NaN);
        assertThat(round.problems())
                .containsExactly(
                        "I: an answer of address 2, which was not asked; asked again in 0.5 s",
                        "V: it failed while reading (exception 4)");
        line.sleep(500 * MILLI);
        line.replies.addAll(List.of(frame(1, 3, 2, 0, 5), "xyz"));
        Polled half = polled.next();
        assertThat(half.values()).containsExactly(5, Double.NaN);
        assertThat(half.problems())
                .containsExactly("V: no whole answer within 0.5 s (3 bytes came); asked again in 0.5 s");
    }

    @Test
    void anOverloadIsNoFailure() throws Exception {
        PolledLine polled = scpi();
        line.replies.addAll(List.of("9.9E37\n", "2\n", "9.9E37\n", "2\n", "1\n", "2\n", "9.9E37\n", "2\n"));
        Polled round = polled.next();
        assertThat(round.values()).containsExactly(Double.NaN, 2);
        assertThat(round.problems()).containsExactly("I: it answers 9.9E37: overload");
        Polled still = polled.next();
        assertThat(still.values()).containsExactly(Double.NaN, 2);
        assertThat(still.problems()).as("its beginning is told, once").isEmpty();
        assertThat(polled.next().values()).containsExactly(1, 2);
        assertThat(polled.next().problems()).containsExactly("I: it answers 9.9E37: overload");
    }

    @Test
    void aLineThatIsGoneIsSaidWhileAskingAndWhileWaiting() throws Exception {
        PolledLine polled = scpi();
        line.replies.addAll(List.of("1\n", "2\n"));
        polled.next();
        line.gone = true;
        assertThatThrownBy(polled::next).isInstanceOf(IOException.class).hasMessage("the port is gone");
        assertThat(line.asked).hasSize(2);
    }

    private PolledLine scpiWithErrors() {
        PollSpec spec = new PollSpec(1, 0.5, new PollSpec.Scpi(List.of("I?", "V?"), "\n", "SYST:ERR?"));
        return new PolledLine(sheet, spec, Poller.of(spec, Sheets.line("8N1")), line, line);
    }

    @Test
    void anInstrumentThatDidNotAnswerIsAskedWhyUntilItHasNoErrorLeft() throws Exception {
        PolledLine polled = scpiWithErrors();
        polled.next();
        line.replies.addAll(List.of(
                "-113,\"Undefined header\"\n", "-410,\"Query INTERRUPTED\"\n", "+0,\"No error\"\n", "1\n", "2\n"));
        Polled round = polled.next();
        assertThat(line.asked).containsExactly("I?\n", "SYST:ERR?\n", "SYST:ERR?\n", "SYST:ERR?\n", "I?\n", "V?\n");
        assertThat(round.problems())
                .containsExactly(
                        "I: the instrument reports -113,\"Undefined header\"",
                        "I: the instrument reports -410,\"Query INTERRUPTED\"");
        assertThat(round.values()).containsExactly(1, 2);
    }

    @Test
    void anInstrumentThatDoesNotSayWhyIsLeftAloneAgain() throws Exception {
        PolledLine polled = scpiWithErrors();
        polled.next();
        Polled round = polled.next();
        assertThat(line.asked).containsExactly("I?\n", "SYST:ERR?\n");
        assertThat(round.problems()).containsExactly("I: no answer within 0.5 s; asked again in 1 s");
    }

    @Test
    void anInstrumentThatReportsWithoutEndIsNotWaitedFor() throws Exception {
        PolledLine polled = scpiWithErrors();
        polled.next();
        for (int i = 0; i < 20; i++) {
            line.replies.add("-350,\"Queue overflow\"\n");
        }
        line.replies.addAll(List.of("1\n", "2\n"));
        assertThat(polled.next().values()).containsExactly(1, 2);
    }

    @Test
    void valuesThatFollowEachOtherAreReadAtOnce() throws Exception {
        Register current = new Register(1, 3, 12, NumberType.INT16, "ABCD", 1, List.of());
        Register voltage = new Register(1, 3, 10, NumberType.FLOAT32, "ABCD", 1, List.of());
        PollSpec spec = new PollSpec(0.1, 0.5, new PollSpec.Modbus(List.of(current, voltage), false));
        PolledLine polled = new PolledLine(sheet, spec, Poller.of(spec, Sheets.line("8N1")), line, line);
        line.replies.add(frame(1, 3, 6, 0x3F, 0x80, 0, 0, 0, 7));
        Polled round = polled.next();
        assertThat(line.asked).containsExactly(frame(1, 3, 0, 10, 0, 3));
        assertThat(round.values()).containsExactly(7, 1);
        assertThat(round.stamps()[0]).isEqualTo(round.stamps()[1]);
        assertThat(round.answers()[0]).hasSize(11);
        assertThat(round.answers()[1]).isEmpty();
        line.replies.add(frame(1, 3, 6, 0x7F, 0xC0, 0, 0, 0, 7));
        Polled half = polled.next();
        assertThat(half.values()).containsExactly(7, Double.NaN);
        assertThat(half.problems()).containsExactly("V: it answers no finite number");
        assertThat(polled.next().problems()).containsExactly("V, I: no answer within 0.5 s; asked again in 0.5 s");
    }
}
