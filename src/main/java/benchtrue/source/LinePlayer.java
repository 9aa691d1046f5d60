package benchtrue.source;

import benchtrue.sheet.LineSpec;
import com.fazecast.jSerialComm.SerialPort;
import com.fazecast.jSerialComm.SerialPortInvalidPortException;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.concurrent.TimeUnit;

/** Plays the lines of the simulated rig out to a port, each when it is due. */
public final class LinePlayer {
    private static final String END = "\r\n";

    /** Closing a port throws away what its other end has not yet taken. */
    private static final long TAKEN_MILLIS = 250;

    private static final String PSEUDO_TERMINALS = "/dev/pts/";

    private LinePlayer() {}

    /** Whether nothing but another program can hang on the port. */
    public static boolean isPseudoTerminal(String port) {
        try {
            return Path.of(port).toRealPath().toString().startsWith(PSEUDO_TERMINALS);
        } catch (IOException e) {
            return false; // no file of this name: certainly none
        }
    }

    /**
     * Returns when the last line is sent.
     *
     * @param line baud and frame of the port; a pseudo-terminal takes any
     * @return how many lines were sent
     * @throws IOException where the port cannot be opened, or is gone
     */
    public static long play(RehearsedLines lines, String port, LineSpec line) throws IOException, InterruptedException {
        SerialLibrary.load();
        SerialPort serial = open(port, line);
        try {
            long start = System.nanoTime();
            long count = 0;
            while (lines.next()) {
                long due = start + (long) (lines.seconds() * 1e9);
                TimeUnit.NANOSECONDS.sleep(due - System.nanoTime());
                byte[] bytes = (lines.text() + END).getBytes(StandardCharsets.UTF_8);
                if (serial.writeBytes(bytes, bytes.length) != bytes.length) {
                    throw new IOException("the port is gone after " + count + " lines");
                }
                count++;
            }
            TimeUnit.MILLISECONDS.sleep(TAKEN_MILLIS);
            return count;
        } finally {
            serial.closePort();
        }
    }

    private static SerialPort open(String port, LineSpec line) throws IOException {
        SerialPort serial;
        try {
            serial = SerialPort.getCommPort(port);
        } catch (SerialPortInvalidPortException e) {
            throw new IOException("there is no such port", e);
        }
        int dataBits = line.frame().charAt(0) - '0';
        int parity = switch (line.frame().charAt(1)) {
            case 'E' -> SerialPort.EVEN_PARITY;
            case 'O' -> SerialPort.ODD_PARITY;
            default -> SerialPort.NO_PARITY;
        };
        int stopBits = line.frame().endsWith("2") ? SerialPort.TWO_STOP_BITS : SerialPort.ONE_STOP_BIT;
        serial.setComPortParameters(line.baud(), dataBits, stopBits, parity);
        serial.setComPortTimeouts(SerialPort.TIMEOUT_WRITE_BLOCKING, 0, 0);
        if (!serial.openPort()) {
            throw new IOException(
                    switch (serial.getLastErrorCode()) {
                        case 2 -> "there is no such port";
                        case 11 -> "another program has it open";
                        case 13 ->
                            "no permission: on Linux the user must be in the group of serial ports, often dialout";
                        default -> "it cannot be opened (error " + serial.getLastErrorCode() + ")";
                    });
        }
        return serial;
    }
}
