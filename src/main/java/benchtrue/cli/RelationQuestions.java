package benchtrue.cli;

import benchtrue.cli.Answers.Heard;
import benchtrue.model.Parsed;
import benchtrue.model.Problem;
import benchtrue.model.Relation;
import benchtrue.model.Scope;
import benchtrue.model.Unit;
import benchtrue.sheet.MemoryText;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.stream.Collectors;
import org.jspecify.annotations.Nullable;

/** Asks for the equations, and what is known and wanted of their unknowns. */
final class RelationQuestions {
    private static final List<String> RULES = List.of("simple", "0.83U", "U");
    private static final String NO_RULE = "none";

    private final Answers answers;
    private final SheetLines sheet;
    private final Output output;
    private final Scope scope;
    private final Map<String, Unit> units = new LinkedHashMap<>();
    private boolean limited;

    RelationQuestions(Answers answers, SheetLines sheet, Output output, Scope scope) {
        this.answers = answers;
        this.sheet = sheet;
        this.output = output;
        this.scope = scope;
    }

    void ask() throws Refusal {
        output.line("Now the equation: what is measured = a sum of terms, as Q = D*n + c*dp + q0. Each name that is no"
                + " channel is to be estimated.");
        String memory = null;
        for (Relation relation = equation("Equation?", false);
                relation != null;
                relation = equation("Another equation? [none]", true)) {
            sheet.table("[[relations]]");
            sheet.add("equation", relation.text(), understood(relation));
            memory = memory == null ? memory() : memory;
            sheet.add("memory", memory, "");
            unknowns(relation);
        }
        if (limited) {
            rule();
        }
    }

    /** Null where nothing was answered and nothing need be. */
    private @Nullable Relation equation(String question, boolean optional) throws Refusal {
        while (true) {
            String text = answers.ask(question);
            if (text.isEmpty() && optional) {
                return null;
            }
            Parsed<Relation> parsed = Relation.parse(text, scope, units, null);
            parsed.problems().forEach(p -> show(text, p));
            parsed.notices().forEach(p -> show(text, p));
            if (parsed.value() != null) {
                return parsed.value();
            }
        }
    }

    private void show(String text, Problem problem) {
        int column = Math.min(problem.column(), text.length());
        output.line("  " + text);
        output.line("  " + " ".repeat(text.codePointCount(0, column)) + "^ " + problem.message()
                + (problem.remedy().isEmpty() ? "" : "; " + problem.remedy()));
    }

    private static String understood(Relation relation) {
        return relation.responseText() + unit(relation.responseUnit()) + " from "
                + relation.unknowns().stream()
                        .map(u -> u.name() + unit(u.unit()))
                        .collect(Collectors.joining(", "));
    }

    private static String unit(Unit unit) {
        return unit.symbol().isEmpty() ? "" : " in " + unit.symbol();
    }

    private String memory() throws Refusal {
        return answers.until(
                "How far back does the live estimate remember: all, 120 s, 600 readings? [all]",
                answer -> answer.isEmpty() || MemoryText.parse(answer) != null
                        ? new Heard.Taken<>(answer.isEmpty() ? "all" : answer)
                        : new Heard.Refused<>("\"" + answer + "\" is no memory; write all, 120 s or 600 readings"));
    }

    private void unknowns(Relation relation) throws Refusal {
        boolean begun = false;
        for (Relation.Unknown unknown : relation.unknowns()) {
            if (units.containsKey(unknown.name())) {
                continue;
            }
            SheetLines.Entries said = said(relation, unknown);
            if (!said.isEmpty()) {
                if (!begun) {
                    sheet.table("[relations.unknowns]");
                }
                begun = true;
                sheet.add(SheetLines.key(unknown.name()) + " = " + said, "");
            }
        }
    }

    private SheetLines.Entries said(Relation relation, Relation.Unknown unknown) throws Refusal {
        String name = "  " + unknown.name();
        Unit found = unknown.unit();
        Unit unit = answers.until(
                name + ": unit? [" + (found.symbol().isEmpty() ? "none" : found.symbol()) + "]",
                answer -> answer.isEmpty() ? new Heard.Taken<>(found) : fitting(answer, relation, unknown.name()));
        units.put(unknown.name(), unit);
        String in = unit(unit);
        double[] plausible = answers.interval(name + ": between which values" + in + " does a sound rig have it?");
        double wanted = answers.size(name + ": which expanded uncertainty" + in + " is wanted?");
        double[] limits = answers.interval(name + ": tolerance limits" + in + "?");
        limited |= limits.length > 0;
        return new SheetLines.Entries()
                .text("unit", unit.equals(found) ? "" : unit.symbol())
                .interval("plausible", plausible)
                .number("wanted", wanted)
                .interval("limits", limits);
    }

    /** A unit with which the equation still holds. */
    private Heard<Unit> fitting(String answer, Relation relation, String unknown) {
        Heard<Unit> heard = ChannelQuestions.unit(answer);
        if (heard instanceof Heard.Taken<Unit> taken) {
            Map<String, Unit> declared = new LinkedHashMap<>(units);
            declared.put(unknown, taken.value());
            List<Problem> problems =
                    Relation.parse(relation.text(), scope, declared, null).problems();
            if (!problems.isEmpty()) {
                return new Heard.Refused<>(
                        problems.get(0).message() + "; " + problems.get(0).remedy());
            }
        }
        return heard;
    }

    private void rule() throws Refusal {
        String rule = answers.until(
                "Decision rule at the limits, the guard band being nothing (simple), 0.83U or U? [none: no verdict]",
                answer -> answer.isEmpty() || RULES.contains(answer) || answer.equals(NO_RULE)
                        ? new Heard.Taken<>(answer.isEmpty() ? NO_RULE : answer)
                        : new Heard.Refused<>("\"" + answer + "\" is no rule; write simple, 0.83U, U or none"));
        if (!rule.equals(NO_RULE)) {
            sheet.table("[verdict]");
            sheet.add("rule", rule, "");
        }
    }
}
