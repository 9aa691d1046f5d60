package benchtrue.source;

import benchtrue.sheet.BenchSheet;
import benchtrue.sheet.Channel;
import benchtrue.sheet.LineSpec;
import benchtrue.sheet.Mistake;
import benchtrue.sheet.Rehearsal;
import java.io.BufferedWriter;
import java.io.IOException;
import java.math.BigDecimal;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.util.Locale;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.jspecify.annotations.Nullable;

/** Writes the readings of the simulated rig as the folder of a run. */
public final class Rehearsing {
    private static final String SHEET = "sheet.toml";
    private static final String READINGS = "readings.csv";
    private static final String RAW = "raw.log";
    private static final String UNFINISHED = ".part";

    private Rehearsing() {}

    /**
     * Writes sheet.toml, readings.csv and, where the sheet has a line that is not polled, raw.log. The folder is made if need be. Nothing that is
     * there is ever replaced by something else: a folder that holds another sheet or other readings is refused.
     *
     * @param rehearsal the sheet's own
     */
    public static Rehearsed write(Path sheetFile, BenchSheet sheet, Rehearsal rehearsal, Path out, long seed) {
        Path readings = out.resolve(READINGS + UNFINISHED);
        Path raw = out.resolve(RAW + UNFINISHED);
        try {
            String foreign = foreign(sheetFile, out);
            if (foreign != null) {
                return refused(out, foreign);
            }
            Files.createDirectories(out);
            try {
                long count = writeRows(sheet, rehearsal, seed, readings, raw);
                if (!isNewOrSame(readings, out.resolve(READINGS)) || !isNewOrSame(raw, out.resolve(RAW))) {
                    return refused(out, "the folder holds other readings, which are not replaced");
                }
                finish(sheetFile, out, readings, raw);
                return new Rehearsed.Written(count);
            } finally {
                Files.deleteIfExists(readings);
                Files.deleteIfExists(raw);
            }
        } catch (IOException e) {
            return refused(out, "cannot be written: " + Failure.words(e));
        }
    }

    private static void finish(Path sheetFile, Path out, Path readings, Path raw) throws IOException {
        Files.move(readings, out.resolve(READINGS), StandardCopyOption.REPLACE_EXISTING);
        if (Files.exists(raw)) {
            Files.move(raw, out.resolve(RAW), StandardCopyOption.REPLACE_EXISTING);
        }
        if (!Files.exists(out.resolve(SHEET))) {
            Files.copy(sheetFile, out.resolve(SHEET));
        }
    }

    private static Rehearsed refused(Path out, String message) {
        return new Rehearsed.Refused(new Mistake(out.toString(), 0, 0, message, "name another folder with --out"));
    }

    /** Why the folder is not for this sheet; null where it is empty, not there, or has this very sheet. */
    private static @Nullable String foreign(Path sheetFile, Path out) throws IOException {
        if (!Files.exists(out)) {
            return null;
        }
        if (!Files.isDirectory(out)) {
            return "is no folder";
        }
        Path sheet = out.resolve(SHEET);
        if (Files.exists(sheet)) {
            return Files.mismatch(sheet, sheetFile) < 0 ? null : "the folder holds another sheet";
        }
        try (Stream<Path> entries = Files.list(out)) {
            return entries.findAny().isEmpty() ? null : "the folder is not empty and holds no run of this sheet";
        }
    }

    private static boolean isNewOrSame(Path made, Path there) throws IOException {
        return !Files.exists(there) || (Files.exists(made) && Files.mismatch(made, there) < 0);
    }

    private static long writeRows(BenchSheet sheet, Rehearsal rehearsal, long seed, Path readings, Path raw)
            throws IOException {
        SimulatedRows rows = new SimulatedRows(sheet, rehearsal, seed);
        LineSpec line = sheet.poll() == null ? sheet.line() : null;
        long count = 0;
        try (BufferedWriter csv = Files.newBufferedWriter(readings, StandardCharsets.UTF_8);
                BufferedWriter log = line == null ? null : Files.newBufferedWriter(raw, StandardCharsets.UTF_8)) {
            csv.write(sheet.channels().stream().map(Channel::name).collect(Collectors.joining(",", "time,", "\n")));
            while (rows.advance()) {
                if (log != null && line != null) {
                    log.write(String.format(Locale.ROOT, "%.6f\t", rows.seconds())
                            + RawBytes.text(RawText.sent(line, rows)) + "\n");
                }
                if (!rows.isGarbled()) {
                    csv.write(row(rows));
                    count++;
                }
            }
        }
        return count;
    }

    private static String row(SimulatedRows rows) {
        StringBuilder row = new StringBuilder(rows.time());
        for (BigDecimal cell : rows.cells()) {
            row.append(',').append(cell == null ? "" : cell.toPlainString());
        }
        return row.append('\n').toString();
    }
}
