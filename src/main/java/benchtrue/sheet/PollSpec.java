package benchtrue.sheet;

import java.util.List;
import org.jspecify.annotations.Nullable;

/**
 * Instruments that answer only when they are asked, one question after the other.
 *
 * @param periodSeconds from the beginning of one round of questions to that of the next, above 0
 * @param timeoutSeconds how long an answer may take, above 0
 */
public record PollSpec(double periodSeconds, double timeoutSeconds, Asking asking) {
    public PollSpec {
        if (!(periodSeconds > 0) || !(timeoutSeconds > 0)) {
            throw new IllegalArgumentException("period and timeout are above 0");
        }
    }

    /** What is asked for each channel, in the order of the sheet. */
    public sealed interface Asking {}

    /**
     * @param terminator what ends a message, to the instrument and from it
     * @param errors asks an instrument that gave no answer for the next of its errors; null: it is not asked
     */
    public record Scpi(
            List<String> queries,
            String terminator,
            @Nullable String errors) implements Asking {
        public Scpi {
            queries = List.copyOf(queries);
        }
    }

    /**
     * Over RTU frames.
     *
     * @param single every value is asked for by itself; else those whose registers follow each other are read at once
     */
    public record Modbus(List<Register> registers, boolean single) implements Asking {
        public Modbus {
            registers = List.copyOf(registers);
        }
    }

    /** How the registers of a value make a number. */
    public enum NumberType {
        INT16(1),
        UINT16(1),
        INT32(2),
        UINT32(2),
        FLOAT32(2);

        private final int registers;

        NumberType(int registers) {
            this.registers = registers;
        }

        /** Of 16 bits each. */
        public int registers() {
            return registers;
        }
    }

    /**
     * One value of one instrument.
     *
     * @param address of the instrument, 1…247
     * @param function 3: read holding registers; 4: read input registers
     * @param register as the request carries it: counted from 0
     * @param order in which the bytes of a value of two registers come, A being the most significant: a permutation of ABCD
     * @param scale what one unit of the register means, in the channel's unit
     * @param missing numbers that stand for no value, before they are scaled
     */
    public record Register(
            int address,
            int function,
            int register,
            NumberType type,
            String order,
            double scale,
            List<Double> missing) {
        public Register {
            missing = List.copyOf(missing);
        }
    }
}
