package benchtrue.cli;

import benchtrue.record.Program;
import java.util.concurrent.Callable;
import picocli.CommandLine;
import picocli.CommandLine.Command;
import picocli.CommandLine.IVersionProvider;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Spec;

/** The program without a command: how it is used, and the line that shows the first rig. */
@Command(
        name = Program.NAME,
        mixinStandardHelpOptions = true,
        versionProvider = RootCommand.Version.class,
        scope = CommandLine.ScopeType.INHERIT,
        description = "Numbers from a test bench that can be defended, with a clear word on drift.",
        exitCodeListHeading = "%nExit status:%n",
        exitCodeList = {
            "0:ended, nothing found",
            "1:a fault of the program",
            "2:wrong usage, or a mistake in a sheet or header",
            "3:the run found a drift alarm, a channel fault or a value outside its limits",
            "4:not to be relied on: an unknown is not determined, or the arithmetic cross-check disagrees",
            "5:the source was lost or could not be read"
        })
final class RootCommand implements Callable<Integer> {
    private final Output output;

    @Spec
    @SuppressWarnings("NullAway.Init")
    private CommandSpec spec;

    RootCommand(Output output) {
        this.output = output;
    }

    @Override
    public Integer call() {
        output.text(spec.commandLine().getUsageMessage());
        output.line("");
        output.line("To see a run: java -jar target/benchtrue.jar replay replays/gear-pump");
        return ExitStatus.USAGE.code();
    }

    /** Name and version. */
    static final class Version implements IVersionProvider {
        @Override
        public String[] getVersion() {
            return new String[] {Program.NAME + " " + Program.version()};
        }
    }
}
