package benchtrue.source;

import benchtrue.sheet.LineSpec;
import benchtrue.sheet.PollSpec;
import benchtrue.sheet.PollSpec.Register;
import java.math.BigDecimal;
import java.nio.ByteBuffer;
import java.util.Arrays;
import java.util.Collections;
import java.util.List;
import org.jspecify.annotations.Nullable;

/**
 * Reads registers over Modbus RTU and does nothing else (Modbus Application Protocol V1.1b3, 6.3 and 6.4; Modbus over Serial Line
 * V1.02, 2.5.1). Where an answer ends is told by its length and its check: the pause of 1.5 characters that ends a frame on the wire
 * cannot be seen through the buffers of an operating system.
 */
final class ModbusRtu implements Poller {
    private static final int REQUEST = 8;
    private static final int HEAD = 3;
    private static final int CRC = 2;
    private static final int EXCEPTION = HEAD + CRC;
    private static final int EXCEPTION_BIT = 0x80;

    private static final int FASTEST_COMPUTED_BAUD = 19_200;
    private static final long FAST_SILENCE_NANOS = 1_750_000;
    private static final double SILENT_CHARACTERS = 3.5;

    private final List<RegisterBlock> blocks;
    private final byte[][] requests;
    private final long silenceNanos;

    ModbusRtu(PollSpec.Modbus modbus, LineSpec line) {
        blocks = RegisterBlock.of(modbus);
        requests = blocks.stream().map(ModbusRtu::request).toArray(byte[][]::new);
        silenceNanos = silenceNanos(line.baud(), line.frame());
    }

    private static byte[] request(RegisterBlock block) {
        byte[] frame = ByteBuffer.allocate(REQUEST)
                .put((byte) block.first().address())
                .put((byte) block.first().function())
                .putShort((short) block.first().register())
                .putShort((short) block.count())
                .array();
        Crc16.append(frame, REQUEST - CRC);
        return frame;
    }

    /** 3.5 characters, each with its start bit; above 19 200 baud a fixed time, as the specification recommends. */
    static long silenceNanos(int baud, String frame) {
        if (baud > FASTEST_COMPUTED_BAUD) {
            return FAST_SILENCE_NANOS;
        }
        int parity = frame.charAt(1) == 'N' ? 0 : 1;
        int bits = 1 + (frame.charAt(0) - '0') + parity + (frame.charAt(2) - '0');
        return (long) Math.ceil(SILENT_CHARACTERS * bits * 1e9 / baud);
    }

    @Override
    public int questions() {
        return requests.length;
    }

    @Override
    public int[] channels(int question) {
        return blocks.get(question).channels().stream()
                .mapToInt(channel -> channel)
                .toArray();
    }

    @Override
    public byte[] request(int question) {
        return requests[question];
    }

    @Override
    public int instrument(int question) {
        return blocks.get(question).first().address();
    }

    @Override
    public long silenceNanos() {
        return silenceNanos;
    }

    /** What is wrong comes as an exception at once. */
    @Override
    public byte @Nullable [] errorRequest() {
        return null;
    }

    @Override
    public Reply error(byte[] bytes, int length) {
        throw new IllegalStateException("there is no question for errors");
    }

    @Override
    public Reply reply(int question, byte[] bytes, int length) {
        RegisterBlock block = blocks.get(question);
        Reply reply = answer(block, bytes, length);
        if (reply instanceof Garbled && isEcho(question, bytes, length)) {
            return answer(block, Arrays.copyOfRange(bytes, REQUEST, length), length - REQUEST);
        }
        return reply;
    }

    /** Adapters for two-wire lines often hand back what they have sent. */
    private boolean isEcho(int question, byte[] bytes, int length) {
        return length >= REQUEST && Arrays.equals(bytes, 0, REQUEST, requests[question], 0, REQUEST);
    }

    private static Reply answer(RegisterBlock block, byte[] bytes, int length) {
        if (length < EXCEPTION) {
            return new Unfinished();
        }
        Register first = block.first();
        int function = bytes[1] & 0xFF;
        boolean exception = function == (first.function() | EXCEPTION_BIT);
        int data = block.count() * Short.BYTES;
        int whole = exception ? EXCEPTION : HEAD + data + CRC;
        if (length < whole) {
            // Up to the length of an echo it is not yet known whether this is one.
            return new Unfinished();
        }
        if (!Crc16.holds(bytes, whole)) {
            return length < REQUEST ? new Unfinished() : new Garbled("a damaged answer (its check does not hold)");
        }
        int address = bytes[0] & 0xFF;
        if (address != first.address()) {
            return new Garbled("an answer of address " + address + ", which was not asked");
        }
        if (exception) {
            return new Answer(Collections.nCopies(block.values().size(), new NoValue(words(bytes[2] & 0xFF))));
        }
        if (function != first.function() || (bytes[2] & 0xFF) != data) {
            return new Garbled("an answer to another question");
        }
        ByteBuffer registers = ByteBuffer.wrap(bytes, HEAD, data);
        return new Answer(
                block.values().stream().map(value -> result(value, registers)).toList());
    }

    private static Result result(Register register, ByteBuffer registers) {
        double number = RegisterValues.number(register, registers);
        double value = RegisterValues.scaled(register, number);
        if (!Double.isFinite(value)) {
            return new NoValue("it answers no finite number");
        }
        return register.missing().contains(number)
                ? new NoValue("it answers " + new BigDecimal(number).toPlainString()
                        + ", which the sheet declares as missing")
                : new Value(value);
    }

    /** Of exception codes, as chapter 7 of the protocol has them. */
    private static String words(int code) {
        String meaning = switch (code) {
            case 1 -> "it does not know this function";
            case 2 -> "it has no such register";
            case 3 -> "it does not take this number of registers";
            case 4 -> "it failed while reading";
            case 5 -> "it needs longer to answer";
            case 6 -> "it is busy";
            case 8 -> "its memory is damaged";
            case 10 -> "the gateway has no way to it";
            case 11 -> "the gateway gets no answer from it";
            default -> "it refuses";
        };
        return meaning + " (exception " + code + ")";
    }
}
