package benchtrue.model;

import benchtrue.model.Linearity.Term;
import benchtrue.model.Syntax.Operator;
import java.util.ArrayList;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.jspecify.annotations.Nullable;

/** From the text of an equation to its relation. */
final class RelationParser {
    private final String text;
    private final Scope scope;
    private final Map<String, Unit> declaredUnits;
    private final @Nullable Expression weight;
    private final Messages messages = new Messages();
    private final Typing typing;
    private final Linearity linearity;

    RelationParser(String text, Scope scope, Map<String, Unit> declaredUnits, @Nullable Expression weight) {
        this.text = text;
        this.scope = scope;
        this.declaredUnits = declaredUnits;
        this.weight = weight;
        typing = new Typing(scope, messages);
        linearity = new Linearity(name -> !isKnown(name));
    }

    private boolean isKnown(String name) {
        return scope.has(name) || name.equals(Function.TIME);
    }

    private boolean isOfSheet(String name) {
        return scope.has(name) || declaredUnits.containsKey(name);
    }

    Parsed<Relation> parse() {
        try {
            List<Token> tokens = Lexer.tokens(text);
            Token sign = equalsSign(tokens);
            int place = tokens.indexOf(sign);
            Syntax left = side(tokens.subList(0, place), sign.column());
            Syntax right = side(tokens.subList(place + 1, tokens.size() - 1), text.length());
            Relation relation =
                    relation(left, right, text.substring(0, sign.column()).strip());
            return relation == null ? messages.failed() : messages.done(relation);
        } catch (Mistake mistake) {
            messages.problem(mistake.problem);
            return messages.failed();
        }
    }

    private Token equalsSign(List<Token> tokens) {
        List<Token> signs = tokens.stream().filter(token -> token.is("=")).toList();
        if (signs.size() != 1) {
            int column = signs.isEmpty() ? text.length() : signs.get(1).column();
            String message = signs.isEmpty() ? "an equation needs '='" : "an equation has one '='";
            throw new Mistake(column, message, "write: response = sum of terms, as in Q = D*n + c*dp + q0");
        }
        return signs.get(0);
    }

    private Syntax side(List<Token> tokens, int end) {
        return Parser.parse(text, tokens, end, this::isOfSheet);
    }

    private @Nullable Relation relation(Syntax left, Syntax right, String responseText) {
        checkNames(right);
        Typed measured = typing.type(left);
        Map<String, Syntax> coefficients = new LinkedHashMap<>();
        Syntax response = left;
        for (Term term : linearTerms(left, right, measured)) {
            if (term.unknowns().isEmpty()) {
                response = without(term, response);
            } else {
                coefficients.merge(term.unknowns().get(0), term.coefficient(), (a, b) -> plus(term, a, b));
            }
        }
        if (coefficients.isEmpty()) {
            throw new Mistake(
                    right.column(),
                    "the right side has no unknown: every name is a channel or a constant",
                    "name what is to be estimated, as D in Q = D*n");
        }
        Typed typedResponse = measured == null || response == left ? measured : typing.type(response);
        return typedResponse == null ? null : relation(responseText, typedResponse, coefficients);
    }

    private static Syntax plus(Term term, Syntax a, Syntax b) {
        return new Syntax.Binary(term.column(), Operator.PLUS, a, b);
    }

    /** A term without an unknown moves to the left side. */
    private static Syntax without(Term known, Syntax response) {
        return known.coefficient() instanceof Syntax.Negation negation
                ? new Syntax.Binary(known.column(), Operator.PLUS, response, negation.operand())
                : new Syntax.Binary(known.column(), Operator.MINUS, response, known.coefficient());
    }

    private List<Term> linearTerms(Syntax left, Syntax right, @Nullable Typed measured) {
        Rearrangement rearrangement = new Rearrangement(linearity, left, measured == null ? Unit.ONE : measured.unit());
        try {
            List<Term> terms = linearity.terms(right);
            terms.stream()
                    .filter(term -> term.unknowns().size() > 1)
                    .findFirst()
                    .ifPresent(term -> {
                        throw new Mistake(
                                term.column(),
                                "not linear: the unknowns " + String.join(" and ", term.unknowns())
                                        + " multiply each other",
                                rearrangement.ofProducts(terms));
                    });
            return terms;
        } catch (Mistake mistake) {
            String linear = rearrangement.of(right);
            throw linear == null ? mistake : mistake.with(linear);
        }
    }

    private @Nullable Relation relation(String responseText, Typed response, Map<String, Syntax> coefficients) {
        List<Relation.Unknown> unknowns = new ArrayList<>();
        List<Code> regressors = new ArrayList<>();
        coefficients.forEach((name, coefficient) -> {
            Typed typed = typing.type(coefficient);
            if (typed != null) {
                noticeSharedNoise(name, coefficient, typed, response);
                Unit unit = unitOf(name, coefficient, typed, response);
                unknowns.add(new Relation.Unknown(name, unit, typed.isConstant()));
                regressors.add(Code.scaled(typed.code(), factor(typed, unit, response)));
            }
        });
        return messages.hasProblems() ? null : new Relation(text, responseText, response, unknowns, regressors, weight);
    }

    /** Declared, or that of the response for each of the coefficient. */
    private Unit unitOf(String name, Syntax coefficient, Typed typed, Typed response) {
        Unit declared = declaredUnits.get(name);
        boolean isResponseItself = Linearity.isOne(coefficient);
        if (declared == null) {
            return isResponseItself ? response.unit() : response.unit().over(typed.unit());
        }
        Unit product = declared.times(typed.unit());
        if (!product.fits(response.unit())) {
            messages.problem(
                    coefficient.column(),
                    name + " in " + Sums.shown(declared) + " makes its term " + Sums.shown(product)
                            + ", the response is in " + Sums.shown(response.unit()),
                    "declare " + name + " in " + Sums.shown(response.unit().over(typed.unit()))
                            + " or a unit that fits it");
        } else if (isResponseItself && response.isPoint() && !declared.equals(response.unit())) {
            messages.problem(
                    coefficient.column(),
                    name + " in " + Sums.shown(declared) + " is a temperature on another scale than the response",
                    "declare " + name + " in " + response.unit());
        }
        return declared;
    }

    private static double factor(Typed coefficient, Unit unknown, Typed response) {
        Unit product = coefficient.unit().times(unknown);
        return product.fits(response.unit()) ? product.factorTo(response.unit()) : Double.NaN;
    }

    private void noticeSharedNoise(String name, Syntax coefficient, Typed typed, Typed response) {
        if (!Collections.disjoint(typed.sources(), response.sources())) {
            messages.notice(
                    coefficient.column(),
                    "the regressor " + Printer.text(coefficient) + " of " + name
                            + " is computed from a channel of the response: they share its noise",
                    "the estimate is biased by it; measure the regressor apart where that matters");
        }
    }

    /** A name that is nearly one of the sheet's was perhaps meant for it. */
    private void checkNames(Syntax right) {
        Linearity.names(right)
                .filter(name -> !isOfSheet(name.name()) && !isKnown(name.name()))
                .forEach(name -> {
                    String nearest = name.name().length() > 1 ? Nearest.to(name.name(), scope.names()) : null;
                    if (nearest != null && (nearest.equalsIgnoreCase(name.name()) || nearest.length() > 3)) {
                        messages.notice(
                                name.column(),
                                name.name() + " is taken for an unknown, and " + nearest + " stands in the sheet",
                                "mend the name if " + nearest + " was meant");
                    }
                });
    }
}
