package benchtrue.cli;

import benchtrue.model.Memory;
import benchtrue.record.ActsFile;
import benchtrue.run.SourceMaker;
import benchtrue.run.TimedAct;
import benchtrue.sheet.BenchSheet;
import benchtrue.sheet.Mistake;
import benchtrue.sheet.SheetReader;
import benchtrue.sheet.SheetReading;
import benchtrue.source.Opened;
import benchtrue.source.ReplaySource;
import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.ArrayList;
import java.util.HexFormat;
import java.util.List;
import org.jspecify.annotations.Nullable;

/**
 * A recorded run that was opened: its sheet was read and the header of its readings fits.
 *
 * @param name as summaries name it
 * @param readings the file
 */
record RunFolder(String name, Path sheetFile, BenchSheet sheet, Path readings, List<TimedAct> acts) {
    private static final String SHEET = "sheet.toml";
    private static final String READINGS = "readings.csv";

    /** Opens a run folder. Notices go to the output. */
    static RunFolder open(Path folder, Output output) throws Refusal {
        if (!Files.isDirectory(folder)) {
            throw new Refusal(folder
                    + (Files.exists(folder)
                            ? ": is a file, not a run folder; for a file of readings give its sheet too: --sheet SHEET "
                                    + folder
                            : ": there is no such run folder; check the name"));
        }
        for (String file : List.of(SHEET, READINGS)) {
            if (!Files.exists(folder.resolve(file))) {
                throw new Refusal(folder + ": this folder holds no run: it has no " + file);
            }
        }
        List<Mistake> mistakes = new ArrayList<>();
        List<TimedAct> acts = ActsFile.read(folder, mistakes);
        mistakes.forEach(m -> output.error(m.toString()));
        return of(name(folder), folder.resolve(SHEET), folder.resolve(READINGS), acts, output);
    }

    /** A sheet with a file of readings that lies elsewhere. */
    static RunFolder open(Path sheet, Path readings, Output output) throws Refusal {
        return of(name(readings), sheet, readings, List.of(), output);
    }

    private static RunFolder of(String name, Path sheetFile, Path readings, List<TimedAct> acts, Output output)
            throws Refusal {
        BenchSheet sheet = sheet(sheetFile, output);
        Opened opened = ReplaySource.open(readings, sheet);
        if (opened instanceof Opened.Refused refused) {
            throw new Refusal(
                    ExitStatus.USAGE,
                    refused.mistakes().stream().map(Mistake::toString).toList());
        }
        Opened.Ready ready = (Opened.Ready) opened;
        ready.notices().forEach(n -> output.error(n.toString()));
        try {
            ready.source().close();
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
        return new RunFolder(name, sheetFile, sheet, readings, acts);
    }

    /** The last name of a path, so that nothing of the machine gets into a record. */
    private static String name(Path path) {
        Path last = path.toAbsolutePath().normalize().getFileName();
        return last == null ? "run" : last.toString();
    }

    /** A sheet without a mistake. */
    static BenchSheet sheet(Path file, Output output) throws Refusal {
        SheetReading reading = SheetReader.read(file);
        if (reading.sheet() == null) {
            throw new Refusal(
                    ExitStatus.USAGE,
                    reading.mistakes().stream().map(Mistake::toString).toList());
        }
        reading.notices().forEach(n -> output.error(n.toString()));
        return reading.sheet();
    }

    /** The same with another memory in all its relations. */
    RunFolder with(@Nullable Memory memory) {
        if (memory == null) {
            return this;
        }
        return new RunFolder(name, sheetFile, sheet.with(memory), readings, acts);
    }

    /** Opens the readings from their beginning. */
    SourceMaker maker() {
        return () -> {
            Opened opened = ReplaySource.open(readings, sheet);
            if (opened instanceof Opened.Ready ready) {
                return ready.source();
            }
            Mistake mistake = ((Opened.Refused) opened).mistakes().get(0);
            throw new UncheckedIOException(new IOException(mistake.toString()));
        };
    }

    String sha256() throws IOException {
        try (InputStream in = Files.newInputStream(readings)) {
            MessageDigest digest = MessageDigest.getInstance("SHA-256");
            byte[] buffer = new byte[1 << 16];
            for (int count = in.read(buffer); count >= 0; count = in.read(buffer)) {
                digest.update(buffer, 0, count);
            }
            return HexFormat.of().formatHex(digest.digest());
        } catch (NoSuchAlgorithmException e) {
            throw new IllegalStateException("this Java has no SHA-256", e);
        }
    }
}
