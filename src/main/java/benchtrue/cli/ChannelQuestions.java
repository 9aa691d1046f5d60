package benchtrue.cli;

import benchtrue.cli.Answers.Heard;
import benchtrue.model.Parsed;
import benchtrue.model.Problem;
import benchtrue.model.Scope;
import benchtrue.model.Unit;
import java.util.ArrayList;
import java.util.List;

/** Asks which field is what. */
final class ChannelQuestions {
    static final String SKIP = "-";
    private static final String SKIP_REST = "--";
    private static final String TIME = "time";
    private static final String PLAIN = "none";

    private final Answers answers;
    private final SheetLines sheet;
    private final Output output;
    private final List<String> names = new ArrayList<>();
    private Scope scope = Scope.EMPTY;

    ChannelQuestions(Answers answers, SheetLines sheet, Output output) {
        this.answers = answers;
        this.sheet = sheet;
        this.output = output;
    }

    /** @param timed whether one of the fields may be the time: of a file, not of a line that is stamped when it arrives */
    void ask(Sample sample, boolean timed) throws Refusal {
        output.line("Now the fields. " + SKIP + " leaves one out, " + SKIP_REST + " this and all behind it.");
        sheet.table("[channels]");
        do {
            names.clear();
            fields(sample, timed);
        } while (isUseless());
    }

    private boolean isUseless() {
        boolean useless = scope.equals(Scope.EMPTY);
        if (useless) {
            output.line("  No field has a name: there is nothing to make an equation of. Once more:");
        }
        return useless;
    }

    private void fields(Sample sample, boolean timed) throws Refusal {
        boolean rest = false;
        for (int i = 0; i < sample.fields().size(); i++) {
            Sample.Field field = sample.fields().get(i);
            String name = rest ? SKIP_REST : name(i + 1, field, timed);
            rest = name.equals(SKIP_REST);
            if (rest || name.equals(SKIP)) {
                names.add(SKIP);
            } else {
                names.add(name);
                if (!name.equals(TIME)) {
                    channel(name, field);
                }
            }
        }
    }

    private String name(int number, Sample.Field field, boolean timed) throws Refusal {
        boolean known = refusal(field.name(), timed).isEmpty();
        String shown = "Field " + number + (field.name().isEmpty() ? "" : ", " + field.name())
                + (field.example().isEmpty() ? "" : ", as in " + field.example());
        if (field.name().equals(TIME) && known) {
            output.line(shown + ": the time.");
            return TIME;
        }
        String hint = number == 1 && timed ? " (time where it is the time)" : "";
        return answers.until(shown + ": its name?" + hint + (known ? " [" + field.name() + "]" : ""), answer -> {
            String name = answer.isEmpty() && known ? field.name() : answer;
            String refusal = name.equals(SKIP) || name.equals(SKIP_REST) ? "" : refusal(name, timed);
            return refusal.isEmpty() ? new Heard.Taken<>(name) : new Heard.Refused<>(refusal);
        });
    }

    private String refusal(String name, boolean timed) {
        if (name.equals(TIME)) {
            boolean free = timed && !names.contains(TIME);
            return free ? "" : timed ? "the time is there already" : "lines are stamped when they arrive: answer -";
        }
        String refusal = scope.refusal(name);
        return refusal == null ? "" : "name \"" + name + "\" " + refusal;
    }

    private void channel(String name, Sample.Field field) throws Refusal {
        boolean known = !field.unit().isEmpty();
        Unit unit = answers.until(
                "  " + name + ": its unit, as bar or L/min? " + (known ? "[" + field.unit() + "]" : "[" + PLAIN + "]"),
                answer -> unit(answer.isEmpty() ? field.unit() : answer));
        double noise = answers.size("  " + name + ": standard deviation of one reading"
                + (unit.isPlain() ? "" : ", in " + unit.difference()) + ", if it is known?");
        scope = scope.withChannel(name, unit, Double.NaN);
        SheetLines.Entries entries =
                new SheetLines.Entries().text("unit", unit.symbol()).number("noise", noise);
        String example = field.example().isEmpty() ? "" : "reads " + field.example() + " " + unit.symbol();
        sheet.add(SheetLines.key(name) + " = " + entries, example.strip());
    }

    /** Of an answer in words; {@code none} is a plain number. */
    static Heard<Unit> unit(String answer) {
        if (answer.isEmpty() || answer.equals(PLAIN)) {
            return new Heard.Taken<>(Unit.ONE);
        }
        Parsed<Unit> parsed = Unit.parse(answer);
        if (parsed.value() != null) {
            return new Heard.Taken<>(parsed.value());
        }
        Problem problem = parsed.problems().get(0);
        return new Heard.Refused<>(problem.message() + "; " + problem.remedy());
    }

    Scope scope() {
        return scope;
    }

    /** One for each field: the channel, {@code time} or {@code -}. */
    List<String> names() {
        return names;
    }
}
