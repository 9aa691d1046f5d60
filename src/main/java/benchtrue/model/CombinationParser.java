package benchtrue.model;

import benchtrue.model.Linearity.Term;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.jspecify.annotations.Nullable;

/** From the text of a result to its coefficients. */
final class CombinationParser {
    private final String text;
    private final Scope scope;
    private final Map<String, Unit> unknowns;
    private final Messages messages = new Messages();

    CombinationParser(String text, Scope scope, Map<String, Unit> unknowns) {
        this.text = text;
        this.scope = scope;
        this.unknowns = unknowns;
    }

    Parsed<Combination> parse(@Nullable Unit declared, List<Unit> usual) {
        try {
            Syntax syntax = Parser.parse(text, name -> scope.has(name) || unknowns.containsKey(name));
            checkNames(syntax);
            if (messages.hasProblems()) {
                return messages.failed();
            }
            List<Part> parts = parts(syntax);
            Combination combination = messages.hasProblems() ? null : combination(parts, declared, usual);
            return combination == null ? messages.failed() : messages.done(combination);
        } catch (Mistake mistake) {
            messages.problem(mistake.problem);
            return messages.failed();
        }
    }

    private void checkNames(Syntax syntax) {
        Linearity.names(syntax)
                .filter(name -> !unknowns.containsKey(name.name()))
                .forEach(name -> {
                    Scope.Meaning meaning = scope.find(name.name());
                    if (meaning instanceof Scope.Value || name.name().equals(Function.TIME)) {
                        messages.problem(
                                name.column(),
                                "a result is made of unknowns and constants; " + name.name()
                                        + " varies from reading to reading",
                                "give the value that is meant, as in " + example(meaning));
                    } else if (meaning == null) {
                        String nearest = Nearest.to(name.name(), unknowns.keySet());
                        messages.problem(
                                name.column(),
                                name.name() + " is neither unknown nor constant",
                                nearest == null
                                        ? "the unknowns are " + String.join(" ", unknowns.keySet())
                                        : "did you mean " + nearest + "?");
                    }
                });
    }

    private static String example(Scope.@Nullable Meaning meaning) {
        return meaning == null || meaning.unit().isPlain() ? "(120)" : "(120 " + meaning.unit() + ")";
    }

    /** @param unknown null for the constant; {@code unit} is that of the whole term */
    private record Part(int column, @Nullable String unknown, Unit unit, double coefficient) {}

    private List<Part> parts(Syntax syntax) {
        Typing typing = new Typing(scope, messages);
        List<Part> parts = new ArrayList<>();
        for (Term term : new Linearity(unknowns::containsKey).terms(syntax)) {
            if (term.unknowns().size() > 1) {
                throw new Mistake(
                        term.column(),
                        "the unknowns " + String.join(" and ", term.unknowns()) + " multiply each other",
                        "a result is a sum in which each term has one unknown");
            }
            Typed typed = typing.type(term.coefficient());
            if (typed != null && typed.code() instanceof Code.Constant constant) {
                parts.add(part(term, typed.unit(), constant.value()));
            }
        }
        return parts;
    }

    private Part part(Term term, Unit unit, double coefficient) {
        if (term.unknowns().isEmpty()) {
            return new Part(term.column(), null, unit, coefficient);
        }
        String name = term.unknowns().get(0);
        Unit own = unknowns.getOrDefault(name, Unit.ONE);
        return new Part(term.column(), name, Linearity.isOne(term.coefficient()) ? own : own.times(unit), coefficient);
    }

    private @Nullable Combination combination(List<Part> parts, @Nullable Unit declared, List<Unit> usual) {
        Unit first = parts.get(0).unit;
        Unit unit = declared != null
                ? declared
                : usual.stream().filter(first::fits).findFirst().orElse(first);
        double constant = 0;
        Map<String, Double> coefficients = new LinkedHashMap<>();
        for (Part part : parts) {
            if (!part.unit.fits(unit)) {
                messages.problem(
                        part.column,
                        "this term is in " + Sums.shown(part.unit) + ", the result in " + Sums.shown(unit),
                        Sums.misfitRemedy(part.unit, unit));
            } else if (part.unknown == null) {
                constant += part.unit.hasOffset() && unit.hasOffset()
                        ? part.unit.convert(part.coefficient, unit)
                        : part.coefficient * part.unit.factorTo(unit);
            } else {
                coefficients.merge(part.unknown, part.coefficient * part.unit.factorTo(unit), Double::sum);
            }
        }
        if (coefficients.isEmpty() && !messages.hasProblems()) {
            messages.problem(0, "the result has no unknown", "name one of " + String.join(" ", unknowns.keySet()));
        }
        return messages.hasProblems() ? null : new Combination(text, unit, constant, coefficients);
    }
}
