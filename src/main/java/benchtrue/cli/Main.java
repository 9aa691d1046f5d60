package benchtrue.cli;

import benchtrue.record.Program;
import java.io.FileDescriptor;
import java.io.FileOutputStream;
import java.io.IOException;
import java.io.PrintStream;
import java.io.UncheckedIOException;
import java.util.Locale;
import java.util.Map;
import java.util.Objects;
import picocli.CommandLine;

/** Where the program begins: command line in, exit status out. */
public final class Main {
    private Main() {}

    public static void main(String[] args) {
        Locale.setDefault(Locale.ROOT);
        Map<String, String> environment = System.getenv();
        Output output = new Output(
                new PrintStream(new FileOutputStream(FileDescriptor.out)),
                new PrintStream(new FileOutputStream(FileDescriptor.err)),
                Surroundings.onlyAscii(environment));
        int status = run(args, output, environment);
        System.exit(status);
    }

    /** Runs one command. */
    static int run(String[] args, Output output, Map<String, String> environment) {
        CommandLine commands = new CommandLine(new RootCommand(output))
                .addSubcommand(new CheckCommand(output))
                .addSubcommand(new SheetCommand(output, System.in))
                .addSubcommand(new ReplayCommand(output, environment))
                .addSubcommand(new WatchCommand(output, environment))
                .addSubcommand(new CompareCommand(output))
                .addSubcommand(new RehearseCommand(output))
                .addSubcommand(new PortsCommand(output));
        commands.setUsageHelpAutoWidth(false);
        commands.setParameterExceptionHandler((wrong, arguments) -> {
            output.error(String.valueOf(wrong.getMessage()));
            output.error("Try: benchtrue " + commandName(wrong.getCommandLine()) + "--help");
            return ExitStatus.USAGE.code();
        });
        commands.setExecutionExceptionHandler((exception, line, result) -> {
            if (exception instanceof Refusal refusal) {
                refusal.messages().forEach(output::error);
                return refusal.status().code();
            }
            if (exception instanceof UncheckedIOException gone) {
                IOException why = Objects.requireNonNull(gone.getCause());
                output.error(why.getMessage() + "; the run ends here, what was written stays");
                return ExitStatus.SOURCE_LOST.code();
            }
            output.error(Faults.record(exception, Program.version(), environment));
            return ExitStatus.FAULT.code();
        });
        return commands.execute(args);
    }

    private static String commandName(CommandLine line) {
        return line.getParent() == null ? "" : line.getCommandName() + " ";
    }
}
