package benchtrue.cli;

import benchtrue.alarm.ReferenceModel;
import benchtrue.record.RunFiles;
import benchtrue.run.Closing;
import benchtrue.run.Desk;
import benchtrue.run.Options;
import benchtrue.run.ReferenceRun;
import benchtrue.run.RunListener;
import benchtrue.run.Runner;
import benchtrue.run.Setup;
import benchtrue.run.SourceMaker;
import benchtrue.sheet.BenchSheet;
import benchtrue.sheet.Group;
import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
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
        setup = setup(run, references());
    }

    private static Setup setup(RunFolder run, List<@Nullable ReferenceModel> references) throws IOException {
        return new Setup(run.sheet(), false, "replay", run.name(), run.sha256(), references);
    }

    /** From the command line, else from the sheet. */
    private List<@Nullable ReferenceModel> references() throws Refusal, IOException {
        BenchSheet sheet = run.sheet();
        Path from = options.reference();
        if (from == null && sheet.reference().fromRun() != null) {
            from = run.sheetFile().resolveSibling(sheet.reference().fromRun());
        }
        if (from == null) {
            return none(sheet);
        }
        RunFolder earlier = RunFolder.open(from, output);
        ReferenceRun reference =
                ReferenceRun.of(setup(earlier, none(earlier.sheet())), earlier.maker(), earlier.acts());
        String refusal = reference.refusal(sheet);
        if (!refusal.isEmpty()) {
            throw new Refusal(from + ": cannot be the reference: " + refusal + "; name another run with --reference");
        }
        return reference.models(sheet);
    }

    private static List<@Nullable ReferenceModel> none(BenchSheet sheet) {
        List<@Nullable ReferenceModel> none = new ArrayList<>();
        for (Group group : sheet.groups()) {
            if (!group.relations().isEmpty()) {
                none.add(null);
            }
        }
        return none;
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
        try (RunFiles files = new RunFiles(out, run.sheet(), options.every(), errors::error)) {
            return new Runner(setup, maker, maker, driven, new Listeners(lines, files), desk).run();
        }
    }
}
