package benchtrue.source;

import benchtrue.sheet.LineSpec;
import benchtrue.sheet.PollSpec;
import java.util.List;
import org.jspecify.annotations.Nullable;

/** The language of polled instruments: what to send for a channel, and what the bytes that came back mean. Knows no port and no clock. */
interface Poller {
    static Poller of(PollSpec spec, LineSpec line) {
        return spec.asking() instanceof PollSpec.Modbus modbus
                ? new ModbusRtu(modbus, line)
                : new Scpi((PollSpec.Scpi) spec.asking());
    }

    /** How many questions a round has. */
    int questions();

    /** The channels that a question asks for; each channel is asked for in one question. Read only. */
    int[] channels(int question);

    /** The message; it is never anything but a question. Read only. */
    byte[] request(int question);

    /** @param bytes what came since the question was sent, up to {@code length} */
    Reply reply(int question, byte[] bytes, int length);

    /** Asks an instrument that did not answer for the next of its errors; null where none can be asked. Read only. */
    byte @Nullable [] errorRequest();

    /** @return the error as a {@link NoValue}, and any {@link Value} where there is none left */
    Reply error(byte[] bytes, int length);

    /** Which instrument is asked: one that is silent does not keep the others waiting. */
    int instrument(int question);

    /** How long the line must have been quiet before a message. */
    long silenceNanos();

    /** What came back. */
    sealed interface Reply {}

    /** More is to come. */
    record Unfinished() implements Reply {}

    /** What came is no answer to the question. */
    record Garbled(String why) implements Reply {}

    /** The instrument answered in good order: one result for each channel of the question. */
    record Answer(List<Result> results) implements Reply {
        static Answer of(Result only) {
            return new Answer(List.of(only));
        }
    }

    /** What an answer says of a channel. */
    sealed interface Result {}

    record Value(double value) implements Result {}

    /** There is no value now, as with an overload. */
    record NoValue(String why) implements Result {}
}
