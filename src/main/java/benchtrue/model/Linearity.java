package benchtrue.model;

import benchtrue.model.Syntax.Operator;
import java.util.ArrayList;
import java.util.List;
import java.util.function.Predicate;
import java.util.function.UnaryOperator;
import java.util.stream.Stream;

/** Takes a tree apart into terms coefficient·unknown·…, multiplying parentheses out where an unknown stands in them. */
final class Linearity {
    /** Far more than an equation can have; products of sums grow without bound. */
    private static final int MOST_TERMS = 1000;

    private final Predicate<String> isUnknown;

    Linearity(Predicate<String> isUnknown) {
        this.isUnknown = isUnknown;
    }

    /**
     * @param column where the term is made, for messages
     * @param coefficient without unknowns
     * @param unknowns none for a known term, one for a linear term, more for a product of unknowns
     */
    record Term(int column, Syntax coefficient, List<String> unknowns) {
        Term with(UnaryOperator<Syntax> change) {
            return new Term(column, change.apply(coefficient), unknowns);
        }
    }

    /** @throws Mistake where an unknown stands in a function, an exponent or a denominator */
    List<Term> terms(Syntax syntax) {
        if (!hasUnknown(syntax)) {
            return List.of(new Term(syntax.column(), syntax, List.of()));
        }
        if (syntax instanceof Syntax.Name name) {
            return List.of(new Term(name.column(), Syntax.Literal.whole(name.column(), 1), List.of(name.name())));
        }
        if (syntax instanceof Syntax.Negation negation) {
            return each(terms(negation.operand()), Linearity::negated);
        }
        if (syntax instanceof Syntax.Call call) {
            throw new Mistake(
                    call.column(),
                    "not linear: the unknown " + firstUnknown(call) + " stands inside "
                            + call.function().word(),
                    "make it a constant, or find a form in which it only multiplies");
        }
        return binary((Syntax.Binary) syntax);
    }

    private List<Term> binary(Syntax.Binary binary) {
        return switch (binary.operator()) {
            case PLUS -> joined(terms(binary.left()), terms(binary.right()));
            case MINUS -> joined(terms(binary.left()), each(terms(binary.right()), Linearity::negated));
            case TIMES -> product(binary);
            case OVER -> quotient(binary);
            case POWER -> power(binary);
        };
    }

    private List<Term> product(Syntax.Binary binary) {
        List<Term> product = new ArrayList<>();
        List<Term> right = terms(binary.right());
        for (Term a : terms(binary.left())) {
            right.forEach(b -> product.add(times(binary.column(), a, b)));
            if (product.size() > MOST_TERMS) {
                throw new Mistake(
                        binary.column(),
                        "the product has more than " + MOST_TERMS + " terms",
                        "multiply it out by hand");
            }
        }
        return product;
    }

    private static Term times(int column, Term a, Term b) {
        List<String> unknowns = joined(a.unknowns, b.unknowns);
        int place = a.unknowns.isEmpty() ? b.column : b.unknowns.isEmpty() ? a.column : column;
        return new Term(place, times(column, a.coefficient, b.coefficient), unknowns);
    }

    static Syntax times(int column, Syntax a, Syntax b) {
        if (isOne(a)) {
            return b;
        }
        return isOne(b) ? a : new Syntax.Binary(column, Operator.TIMES, a, b);
    }

    private List<Term> quotient(Syntax.Binary binary) {
        if (hasUnknown(binary.right())) {
            throw new Mistake(
                    binary.column(),
                    "not linear: the unknown " + firstUnknown(binary.right()) + " stands in a denominator",
                    "estimate its reciprocal as the unknown");
        }
        return each(
                terms(binary.left()),
                coefficient -> new Syntax.Binary(binary.column(), Operator.OVER, coefficient, binary.right()));
    }

    private List<Term> power(Syntax.Binary binary) {
        if (hasUnknown(binary.right())) {
            throw new Mistake(
                    binary.column(),
                    "not linear: the unknown " + firstUnknown(binary.right()) + " stands in an exponent",
                    "make the exponent a constant");
        }
        if (binary.right() instanceof Syntax.Literal number && number.unit() == null && number.value() == 1) {
            return terms(binary.left());
        }
        throw new Mistake(
                binary.column(),
                "not linear: the unknown " + firstUnknown(binary.left()) + " is raised to a power",
                "estimate the power itself as the unknown");
    }

    static Syntax negated(Syntax syntax) {
        return syntax instanceof Syntax.Negation negation
                ? negation.operand()
                : new Syntax.Negation(syntax.column(), syntax);
    }

    static boolean isOne(Syntax syntax) {
        return syntax instanceof Syntax.Literal number && number.unit() == null && number.value() == 1;
    }

    boolean hasUnknown(Syntax syntax) {
        return unknowns(syntax).findAny().isPresent();
    }

    private String firstUnknown(Syntax syntax) {
        return unknowns(syntax).findFirst().orElseThrow();
    }

    /** Each unknown as often as it stands there, from left to right. */
    Stream<String> unknowns(Syntax syntax) {
        return names(syntax).map(Syntax.Name::name).filter(isUnknown);
    }

    static Stream<Syntax.Name> names(Syntax syntax) {
        if (syntax instanceof Syntax.Name name) {
            return Stream.of(name);
        }
        if (syntax instanceof Syntax.Negation negation) {
            return names(negation.operand());
        }
        if (syntax instanceof Syntax.Call call) {
            return names(call.argument());
        }
        return syntax instanceof Syntax.Binary binary
                ? Stream.concat(names(binary.left()), names(binary.right()))
                : Stream.empty();
    }

    private static List<Term> each(List<Term> terms, UnaryOperator<Syntax> change) {
        return terms.stream().map(term -> term.with(change)).toList();
    }

    private static <T> List<T> joined(List<T> first, List<T> second) {
        return Stream.concat(first.stream(), second.stream()).toList();
    }
}
