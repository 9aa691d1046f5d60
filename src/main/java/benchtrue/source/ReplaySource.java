package benchtrue.source;

import benchtrue.sheet.BenchSheet;
import benchtrue.sheet.Mistake;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;

/** Readings from a file readings.csv, in its order. */
public final class ReplaySource {
    private ReplaySource() {}

    /** Reads the header; the file stays open where it is ready. */
    public static Opened open(Path readingsCsv, BenchSheet sheet) {
        CsvRows rows = null;
        try {
            rows = new CsvRows(WholeLines.of(readingsCsv));
            Opened opened = open(readingsCsv, sheet, rows);
            if (opened instanceof Opened.Refused) {
                rows.close();
            }
            return opened;
        } catch (IOException e) {
            return refused(
                    readingsCsv,
                    0,
                    "cannot be read: " + Failure.words(e),
                    "check its path and whether you may read it");
        }
    }

    private static Opened open(Path path, BenchSheet sheet, CsvRows rows) throws IOException {
        CsvRows.Kind kind = rows.next();
        if (kind == CsvRows.Kind.END) {
            return refused(path, 0, "the file is empty", "it begins with a header row: time, then the channels");
        }
        if (kind != CsvRows.Kind.ROW) {
            return refused(
                    path, 1, "the header row cannot be read", "give each column a short name, separated by commas");
        }
        if (isUtf16(rows)) {
            return refused(path, 1, "the file is in UTF-16", "save it as UTF-8");
        }
        HeaderReader header = new HeaderReader(path.toString(), rows, sheet.channels());
        Columns columns = header.read();
        if (columns == null) {
            return new Opened.Refused(header.mistakes());
        }
        List<Mistake> notices = new ArrayList<>(columns.notices());
        if (rows.isLast()) {
            notices.add(new Mistake(path.toString(), (int) rows.line(), 0, "there is no reading below the header", ""));
        }
        boolean decimalComma = sheet.line() != null && sheet.line().decimalComma();
        long size = Files.isRegularFile(path) ? Files.size(path) : 0;
        RowReader reader = new RowReader(rows, columns, sheet.channels(), decimalComma, size);
        return new Opened.Ready(
                new RowSource(
                        String.valueOf(path.getFileName()),
                        reader,
                        sheet.channels().size()),
                notices);
    }

    private static boolean isUtf16(CsvRows rows) {
        int first = rows.start(0);
        if (rows.end(0) - first < 2) {
            return false;
        }
        int mark = ((rows.bytes()[first] & 0xFF) << 8) | (rows.bytes()[first + 1] & 0xFF);
        return mark == 0xFFFE || mark == 0xFEFF;
    }

    private static Opened refused(Path path, int line, String message, String remedy) {
        return new Opened.Refused(List.of(new Mistake(path.toString(), line, 0, message, remedy)));
    }
}
