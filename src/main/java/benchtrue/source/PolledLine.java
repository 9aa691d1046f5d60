package benchtrue.source;

import benchtrue.sheet.BenchSheet;
import benchtrue.sheet.Channel;
import benchtrue.sheet.PollSpec;
import benchtrue.source.Poller.Answer;
import benchtrue.source.Poller.Garbled;
import benchtrue.source.Poller.NoValue;
import benchtrue.source.Poller.Reply;
import benchtrue.source.Poller.Unfinished;
import java.io.IOException;
import java.util.Arrays;
import java.util.HashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.stream.Collectors;

/**
 * Asks the instruments on one line, a round of questions each period and one question at a time. An instrument without a
 * sound answer is left alone for a while, at first as long as an answer may take: what it says late is thrown away, never taken for
 * the answer to the next question. Used by one thread.
 */
final class PolledLine {
    private static final long NANOS_PER_MILLI = 1_000_000;
    private static final double NANOS = 1e9;
    private static final int CHUNK = 512;
    private static final int LONGEST = 2048;

    /** An instrument keeps a few dozen at the most; one that reports without end is not waited for. */
    private static final int MOST_ERRORS = 20;

    private final Poller poller;
    private final List<String> channels;
    private final long periodNanos;
    private final long timeoutNanos;
    private final SerialLink link;
    private final Ticker ticker;
    private final Map<Integer, BackOff> backOffs = new HashMap<>();
    private final byte[] chunk = new byte[CHUNK];
    private final byte[] answer = new byte[LONGEST];
    private final String patience;
    private final String[] told;
    private int length;
    private long stamp;
    private long lastByte;
    private long due;

    /** The first round is due at once. */
    PolledLine(BenchSheet sheet, PollSpec spec, Poller poller, SerialLink link, Ticker ticker) {
        this.poller = poller;
        channels = sheet.channels().stream().map(Channel::name).toList();
        periodNanos = (long) (spec.periodSeconds() * NANOS);
        timeoutNanos = (long) (spec.timeoutSeconds() * NANOS);
        this.link = link;
        this.ticker = ticker;
        told = new String[channels.size()];
        Arrays.fill(told, "");
        patience = " within " + seconds(timeoutNanos);
        due = ticker.nanos();
        lastByte = due;
        for (int question = 0; question < poller.questions(); question++) {
            backOffs.put(poller.instrument(question), new BackOff());
        }
    }

    /**
     * Waits until the next round is due, and asks it. A round that takes longer than the period is followed by the next at once; none
     * is asked for while all instruments are left alone.
     *
     * @throws IOException where the line is gone: it is to be opened again, and asked over by another object
     */
    Polled next() throws IOException, InterruptedException {
        idle(due);
        idle(ticker.nanos() + leastLeft());
        due = Math.max(due + periodNanos, ticker.nanos());
        Round round = new Round(channels.size());
        for (int question = 0; question < poller.questions(); question++) {
            if (backOff(question).left(ticker.nanos()) <= 0) {
                ask(question, round);
            }
        }
        return round.done(ticker.nanos());
    }

    private BackOff backOff(int question) {
        BackOff backOff = backOffs.get(poller.instrument(question));
        if (backOff == null) {
            throw new IllegalStateException("question " + question + " has no instrument");
        }
        return backOff;
    }

    private long leastLeft() {
        long now = ticker.nanos();
        return backOffs.values().stream().mapToLong(b -> b.left(now)).min().orElse(0);
    }

    /** Waits with an ear on the line, so that a pulled cable is noticed; what comes meanwhile comes too late. */
    private void idle(long until) throws IOException, InterruptedException {
        while (until - ticker.nanos() > PortLink.WAIT_MILLIS * NANOS_PER_MILLI) {
            read();
        }
        ticker.sleep(until - ticker.nanos());
    }

    private int read() throws IOException {
        int count = link.read(chunk);
        if (count < 0) {
            throw new IOException("the port is gone");
        }
        if (count > 0) {
            lastByte = ticker.nanos();
        }
        return count;
    }

    private void ask(int question, Round round) throws IOException, InterruptedException {
        if (backOff(question).hasFailed() && !askForErrors(question, round)) {
            return;
        }
        Reply reply = exchange(poller.request(question), (bytes, count) -> poller.reply(question, bytes, count));
        if (length > 0) {
            round.came(poller.channels(question), Arrays.copyOf(answer, length), stamp);
        }
        if (reply instanceof Answer sound) {
            backOff(question).answered();
            int[] asked = poller.channels(question);
            for (int i = 0; i < asked.length; i++) {
                tell(asked[i], round.result(asked[i], sound.results().get(i)), round);
            }
        } else {
            failed(question, reply, round);
        }
    }

    /** Of what lasts, only the beginning is told. */
    private void tell(int channel, String why, Round round) {
        if (!why.isEmpty() && !why.equals(told[channel])) {
            round.problem(channels.get(channel) + ": " + why);
        }
        told[channel] = why;
    }

    /** What the bytes that have come so far say. */
    private interface Meaning {
        Reply of(byte[] bytes, int length);
    }

    /** Sends a question and waits for the answer, whose bytes are in {@code answer} then. */
    private Reply exchange(byte[] request, Meaning meaning) throws IOException, InterruptedException {
        ticker.sleep(lastByte + poller.silenceNanos() - ticker.nanos());
        link.discard();
        link.write(request, request.length);
        long asked = ticker.nanos();
        length = 0;
        Reply reply = new Unfinished();
        while (reply instanceof Unfinished && ticker.nanos() - asked < timeoutNanos) {
            int count = Math.min(read(), LONGEST - length);
            if (count > 0) {
                stamp = length == 0 ? lastByte : stamp;
                System.arraycopy(chunk, 0, answer, length, count);
                length += count;
                reply = meaning.of(answer, length);
            }
        }
        return reply;
    }

    /** Takes the errors out of an instrument that gave no answer; false where it gives none now either. */
    private boolean askForErrors(int question, Round round) throws IOException, InterruptedException {
        byte[] request = poller.errorRequest();
        for (int i = 0; request != null && i < MOST_ERRORS; i++) {
            Reply reply = exchange(request, poller::error);
            if (!(reply instanceof Answer sound)) {
                failed(question, reply, round);
                return false;
            }
            if (!(sound.results().get(0) instanceof NoValue error)) {
                return true;
            }
            round.problem(names(question) + ": the instrument reports " + error.why());
        }
        return true;
    }

    private void failed(int question, Reply reply, Round round) {
        long wait = backOff(question).failed(timeoutNanos, ticker.nanos());
        round.problem(names(question) + ": " + why(reply) + "; asked again in " + seconds(wait));
    }

    private String names(int question) {
        return Arrays.stream(poller.channels(question)).mapToObj(channels::get).collect(Collectors.joining(", "));
    }

    private String why(Reply reply) {
        if (reply instanceof Garbled garbled) {
            return garbled.why();
        }
        return length == 0 ? "no answer" + patience : "no whole answer" + patience + " (" + length + " bytes came)";
    }

    private static String seconds(long nanos) {
        String text = String.format(Locale.ROOT, "%.2f", nanos / NANOS);
        return text.replaceAll("\\.?0+$", "") + " s";
    }
}
