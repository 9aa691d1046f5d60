package benchtrue.source;

import benchtrue.sheet.PollSpec.NumberType;
import benchtrue.sheet.PollSpec.Register;
import java.math.BigDecimal;
import java.nio.ByteBuffer;

/** Numbers in registers, in both directions. */
final class RegisterValues {
    private RegisterValues() {}

    /**
     * A number in the channel's unit. Whole numbers are scaled as decimals, so that 2002 at 0.001 is 2.002 and nothing beside it.
     */
    static double scaled(Register register, double number) {
        return register.type() == NumberType.FLOAT32
                ? number * register.scale()
                : BigDecimal.valueOf((long) number)
                        .multiply(BigDecimal.valueOf(register.scale()))
                        .doubleValue();
    }

    /** @param data from where the number stands on, as it came over the line */
    static double number(Register register, ByteBuffer data) {
        if (register.type().registers() == 1) {
            short bits = data.getShort();
            return register.type() == NumberType.INT16 ? bits : Short.toUnsignedInt(bits);
        }
        int bits = 0;
        for (int i = 0; i < Integer.BYTES; i++) {
            bits |= (data.get() & 0xFF) << shift(register, i);
        }
        return switch (register.type()) {
            case FLOAT32 -> Float.intBitsToFloat(bits);
            case UINT32 -> Integer.toUnsignedLong(bits);
            default -> bits;
        };
    }

    /** Registers with the nearest number that they can hold; for NaN, which only a float can be, the lowest. */
    static byte[] bytes(Register register, double number) {
        long bits = switch (register.type()) {
            case FLOAT32 -> Float.floatToIntBits((float) number);
            case INT16 -> whole(number, Short.MIN_VALUE, Short.MAX_VALUE);
            case UINT16 -> whole(number, 0, 0xFFFFL);
            case INT32 -> whole(number, Integer.MIN_VALUE, Integer.MAX_VALUE);
            case UINT32 -> whole(number, 0, 0xFFFF_FFFFL);
        };
        if (register.type().registers() == 1) {
            return ByteBuffer.allocate(Short.BYTES).putShort((short) bits).array();
        }
        byte[] bytes = new byte[Integer.BYTES];
        for (int i = 0; i < Integer.BYTES; i++) {
            bytes[i] = (byte) (bits >> shift(register, i));
        }
        return bytes;
    }

    private static long whole(double number, long lowest, long highest) {
        return Double.isNaN(number) ? lowest : Math.max(lowest, Math.min(highest, Math.round(number)));
    }

    /** Where the byte that comes at a place stands in the number. */
    private static int shift(Register register, int place) {
        return Byte.SIZE * ('D' - register.order().charAt(place));
    }
}
