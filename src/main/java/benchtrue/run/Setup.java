package benchtrue.run;

import benchtrue.alarm.ReferenceModel;
import benchtrue.sheet.BenchSheet;
import java.util.List;
import org.jspecify.annotations.Nullable;

/**
 * What a run is made of, fixed before its first reading.
 *
 * @param sheet with the options of the command line already in it
 * @param live whether readings come as they are measured
 * @param sourceKind "replay", "serial", …
 * @param sourceName of the folder or port as records name it
 * @param sourceSha256 of the file of a replay; null: none
 * @param references for each group the model of an earlier run; null where there is none
 */
public record Setup(
        BenchSheet sheet,
        boolean live,
        String sourceKind,
        String sourceName,
        @Nullable String sourceSha256,
        List<? extends @Nullable ReferenceModel> references) {}
