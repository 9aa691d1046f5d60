package benchtrue.cli;

import benchtrue.record.SheetPage;
import benchtrue.sheet.Mistake;
import benchtrue.sheet.SheetReader;
import benchtrue.sheet.SheetReading;
import benchtrue.source.RawBytes;
import java.nio.file.Path;
import java.util.List;
import java.util.concurrent.Callable;
import org.jspecify.annotations.Nullable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;

/** Reads bench sheets and says what it understood, or every mistake with its place. */
@Command(name = "check", description = "Read bench sheets: equation, unknowns, channels; every mistake with its place.")
final class CheckCommand implements Callable<Integer> {
    private final Output output;

    @Parameters(arity = "1..*", paramLabel = "SHEET", description = "Bench sheets to read.")
    @SuppressWarnings("NullAway.Init")
    private List<Path> sheets;

    @Option(
            names = "--line",
            paramLabel = "TEXT",
            description = "What this line of an instrument would become; \\xNN is a byte.")
    private @Nullable String line;

    @Option(
            names = "--lines",
            paramLabel = "FILE",
            description = "The same for a file of lines, or for the raw.log of a run.")
    private @Nullable Path lines;

    @Option(names = "--ascii", description = "Nothing but ASCII characters.")
    private boolean ascii;

    CheckCommand(Output output) {
        this.output = output;
    }

    @Override
    public Integer call() throws Refusal {
        Output out = ascii ? output.inAscii() : output;
        ExitStatus status = ExitStatus.NOTHING_FOUND;
        for (Path file : sheets) {
            SheetReading reading = SheetReader.read(file);
            reading.mistakes().forEach(m -> out.error(m.toString()));
            if (reading.sheet() == null) {
                status = ExitStatus.USAGE;
                continue;
            }
            reading.notices().stream().map(Mistake::toString).forEach(n -> out.line("note: " + n));
            if (line == null && lines == null) {
                out.text(SheetPage.of(reading.sheet()));
                out.line("");
            } else if (!new LineCheck(out, reading.sheet()).understands(bytes())) {
                status = ExitStatus.USAGE;
            }
        }
        return status.code();
    }

    private byte[] bytes() throws Refusal {
        return lines != null ? LineCheck.read(lines) : RawBytes.of(line + "\n");
    }
}
