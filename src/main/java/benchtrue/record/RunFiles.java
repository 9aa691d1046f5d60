package benchtrue.record;

import benchtrue.run.Closing;
import benchtrue.run.EstimateRow;
import benchtrue.run.Event;
import benchtrue.run.RunListener;
import benchtrue.run.TimedAct;
import benchtrue.sheet.BenchSheet;
import benchtrue.source.Failure;
import java.io.Closeable;
import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;
import java.util.function.Consumer;
import org.jspecify.annotations.Nullable;

/**
 * The files that the program adds to a run folder: estimates, events and acts as they come, the summary in two forms at the end.
 * What cannot be written is told once for each file and never stops the run.
 */
public final class RunFiles implements RunListener, Closeable {
    private final Path folder;
    private final BenchSheet sheet;
    private final long every;
    private final Consumer<String> trouble;
    private EstimatesFile estimates;
    private EventsFile events;
    private @Nullable ActsFile acts;
    private int known;

    /**
     * Begins the files afresh, those of the acts too.
     *
     * @param folder exists
     * @param every one row of estimates.csv for so many readings, at least 1
     */
    public static RunFiles begin(Path folder, BenchSheet sheet, long every, Consumer<String> trouble) {
        RunFiles files = new RunFiles(folder, sheet, every, 0, trouble);
        files.forgetActs();
        return files;
    }

    /**
     * Begins afresh what can be computed again, and goes on with the acts of a recorded run.
     *
     * @param acts how many are in the file; the run tells them again
     */
    public static RunFiles resume(Path folder, BenchSheet sheet, long every, int acts, Consumer<String> trouble) {
        return new RunFiles(folder, sheet, every, acts, trouble);
    }

    private RunFiles(Path folder, BenchSheet sheet, long every, int known, Consumer<String> trouble) {
        this.folder = folder;
        this.sheet = sheet;
        this.every = every;
        this.trouble = trouble;
        estimates = new EstimatesFile(folder, sheet, every, trouble);
        events = new EventsFile(folder, trouble);
        this.known = known;
    }

    /** Those of an earlier run into the same folder. */
    private void forgetActs() {
        try {
            Files.deleteIfExists(folder.resolve(ActsFile.NAME));
        } catch (IOException e) {
            trouble.accept(folder.resolve(ActsFile.NAME) + ": cannot be removed (" + Failure.words(e) + ")");
        }
    }

    /** All files that are written into a run folder. */
    public static List<String> names() {
        return List.of(EstimatesFile.NAME, EventsFile.NAME, ActsFile.NAME, SummaryJson.NAME, SummaryText.NAME);
    }

    /** Whether an existing file begins as the ones written here do. */
    public static boolean wrote(Path file) throws IOException {
        String start = switch (String.valueOf(file.getFileName())) {
            case EstimatesFile.NAME -> "reading,time";
            case ActsFile.NAME -> "reading,time,act,";
            case EventsFile.NAME -> "reading,time,event,";
            case SummaryJson.NAME -> "{\n  \"program\": {\n    \"name\": \"" + Program.NAME + "\"";
            default -> SummaryText.FIRST_WORDS;
        };
        byte[] wanted = start.getBytes(StandardCharsets.UTF_8);
        try (InputStream in = Files.newInputStream(file)) {
            byte[] found = in.readNBytes(wanted.length);
            return found.length == 0 || Arrays.equals(found, wanted);
        }
    }

    @Override
    public void reading(EstimateRow row) {
        estimates.reading(row);
    }

    @Override
    public void event(Event event) {
        events.event(event);
    }

    /** The file of acts begins with the first of them. */
    @Override
    public void act(TimedAct act) {
        if (known > 0) {
            known--;
            return;
        }
        if (acts == null) {
            acts = new ActsFile(folder, trouble);
        }
        acts.act(act);
    }

    /** All that was written is void: the files begin afresh. */
    @Override
    public void restarted() {
        close();
        estimates = new EstimatesFile(folder, sheet, every, trouble);
        events = new EventsFile(folder, trouble);
        if (acts != null) {
            forgetActs();
            acts = null;
        }
    }

    @Override
    public void closed(Closing closing) {
        write(SummaryJson.NAME, SummaryJson.of(closing));
        write(SummaryText.NAME, SummaryText.of(closing));
    }

    private void write(String name, String text) {
        Path file = folder.resolve(name);
        try {
            WholeFile.write(file, text);
        } catch (IOException e) {
            trouble.accept(file + ": cannot be written (" + Failure.words(e)
                    + "). Free space or bring the folder back, then replay the run.");
        }
    }

    @Override
    public void close() {
        estimates.close();
        events.close();
        if (acts != null) {
            acts.close();
        }
    }
}
