package benchtrue.cli;

import benchtrue.model.Memory;
import benchtrue.run.Closing;
import benchtrue.run.Desk;
import benchtrue.sheet.BenchSheet;
import java.nio.file.Path;
import java.util.Map;
import java.util.Objects;
import java.util.concurrent.Callable;
import org.jspecify.annotations.Nullable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;

/** A live run. */
@Command(
        name = "watch",
        description = "A live run from the serial line; its folder can be replayed, and resumed after any end.")
final class WatchCommand implements Callable<Integer> {
    private final Output output;
    private final Map<String, String> environment;

    @Spec
    @SuppressWarnings("NullAway.Init")
    private CommandSpec spec;

    @Mixin
    private final RunOptions options = new RunOptions();

    @Parameters(
            arity = "0..1",
            paramLabel = "SHEET",
            description = "Bench sheet with a [line]; without one, what there is to choose from.")
    private @Nullable Path sheetFile;

    @Option(names = "--port", paramLabel = "PORT", description = "Instead of the sheet's port.")
    private @Nullable String port;

    @Option(names = "--resume", paramLabel = "RUN", description = "Go on with this run, as a new segment.")
    private @Nullable Path resumed;

    WatchCommand(Output output, Map<String, String> environment) {
        this.output = output;
        this.environment = environment;
    }

    @Override
    public Integer call() throws Exception {
        Output out = options.ascii() ? output.inAscii() : output;
        if (sheetFile == null && resumed == null && Surroundings.isTerminal()) {
            Chooser chooser = new Chooser(out, System.in);
            sheetFile = chooser.sheet();
            port = port == null ? chooser.port() : port;
        }
        check();
        LiveFolder folder = folder(out);
        Memory memory = options.memory();
        Watch watch = new Watch(
                memory == null ? folder : folder.with(folder.sheet().with(memory)), port(folder.sheet()), options, out);
        out.error("Recording in " + folder.path());
        return EndOfRun.tell(out, options, desk -> closing(watch, desk));
    }

    private Closing closing(Watch watch, Desk desk) throws Exception {
        return options.inPanes(environment) ? watch.inPanes(desk) : watch.inLines(!options.json(), desk);
    }

    private void check() {
        options.every();
        if (options.pace() != null) {
            throw wrong("--pace: a live run goes at its own pace; leave it out");
        }
        if ((sheetFile == null) == (resumed == null)) {
            throw wrong("give a SHEET to begin a run, or --resume RUN to go on with one");
        }
        if (resumed != null && options.out() != null) {
            throw wrong("--out: a resumed run goes on in its own folder; leave it out");
        }
    }

    private LiveFolder folder(Output out) throws Refusal {
        if (resumed != null) {
            return LiveFolder.resume(resumed, out);
        }
        Path file = Objects.requireNonNull(sheetFile);
        BenchSheet sheet = RunFolder.sheet(file, out);
        if (sheet.line() == null) {
            throw new Refusal(
                    file + ": has no [line], so nothing says how readings come; add one as docs/serial.md shows");
        }
        port(sheet);
        return LiveFolder.begin(file, sheet, options.out());
    }

    private String port(BenchSheet sheet) {
        String named =
                port != null || sheet.line() == null ? port : sheet.line().port();
        if (named == null) {
            throw wrong("--port: the sheet names no port; give one, benchtrue ports lists those of this machine");
        }
        return named;
    }

    private ParameterException wrong(String message) {
        return new ParameterException(spec.commandLine(), message);
    }
}
