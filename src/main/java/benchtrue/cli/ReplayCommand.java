package benchtrue.cli;

import benchtrue.record.SummaryJson;
import benchtrue.run.Closing;
import benchtrue.run.Desk;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.concurrent.Callable;
import org.jspecify.annotations.Nullable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;

/** Replays recorded runs. */
@Command(name = "replay", description = "Replay run folders: one in panes, several at once in plain lines.")
final class ReplayCommand implements Callable<Integer> {
    private final Output output;
    private final Map<String, String> environment;

    @Spec
    @SuppressWarnings("NullAway.Init")
    private CommandSpec spec;

    @Mixin
    private final RunOptions options = new RunOptions();

    @Option(
            names = "--sheet",
            paramLabel = "SHEET",
            description = "Replay a file of readings with this sheet, instead of a run folder.")
    private @Nullable Path sheet;

    @Parameters(
            arity = "0..*",
            paramLabel = "RUN",
            description = "Run folders, or with --sheet a file of readings; without one, what there is to choose from.")
    private List<Path> runs = new ArrayList<>();

    ReplayCommand(Output output, Map<String, String> environment) {
        this.output = output;
        this.environment = environment;
    }

    @Override
    public Integer call() throws Exception {
        Output out = options.ascii() ? output.inAscii() : output;
        check();
        if (runs.isEmpty()) {
            if (sheet != null || !Surroundings.isTerminal()) {
                throw new ParameterException(spec.commandLine(), "give a RUN folder, or --sheet SHEET READINGS.csv");
            }
            runs.add(new Chooser(out, System.in).run());
        }
        if (runs.size() == 1) {
            return one(out);
        }
        return several(out);
    }

    private void check() {
        if (options.every() > 1 && options.out() == null) {
            throw new ParameterException(
                    spec.commandLine(),
                    "--every says how often estimates.csv gets a row, and without --out there is no such file");
        }
        options.pace();
        options.memory();
        if (runs.size() > 1 && options.out() != null) {
            throw new ParameterException(
                    spec.commandLine(), "--out takes the files of one run; replay the runs one after the other");
        }
    }

    private RunFolder open(Path run, Output out) throws Refusal {
        RunFolder folder = sheet == null ? RunFolder.open(run, out) : RunFolder.open(sheet, run, out);
        return folder.with(options.memory());
    }

    private Integer one(Output out) throws Exception {
        Replay replay = new Replay(open(runs.get(0), out), options, out);
        return EndOfRun.tell(
                out,
                options,
                desk -> options.inPanes(environment) ? replay.inPanes(desk) : replay.inLines(!options.json(), desk));
    }

    /** Each for itself: one that cannot be opened does not stop the others. */
    private Integer several(Output out) throws Exception {
        List<Closing> closings = new ArrayList<>();
        int worst = 0;
        boolean refused = false;
        for (Path run : runs) {
            try {
                Closing closing = new Replay(open(run, out), options, out).inLines(false, new Desk());
                closings.add(closing);
                worst = Math.max(worst, closing.status());
                if (!options.json()) {
                    out.line(SummaryLine.of(closing));
                }
            } catch (Refusal refusal) {
                refusal.messages().forEach(out::error);
                refused = true;
            }
        }
        if (options.json()) {
            out.json(SummaryJson.of(closings));
        }
        return worst == 0 && refused ? ExitStatus.USAGE.code() : worst;
    }
}
