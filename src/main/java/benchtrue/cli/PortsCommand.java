package benchtrue.cli;

import benchtrue.source.Ports;
import java.io.IOException;
import java.util.List;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;

/** The serial ports of this machine. */
@Command(name = "ports", description = "List the serial ports of this machine.")
final class PortsCommand implements Callable<Integer> {
    private final Output output;

    PortsCommand(Output output) {
        this.output = output;
    }

    @Override
    public Integer call() throws Refusal {
        try {
            List<Ports.Port> ports = Ports.list();
            if (ports.isEmpty()) {
                output.line("No serial port was found. A pseudo-terminal is not listed; give its path with --port.");
            }
            ports.forEach(p -> output.line(p.path() + "  " + p.description()));
            return ExitStatus.NOTHING_FOUND.code();
        } catch (IOException e) {
            throw new Refusal(ExitStatus.SOURCE_LOST, List.of(String.valueOf(e.getMessage())));
        }
    }
}
