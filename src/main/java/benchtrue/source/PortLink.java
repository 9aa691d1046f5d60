package benchtrue.source;

import benchtrue.sheet.LineSpec;
import com.fazecast.jSerialComm.SerialPort;
import com.fazecast.jSerialComm.SerialPortInvalidPortException;
import java.io.Closeable;
import java.io.IOException;
import java.nio.file.Path;
import java.util.concurrent.TimeUnit;

/** An open serial port. It is one attempt: a port that is gone is closed, and opened again as another object. */
final class PortLink implements SerialLink, Closeable {
    /** Longest wait of one {@link #read}. */
    static final int WAIT_MILLIS = 200;

    private static final String PSEUDO_TERMINALS = "/dev/pts/";

    // What the library reports, numbers of POSIX.
    private static final int GONE = 2;
    private static final int BUSY = 11;
    private static final int FORBIDDEN = 13;
    private static final int REFUSED = 22;

    /** Any other is refused when such a terminal is opened for the second time. */
    private static final String FRAME_OF_PSEUDO_TERMINALS = "8N1";

    private static final long TAKEN_MILLIS = 250;

    private final SerialPort port;

    private PortLink(SerialPort port) {
        this.port = port;
    }

    /** Whether nothing but another program can hang on the port. */
    static boolean isPseudoTerminal(String port) {
        try {
            return Path.of(port).toRealPath().toString().startsWith(PSEUDO_TERMINALS);
        } catch (IOException e) {
            return false; // no file of this name: certainly none
        }
    }

    /**
     * Bytes that the system already holds for the port are kept, so what is read first may be old.
     *
     * @param port a name as the system has it, or a link to one, which is followed at each opening
     * @param line baud and frame; a pseudo-terminal, which has neither, takes any
     * @throws IOException with a message in words, where it cannot be opened or does not take the settings
     */
    static PortLink open(String port, LineSpec line) throws IOException {
        SerialLibrary.load();
        SerialPort serial = found(port);
        String frame = isPseudoTerminal(port) ? FRAME_OF_PSEUDO_TERMINALS : line.frame();
        boolean known = set(serial, line.baud(), frame);
        if (!serial.openPort()) {
            int code = serial.getLastErrorCode();
            throw new IOException(code == REFUSED ? refused(line) : words(code));
        }
        // Only for an open port the library says whether it took the settings.
        if (!known || !set(serial, line.baud(), frame)) {
            serial.closePort();
            throw new IOException(refused(line));
        }
        return new PortLink(serial);
    }

    private static String refused(LineSpec line) {
        return "it does not take " + line.baud() + " baud " + line.frame();
    }

    private static SerialPort found(String port) throws IOException {
        try {
            return SerialPort.getCommPort(port);
        } catch (SerialPortInvalidPortException e) {
            throw new IOException(words(GONE), e);
        }
    }

    private static boolean set(SerialPort serial, int baud, String frame) {
        int dataBits = frame.charAt(0) - '0';
        int parity = switch (frame.charAt(1)) {
            case 'E' -> SerialPort.EVEN_PARITY;
            case 'O' -> SerialPort.ODD_PARITY;
            default -> SerialPort.NO_PARITY;
        };
        int stopBits = frame.endsWith("2") ? SerialPort.TWO_STOP_BITS : SerialPort.ONE_STOP_BIT;
        int waits = SerialPort.TIMEOUT_READ_SEMI_BLOCKING | SerialPort.TIMEOUT_WRITE_BLOCKING;
        return serial.setComPortParameters(baud, dataBits, stopBits, parity)
                && serial.setComPortTimeouts(waits, WAIT_MILLIS, 0);
    }

    private static String words(int code) {
        return switch (code) {
            case GONE -> "there is no such port";
            case BUSY -> "another program has it open";
            case FORBIDDEN -> "no permission: on Linux the user must be in the group of serial ports, often dialout";
            default -> "it cannot be opened (error " + code + ")";
        };
    }

    @Override
    public int read(byte[] into) {
        return port.readBytes(into, into.length);
    }

    @Override
    public void write(byte[] bytes, int length) throws IOException {
        if (port.writeBytes(bytes, length) != length && !SerialLibrary.isEnding()) {
            throw new IOException("the port is gone");
        }
    }

    @Override
    public void discard() {
        int old = port.bytesAvailable();
        if (old > 0) {
            port.readBytes(new byte[old], old);
        }
    }

    /** Waits until the other end has taken what was written, as far as that can be known: closing throws the rest away. */
    void drain() throws InterruptedException {
        TimeUnit.MILLISECONDS.sleep(TAKEN_MILLIS);
    }

    /** Frees a {@link #read} that waits in another thread. */
    @Override
    public void close() {
        port.closePort();
    }
}
