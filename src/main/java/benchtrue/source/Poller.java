package benchtrue.source;

import benchtrue.sheet.LineSpec;
import benchtrue.sheet.PollSpec;
import org.jspecify.annotations.Nullable;

/** The language of polled instruments: what to send for a channel, and what the bytes that came back mean. Knows no port and no clock. */
interface Poller {
    static Poller of(PollSpec spec, LineSpec line) {
        return spec.asking() instanceof PollSpec.Modbus modbus
                ? new ModbusRtu(modbus, line)
                : new Scpi((PollSpec.Scpi) spec.asking());
    }

    /** The message that asks for a channel; it is never anything but a question. Read only. */
    byte[] request(int channel);

    /** @param bytes what came since the request for the channel was sent, up to {@code length} */
    Reply reply(int channel, byte[] bytes, int length);

    /** Asks an instrument that did not answer for the next of its errors; null where none can be asked. Read only. */
    byte @Nullable [] errorRequest();

    /** @return the error as a {@link NoValue}, and any {@link Value} where there is none left */
    Reply error(byte[] bytes, int length);

    /** Which instrument has the channel: one that is silent does not keep the others waiting. */
    int instrument(int channel);

    /** How long the line must have been quiet before a message. */
    long silenceNanos();

    /** What came back. */
    sealed interface Reply {}

    /** More is to come. */
    record Unfinished() implements Reply {}

    record Value(double value) implements Reply {}

    /** The instrument answered in good order, but has no value. */
    record NoValue(String why) implements Reply {}

    /** What came is no answer to the question. */
    record Garbled(String why) implements Reply {}
}
