package benchtrue.cli;

import benchtrue.sheet.BenchSheet;
import benchtrue.sheet.Rehearsal;
import benchtrue.source.Rehearsed;
import benchtrue.source.Rehearsing;
import java.nio.file.Path;
import java.util.concurrent.Callable;
import org.jspecify.annotations.Nullable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;

/** Makes the readings of a rig that is only described. */
@Command(
        name = "rehearse",
        description = "Make readings from the [rehearsal] of a sheet: its truth, noise, schedule and faults.")
final class RehearseCommand implements Callable<Integer> {
    private final Output output;

    @Parameters(paramLabel = "SHEET", description = "Bench sheet with a [rehearsal].")
    @SuppressWarnings("NullAway.Init")
    private Path sheetFile;

    @Option(names = "--out", required = true, paramLabel = "RUN", description = "Run folder to write; it must be new.")
    @SuppressWarnings("NullAway.Init")
    private Path out;

    @Option(names = "--seed", paramLabel = "N", description = "Seed of the noise; by default the sheet's.")
    private @Nullable Long seed;

    RehearseCommand(Output output) {
        this.output = output;
    }

    @Override
    public Integer call() throws Refusal {
        BenchSheet sheet = RunFolder.sheet(sheetFile, output);
        Rehearsal rehearsal = sheet.rehearsal();
        if (rehearsal == null) {
            throw new Refusal(sheetFile + ": has no [rehearsal]; add one as docs/rehearsal.md shows");
        }
        long used = seed == null ? rehearsal.seed() : seed;
        Rehearsed rehearsed = Rehearsing.write(sheetFile, sheet, rehearsal, out, used);
        if (rehearsed instanceof Rehearsed.Refused refused) {
            throw new Refusal(refused.mistake().toString());
        }
        long readings = ((Rehearsed.Written) rehearsed).readings();
        output.line(readings + " readings with seed " + used + " in " + out + ". To see them: benchtrue replay " + out);
        return ExitStatus.NOTHING_FOUND.code();
    }
}
