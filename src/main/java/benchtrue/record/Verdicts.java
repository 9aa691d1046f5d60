package benchtrue.record;

import benchtrue.model.Interval;
import benchtrue.run.Closing;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.jspecify.annotations.Nullable;

/** The statements of conformity, one line for everything that has limits, each with the rule chosen beforehand. */
final class Verdicts {
    private Verdicts() {}

    static List<String> lines(Closing closing) {
        List<String> lines = new ArrayList<>();
        for (Closing.Relation relation : closing.relations()) {
            for (Closing.Unknown u : relation.unknowns()) {
                add(
                        lines,
                        u.name(),
                        u.unit(),
                        u.limits(),
                        u.rule(),
                        u.verdict(),
                        u.verdictWithheld(),
                        u.conformityProbability());
            }
        }
        for (Closing.Result r : closing.results()) {
            add(
                    lines,
                    r.name(),
                    r.unit(),
                    r.limits(),
                    r.rule(),
                    r.verdict(),
                    r.verdictWithheld(),
                    r.conformityProbability());
        }
        return lines;
    }

    private static void add(
            List<String> lines,
            String name,
            String unit,
            @Nullable Interval limits,
            String rule,
            @Nullable String verdict,
            @Nullable String withheld,
            double probability) {
        String range = Figures.limits(limits);
        if (range.isEmpty()) {
            return;
        }
        String asked = name + ", " + (range + " " + unit).strip() + ": ";
        String answer = verdict == null
                ? "no verdict" + (withheld == null ? "" : ": " + withheld)
                : verdict + " under " + rule(rule) + probability(probability);
        String line = asked + answer;
        if (!lines.contains(line)) {
            lines.add(line);
        }
    }

    private static String rule(String rule) {
        return rule.equals("simple") ? "simple acceptance" : "a guard band of " + rule;
    }

    private static String probability(double probability) {
        return Double.isFinite(probability)
                ? String.format(Locale.ROOT, " (probability of conformity %.3g %%)", 100 * probability)
                : "";
    }
}
