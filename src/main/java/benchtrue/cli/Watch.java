package benchtrue.cli;

import benchtrue.record.Recorder;
import benchtrue.record.RunFiles;
import benchtrue.run.Act;
import benchtrue.run.Closing;
import benchtrue.run.Desk;
import benchtrue.run.Options;
import benchtrue.run.RunListener;
import benchtrue.run.Runner;
import benchtrue.run.Setup;
import benchtrue.run.SourceMaker;
import benchtrue.run.TimedAct;
import benchtrue.sheet.BenchSheet;
import benchtrue.source.Opened;
import benchtrue.source.PolledSource;
import benchtrue.source.Recorded;
import benchtrue.source.ReplaySource;
import benchtrue.source.ResumedSource;
import benchtrue.source.SerialSource;
import benchtrue.source.Source;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import org.jspecify.annotations.Nullable;

/** One live run: puts line, recorder, engine, files and what is shown together. */
final class Watch {
    private static final String SEGMENT = "the run was resumed";

    private final LiveFolder folder;
    private final String port;
    private final RunOptions options;
    private final Output output;
    private final BenchSheet sheet;
    private final Setup setup;

    Watch(LiveFolder folder, String port, RunOptions options, Output output) throws Refusal, IOException {
        this.folder = folder;
        this.port = port;
        this.options = options;
        this.output = output;
        sheet = folder.sheet();
        setup = new Setup(
                sheet,
                true,
                "serial",
                port,
                null,
                References.of(sheet, folder.sheetFile(), options.reference(), output));
    }

    Closing inPanes(Desk desk) throws Exception {
        return new PaneRun(desk, sheet, output).show(aside -> run(null, true, desk, aside));
    }

    /** @param told whether lines say what happens */
    Closing inLines(boolean told, Desk desk) throws IOException, InterruptedException, Refusal {
        return run(told ? new PlainLines(output, sheet) : null, false, desk, output);
    }

    private Closing run(@Nullable RunListener lines, boolean shown, Desk desk, Output errors)
            throws IOException, InterruptedException, Refusal {
        Recorded before = folder.recorded();
        List<TimedAct> acts = new ArrayList<>(folder.acts());
        if (folder.isResumed()) {
            acts.add(new TimedAct(before.readings(), before.seconds(), new Act.NewSegment(SEGMENT)));
        }
        Options driven = new Options(Double.POSITIVE_INFINITY, shown, acts);
        try (Recorder recorder = new Recorder(folder.path(), sheet, before.firstUtcMicros(), errors::error);
                RunFiles files = RunFiles.resume(
                        folder.path(), sheet, options.every(), folder.acts().size(), errors::error)) {
            Source line = open(before, recorder);
            if (lines != null) {
                output.line("Listening to " + port);
            }
            SourceMaker maker = () -> folder.isResumed() ? new ResumedSource(record(), line) : line;
            SourceMaker record = () -> {
                recorder.settle();
                return record();
            };
            return new Runner(setup, maker, record, driven, new Listeners(lines, files), desk).run();
        }
    }

    private Source open(Recorded before, Recorder recorder) throws Refusal {
        try {
            return sheet.poll() == null
                    ? SerialSource.open(port, sheet, before, recorder)
                    : PolledSource.open(port, sheet, before, recorder);
        } catch (IOException e) {
            throw new Refusal(
                    ExitStatus.SOURCE_LOST,
                    List.of(port + ": " + e.getMessage() + "; benchtrue ports lists the ports of this machine"));
        }
    }

    private Source record() {
        Path readings = folder.path().resolve(LiveFolder.READINGS);
        if (ReplaySource.open(readings, sheet) instanceof Opened.Ready ready) {
            return ready.source();
        }
        throw new UncheckedIOException(new IOException(readings + ": cannot be read any more"));
    }
}
