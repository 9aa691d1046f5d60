package benchtrue.cli;

import benchtrue.record.ActsFile;
import benchtrue.run.TimedAct;
import benchtrue.sheet.BenchSheet;
import benchtrue.sheet.Mistake;
import benchtrue.source.Failure;
import benchtrue.source.Recorded;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Instant;
import java.time.ZoneOffset;
import java.time.format.DateTimeFormatter;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.stream.Stream;
import org.jspecify.annotations.Nullable;

/**
 * The folder of a live run.
 *
 * @param acts of the run so far
 * @param isResumed whether it goes on with what is recorded there
 */
record LiveFolder(Path path, BenchSheet sheet, List<TimedAct> acts, Recorded recorded, boolean isResumed) {
    static final String SHEET = "sheet.toml";
    static final String READINGS = "readings.csv";

    private static final DateTimeFormatter START =
            DateTimeFormatter.ofPattern("uuuuMMdd'T'HHmmss'Z'", Locale.ROOT).withZone(ZoneOffset.UTC);

    /** Makes a folder with a copy of the sheet; by default {@code runs/<UTC start>-<sheet name>}. */
    static LiveFolder begin(Path sheetFile, BenchSheet sheet, @Nullable Path out) throws Refusal {
        Path folder = out == null ? Path.of("runs", START.format(Instant.now()) + "-" + name(sheetFile)) : out;
        try {
            if (Files.exists(folder) && !isEmpty(folder)) {
                throw new Refusal(folder + ": is there already and not empty; name another folder with --out, or go on"
                        + " with a run by --resume " + folder);
            }
            Files.createDirectories(folder);
            Files.copy(sheetFile, folder.resolve(SHEET));
        } catch (IOException e) {
            throw new Refusal(
                    folder + ": cannot be written to (" + Failure.words(e) + "); name another folder with --out");
        }
        return new LiveFolder(folder, sheet, List.of(), Recorded.NOTHING, false);
    }

    /** Goes on with a run that was closed, killed or lost its power. */
    static LiveFolder resume(Path folder, Output output) throws Refusal {
        BenchSheet sheet = RunFolder.sheet(folder.resolve(SHEET), output);
        List<Mistake> mistakes = new ArrayList<>();
        List<TimedAct> acts = ActsFile.read(folder, mistakes);
        mistakes.forEach(m -> output.error(m.toString()));
        Path readings = folder.resolve(READINGS);
        try {
            Recorded recorded = Files.exists(readings) ? Recorded.of(readings, sheet) : Recorded.NOTHING;
            if (recorded.readings() > 0 && recorded.started() == null) {
                throw new Refusal(readings
                        + ": its times have no date, so it is not of a live run; begin a new one: watch SHEET");
            }
            return new LiveFolder(folder, sheet, acts, recorded, recorded.readings() > 0);
        } catch (IOException e) {
            throw new Refusal(readings + ": cannot be read (" + Failure.words(e) + ")");
        }
    }

    Path sheetFile() {
        return path.resolve(SHEET);
    }

    private static boolean isEmpty(Path folder) throws IOException {
        try (Stream<Path> entries = Files.list(folder)) {
            return entries.findAny().isEmpty();
        }
    }

    /** Of the sheet's file, or of its folder where that is the copy in a run. */
    private static String name(Path sheetFile) {
        Path file = sheetFile.toAbsolutePath().normalize();
        String name = String.valueOf(file.getFileName());
        Path parent = file.getParent();
        if (name.equals(SHEET) && parent != null && parent.getFileName() != null) {
            return parent.getFileName().toString();
        }
        return name.endsWith(".toml") ? name.substring(0, name.length() - ".toml".length()) : name;
    }

    /** The same with another memory in all its relations. */
    LiveFolder with(BenchSheet other) {
        return new LiveFolder(path, other, acts, recorded, isResumed);
    }
}
