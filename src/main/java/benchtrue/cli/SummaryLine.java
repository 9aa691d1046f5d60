package benchtrue.cli;

import benchtrue.estimate.Rounded;
import benchtrue.run.Closing;
import java.util.stream.Collectors;

/** One run in one line. */
final class SummaryLine {
    private SummaryLine() {}

    static String of(Closing closing) {
        String unknowns = closing.relations().stream()
                .flatMap(r -> r.unknowns().stream())
                .distinct()
                .map(SummaryLine::unknown)
                .collect(Collectors.joining(", "));
        return closing.sourceName() + ": " + closing.status() + ", " + closing.statusText() + ". " + unknowns;
    }

    private static String unknown(Closing.Unknown unknown) {
        if (!unknown.determined()) {
            return unknown.name() + " not determined";
        }
        String unit = unknown.unit().isEmpty() ? "" : " " + unknown.unit();
        return unknown.name() + " = "
                + Rounded.of(unknown.estimate(), unknown.expandedUncertainty()).text() + unit;
    }
}
