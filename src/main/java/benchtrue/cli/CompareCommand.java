package benchtrue.cli;

import benchtrue.record.ComparisonJson;
import benchtrue.record.ComparisonText;
import benchtrue.run.Closing;
import benchtrue.run.ComparedUnknown;
import benchtrue.run.Desk;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;

/** The same unknowns over several runs. */
@Command(
        name = "compare",
        description = "The same unknowns over several runs: values, agreement, trend, when a limit would be reached.")
final class CompareCommand implements Callable<Integer> {
    private final Output output;

    @Spec
    @SuppressWarnings("NullAway.Init")
    private CommandSpec spec;

    @Parameters(arity = "1..*", paramLabel = "RUN", description = "Two run folders or more.")
    @SuppressWarnings("NullAway.Init")
    private List<Path> runs;

    @Option(names = "--json", description = "As JSON on standard output, and nothing else there.")
    private boolean json;

    @Option(names = "--ascii", description = "Nothing but ASCII characters.")
    private boolean ascii;

    CompareCommand(Output output) {
        this.output = output;
    }

    @Override
    public Integer call() throws Exception {
        Output out = ascii ? output.inAscii() : output;
        if (runs.size() < 2) {
            throw new ParameterException(spec.commandLine(), "compare takes two RUN folders or more");
        }
        List<Closing> closings = new ArrayList<>();
        for (Path run : runs) {
            Replay replay = new Replay(RunFolder.open(run, out), new RunOptions(), out);
            closings.add(replay.inLines(false, new Desk()));
        }
        List<ComparedUnknown> unknowns = ComparedUnknown.of(closings);
        if (json) {
            out.json(ComparisonJson.of(unknowns));
        } else {
            out.text(ComparisonText.of(unknowns));
        }
        return status(unknowns).code();
    }

    private static ExitStatus status(List<ComparedUnknown> unknowns) {
        if (unknowns.isEmpty()) {
            return ExitStatus.UNRELIABLE;
        }
        return unknowns.stream().anyMatch(ComparedUnknown::isFinding) ? ExitStatus.FOUND : ExitStatus.NOTHING_FOUND;
    }
}
