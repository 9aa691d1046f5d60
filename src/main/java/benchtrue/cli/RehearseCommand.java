package benchtrue.cli;

import benchtrue.sheet.BenchSheet;
import benchtrue.sheet.LineSpec;
import benchtrue.sheet.PollSpec;
import benchtrue.sheet.Rehearsal;
import benchtrue.source.CableFaults;
import benchtrue.source.Failure;
import benchtrue.source.LinePlayer;
import benchtrue.source.PollAnswerer;
import benchtrue.source.Rehearsed;
import benchtrue.source.RehearsedLines;
import benchtrue.source.Rehearsing;
import java.io.BufferedReader;
import java.io.IOException;
import java.io.InputStreamReader;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.List;
import java.util.concurrent.Callable;
import org.jspecify.annotations.Nullable;
import picocli.CommandLine.ArgGroup;
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

    @ArgGroup(multiplicity = "1")
    @SuppressWarnings("NullAway.Init")
    private Target target;

    @Option(names = "--seed", paramLabel = "N", description = "Seed of the noise; by default the sheet's.")
    private @Nullable Long seed;

    @Option(names = "--yes", description = "Send to a real port without asking.")
    private boolean yes;

    /** Where the readings go: one of the two. */
    static final class Target {
        @Option(names = "--out", required = true, paramLabel = "RUN", description = "Write this run folder.")
        private @Nullable Path out;

        @Option(
                names = "--onto",
                required = true,
                paramLabel = "PORT",
                description =
                        "Be the instrument on this port: play the lines out, or answer where the sheet has [poll].")
        private @Nullable String port;
    }

    @ArgGroup(exclusive = false)
    private @Nullable OntoOptions onto;

    RehearseCommand(Output output) {
        this.output = output;
    }

    @Override
    public Integer call() throws Refusal, InterruptedException {
        BenchSheet sheet = RunFolder.sheet(sheetFile, output);
        Rehearsal rehearsal = sheet.rehearsal();
        if (rehearsal == null) {
            throw new Refusal(sheetFile + ": has no [rehearsal]; add one as docs/rehearsal.md shows");
        }
        long used = seed == null ? rehearsal.seed() : seed;
        if (target.out != null) {
            if (onto != null) {
                throw new Refusal("--pace, --cut and --garble are for --onto PORT; leave them out with --out");
            }
            write(sheet, rehearsal, target.out, used);
        } else if (target.port != null) {
            play(sheet, rehearsal, target.port, used);
        }
        return ExitStatus.NOTHING_FOUND.code();
    }

    private void write(BenchSheet sheet, Rehearsal rehearsal, Path out, long used) throws Refusal {
        Rehearsed rehearsed = Rehearsing.write(sheetFile, sheet, rehearsal, out, used);
        if (rehearsed instanceof Rehearsed.Refused refused) {
            throw new Refusal(refused.mistake().toString());
        }
        long readings = ((Rehearsed.Written) rehearsed).readings();
        output.line(readings + " readings with seed " + used + " in " + out + ". To see them: benchtrue replay " + out);
    }

    private void play(BenchSheet sheet, Rehearsal rehearsal, String port, long used)
            throws Refusal, InterruptedException {
        double pace = onto == null ? 1 : onto.pace();
        CableFaults faults = onto == null ? CableFaults.NONE : onto.faults();
        PollSpec poll = sheet.poll();
        LineSpec line = sheet.line();
        if (poll != null && Double.isInfinite(pace)) {
            throw new Refusal("--pace max: a rig that is asked needs a pace; give a number");
        }
        if (!LinePlayer.isPseudoTerminal(port) && !yes && !confirmed(port)) {
            throw new Refusal(port + ": nothing was sent; use a pseudo-terminal, or confirm with yes");
        }
        try {
            if (poll != null && line != null) {
                long answers = PollAnswerer.answer(sheet, rehearsal, poll, line, port, pace, faults, used);
                output.line(answers + " questions answered on " + port);
            } else {
                RehearsedLines lines = new RehearsedLines(sheet, rehearsal, used);
                output.line(LinePlayer.play(lines, port, lines.line(), pace, faults, used) + " lines sent to " + port);
            }
        } catch (IOException e) {
            throw new Refusal(
                    ExitStatus.SOURCE_LOST,
                    List.of(port + ": " + Failure.words(e) + "; check the port's name and its cable"));
        }
    }

    private boolean confirmed(String port) throws Refusal {
        output.ask(port + " is no pseudo-terminal. What hangs on it may obey these lines as commands: make the rig safe"
                + " first. Send them? (yes/no)");
        try {
            String answer = new BufferedReader(new InputStreamReader(System.in, StandardCharsets.UTF_8)).readLine();
            return answer != null && answer.strip().equals("yes");
        } catch (IOException e) {
            throw new Refusal(port + ": nothing was sent, as no answer could be read (" + Failure.words(e) + ")");
        }
    }
}
