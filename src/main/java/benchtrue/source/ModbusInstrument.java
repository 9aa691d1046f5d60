package benchtrue.source;

import benchtrue.sheet.PollSpec;
import benchtrue.sheet.PollSpec.Register;
import java.math.BigDecimal;
import java.nio.ByteBuffer;
import java.util.List;
import org.jspecify.annotations.Nullable;

/** Answers for all the addresses of the sheet, whose registers can be read and nothing else. */
final class ModbusInstrument implements Instrument {
    private static final int REQUEST = 8;
    private static final int SHORTEST = 4;
    private static final int CRC = 2;
    private static final int EXCEPTION_BIT = 0x80;
    private static final int MOST_REGISTERS = 125;
    private static final int LONGEST = 256;

    private static final int NO_SUCH_FUNCTION = 1;
    private static final int NO_SUCH_REGISTER = 2;
    private static final int NO_SUCH_COUNT = 3;
    private static final int FAILURE = 4;

    private static final byte[] NOTHING = {};

    private final List<Register> registers;
    private final byte[] received = new byte[LONGEST];
    private int length;

    ModbusInstrument(PollSpec.Modbus modbus) {
        registers = modbus.registers();
    }

    @Override
    public byte[] answer(byte[] bytes, int count, @Nullable BigDecimal[] cells) {
        if (length + count > LONGEST) {
            length = 0; // no request is as long
        }
        int taken = Math.min(count, LONGEST);
        System.arraycopy(bytes, 0, received, length, taken);
        length += taken;
        boolean whole = length >= SHORTEST && Crc16.holds(received, length);
        if (!whole || !hasAddress(received[0] & 0xFF)) {
            return NOTHING;
        }
        int function = received[1] & 0xFF;
        byte[] answer = (function == 3 || function == 4) && length == REQUEST
                ? read(ByteBuffer.wrap(received), cells)
                : exception(NO_SUCH_FUNCTION);
        length = 0;
        return answer;
    }

    @Override
    public void silence() {
        length = 0;
    }

    private boolean hasAddress(int address) {
        return registers.stream().anyMatch(register -> register.address() == address);
    }

    private byte[] read(ByteBuffer request, @Nullable BigDecimal[] cells) {
        int first = Short.toUnsignedInt(request.getShort(2));
        int count = Short.toUnsignedInt(request.getShort(4));
        if (count < 1 || count > MOST_REGISTERS) {
            return exception(NO_SUCH_COUNT);
        }
        ByteBuffer answer = ByteBuffer.allocate(3 + 2 * count + CRC);
        answer.put(received[0]).put(received[1]).put((byte) (2 * count));
        while (answer.remaining() > CRC) {
            int channel = channelAt(first + (answer.position() - 3) / 2);
            if (channel < 0 || registers.get(channel).type().registers() * 2 > answer.remaining() - CRC) {
                return exception(NO_SUCH_REGISTER);
            }
            BigDecimal cell = cells[channel];
            if (cell == null) {
                return exception(FAILURE);
            }
            Register register = registers.get(channel);
            answer.put(RegisterValues.bytes(register, cell.doubleValue() / register.scale()));
        }
        Crc16.append(answer.array(), answer.position());
        return answer.array();
    }

    /** Whose value begins at a register; negative: none. */
    private int channelAt(int number) {
        for (int channel = 0; channel < registers.size(); channel++) {
            Register register = registers.get(channel);
            if (register.address() == (received[0] & 0xFF)
                    && register.function() == received[1]
                    && register.register() == number) {
                return channel;
            }
        }
        return -1;
    }

    private byte[] exception(int code) {
        byte[] answer = {received[0], (byte) (received[1] | EXCEPTION_BIT), (byte) code, 0, 0};
        Crc16.append(answer, answer.length - CRC);
        return answer;
    }
}
