package benchtrue.cli;

import benchtrue.alarm.ReferenceModel;
import benchtrue.run.ReferenceRun;
import benchtrue.run.Setup;
import benchtrue.sheet.BenchSheet;
import benchtrue.sheet.Group;
import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import org.jspecify.annotations.Nullable;

/** The models of an earlier run that drift is judged against: named on the command line, else in the sheet. */
final class References {
    private References() {}

    /** One for each group, null where there is none. */
    static List<@Nullable ReferenceModel> of(BenchSheet sheet, Path sheetFile, @Nullable Path named, Output output)
            throws Refusal, IOException {
        Path from = named;
        if (from == null && sheet.reference().fromRun() != null) {
            from = sheetFile.resolveSibling(sheet.reference().fromRun());
        }
        if (from == null) {
            return none(sheet);
        }
        RunFolder earlier = RunFolder.open(from, output);
        Setup setup =
                new Setup(earlier.sheet(), false, "replay", earlier.name(), earlier.sha256(), none(earlier.sheet()));
        ReferenceRun reference = ReferenceRun.of(setup, earlier.maker(), earlier.acts());
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
}
