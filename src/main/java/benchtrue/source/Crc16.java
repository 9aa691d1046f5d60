package benchtrue.source;

/** The check of Modbus RTU: polynomial x¹⁶ + x¹⁵ + x² + 1, least bit first (Modbus over Serial Line V1.02, 6.2.2). */
final class Crc16 {
    private static final int POLYNOMIAL = 0xA001; // its bits turned round
    private static final int START = 0xFFFF;

    private Crc16() {}

    /** Of the bytes before {@code length}. */
    static int of(byte[] bytes, int length) {
        int crc = START;
        for (int i = 0; i < length; i++) {
            crc ^= bytes[i] & 0xFF;
            for (int bit = 0; bit < Byte.SIZE; bit++) {
                crc = (crc & 1) == 0 ? crc >> 1 : (crc >> 1) ^ POLYNOMIAL;
            }
        }
        return crc;
    }

    /** Writes the check of what is before {@code length} behind it, low byte first. */
    static void append(byte[] frame, int length) {
        int crc = of(frame, length);
        frame[length] = (byte) crc;
        frame[length + 1] = (byte) (crc >> Byte.SIZE);
    }

    /** Whether a frame of this length ends in its check. */
    static boolean holds(byte[] frame, int length) {
        int crc = (frame[length - 2] & 0xFF) | (frame[length - 1] & 0xFF) << Byte.SIZE;
        return crc == of(frame, length - 2);
    }
}
