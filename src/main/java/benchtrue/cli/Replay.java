package benchtrue.cli;

import benchtrue.alarm.ReferenceModel;
import benchtrue.record.RunFiles;
import benchtrue.run.Closing;
import benchtrue.run.Desk;
import benchtrue.run.Options;
import benchtrue.run.RunListener;
import benchtrue.run.Runner;
import benchtrue.run.Setup;
import benchtrue.run.SourceMaker;
import java.io.IOException;
import java.nio.file.Path;
import java.util.List;
import org.jspecify.annotations.Nullable;

/** One replay: puts source, engine, files and what is shown together. */
final class Replay {
    private static final double PACE_IN_PANES = 20;

    private final RunFolder run;
    private final RunOptions options;
    private final Output output;
    private final Setup setup;

    Replay(RunFolder run, RunOptions options, Output output) throws Refusal, IOException {
        this.run = run;
        this.options = options;
        this.output = output;
        List<@Nullable ReferenceModel> references =
                References.of(run.sheet(), run.sheetFile(), options.reference(), output);
        setup = new Setup(run.sheet(), false, "replay", run.name(), run.sha256(), references);
    }

    /** @param told whether lines say what happens */
    Closing inLines(boolean told, Desk desk) throws IOException, InterruptedException, Refusal {
        RunListener lines = told ? new PlainLines(output, run.sheet()) : null;
        return run(lines, driven(Double.POSITIVE_INFINITY, false), desk, output);
    }

    /** Ends when the operator closes it. */
    Closing inPanes(Desk desk) throws Exception {
        Options driven = driven(PACE_IN_PANES, true);
        return new PaneRun(desk, run.sheet(), output).show(aside -> run(null, driven, desk, aside));
    }

    private Options driven(double pace, boolean shown) {
        Double wanted = options.pace();
        return new Options(wanted == null ? pace : wanted, shown, run.acts());
    }

    private Closing run(@Nullable RunListener lines, Options driven, Desk desk, Output errors)
            throws IOException, InterruptedException, Refusal {
        SourceMaker maker = run.maker();
        Path out = options.out();
        if (out == null) {
            return new Runner(setup, maker, maker, driven, new Listeners(lines, null), desk).run();
        }
        OutFolder.claim(out, options.yes());
        try (RunFiles files = RunFiles.begin(out, run.sheet(), options.every(), errors::error)) {
            return new Runner(setup, maker, maker, driven, new Listeners(lines, files), desk).run();
        }
    }
}
