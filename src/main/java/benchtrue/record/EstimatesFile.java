package benchtrue.record;

import benchtrue.run.EstimateRow;
import benchtrue.sheet.BenchSheet;
import benchtrue.sheet.Group;
import benchtrue.sheet.RelationSpec;
import benchtrue.sheet.UnknownSpec;
import java.io.Closeable;
import java.nio.file.Path;
import java.util.function.Consumer;

/** estimates.csv: what each reading left behind, in the sheet's units. */
final class EstimatesFile implements Closeable {
    static final String NAME = "estimates.csv";

    private final CsvOut csv;
    private final long every;

    /** @param every one row for so many readings, at least 1; the first reading is always among them */
    EstimatesFile(Path folder, BenchSheet sheet, long every, Consumer<String> trouble) {
        if (every < 1) {
            throw new IllegalArgumentException("a row every " + every + " readings: must be at least 1");
        }
        this.every = every;
        csv = new CsvOut(new GrowingFile(folder.resolve(NAME), trouble));
        header(sheet);
    }

    private void header(BenchSheet sheet) {
        csv.text("reading").text("time");
        for (Group group : sheet.groups()) {
            for (UnknownSpec unknown : group.unknowns()) {
                csv.text(unknown.name()).text("u(" + unknown.name() + ")");
            }
        }
        for (Group group : sheet.groups()) {
            for (RelationSpec relation : group.relations()) {
                csv.text("innovation(" + relation.label() + ")").text("bound(" + relation.label() + ")");
            }
        }
        csv.endRow();
    }

    void reading(EstimateRow row) {
        if ((row.reading - 1) % every != 0) {
            return;
        }
        csv.whole(row.reading).number(row.time);
        for (int i = 0; i < row.estimates.length; i++) {
            csv.number(row.estimates[i]).number(row.uncertainties[i]);
        }
        for (int k = 0; k < row.innovations.length; k++) {
            csv.number(row.innovations[k]).number(row.bounds[k]);
        }
        csv.endRow();
    }

    @Override
    public void close() {
        csv.close();
    }
}
