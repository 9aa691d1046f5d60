package benchtrue.source;

import com.fazecast.jSerialComm.SerialPort;
import java.io.IOException;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;

/** The serial ports that the system knows; pseudo-terminals are not among them. */
public final class Ports {
    /** @param description as the device or its driver names itself */
    public record Port(String path, String description) {}

    private Ports() {}

    /** @throws IOException where the serial library does not run here */
    public static List<Port> list() throws IOException {
        SerialLibrary.load();
        return Arrays.stream(SerialPort.getCommPorts())
                .map(p -> new Port(p.getSystemPortPath(), p.getDescriptivePortName()))
                .sorted(Comparator.comparing(Port::path))
                .toList();
    }
}
