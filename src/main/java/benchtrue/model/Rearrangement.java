package benchtrue.model;

import benchtrue.model.Linearity.Term;
import benchtrue.model.Syntax.Operator;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import org.jspecify.annotations.Nullable;

/** Finds, for an equation that is not linear, one that is, and writes it out. */
final class Rearrangement {
    private final Linearity linearity;
    private final Syntax response;
    private final Unit responseUnit;

    Rearrangement(Linearity linearity, Syntax response, Unit responseUnit) {
        this.linearity = linearity;
        this.response = response;
        this.responseUnit = responseUnit;
    }

    /** One unknown for each product of unknowns: {@code y = a*(x - x0)} becomes {@code y = a*x - ax0}. */
    String ofProducts(List<Term> terms) {
        Set<String> products = new LinkedHashSet<>();
        List<String> written = new ArrayList<>();
        for (Term term : terms) {
            String name = String.join("", term.unknowns());
            if (term.unknowns().size() > 1) {
                products.add(name + " = " + String.join("*", term.unknowns()));
            }
            written.add(written(name, term.coefficient()));
        }
        return "write " + Printer.text(response) + " = " + sum(written) + ", with " + String.join(", ", products)
                + " as one unknown";
    }

    /** Null where nothing that is known here makes it linear. */
    @Nullable
    String of(Syntax right) {
        if (right instanceof Syntax.Binary quotient
                && quotient.operator() == Operator.OVER
                && linearity.hasUnknown(quotient.right())) {
            return reciprocal(quotient);
        }
        return logarithm(right);
    }

    /** {@code y = N/(a + b*x)} becomes {@code N/y = a + b*x}; {@code y = a*x/(b + x)} is divided by a as well. */
    private @Nullable String reciprocal(Syntax.Binary quotient) {
        List<Term> above = termsOrNone(quotient.left());
        List<Term> below = termsOrNone(quotient.right());
        boolean usable = above.size() == 1
                && above.get(0).unknowns().size() <= 1
                && !below.isEmpty()
                && below.stream().allMatch(term -> term.unknowns().size() <= 1);
        if (!usable) {
            return null;
        }
        Syntax known = above.get(0).coefficient();
        if (above.get(0).unknowns().isEmpty()) {
            return "write " + Printer.text(new Syntax.Binary(0, Operator.OVER, known, response)) + " = "
                    + Printer.text(quotient.right());
        }
        return dividedBy(above.get(0).unknowns().get(0), known, below);
    }

    private String dividedBy(String divisor, Syntax known, List<Term> below) {
        Map<String, String> meanings = new LinkedHashMap<>();
        List<String> written = new ArrayList<>();
        for (Term term : below) {
            String top = term.unknowns().isEmpty() ? "1" : term.unknowns().get(0);
            String name = top.equals("1") ? "inv" + divisor : top + "_per_" + divisor;
            meanings.put(name, top + "/" + divisor);
            written.add(written(name, ratio(term.coefficient(), known)));
        }
        List<String> with = meanings.entrySet().stream()
                .map(entry -> entry.getKey() + " = " + entry.getValue())
                .toList();
        Syntax one = Syntax.Literal.whole(0, 1);
        return "write " + Printer.text(new Syntax.Binary(0, Operator.OVER, one, response)) + " = " + sum(written)
                + ", with " + String.join(", ", with);
    }

    private static Syntax ratio(Syntax above, Syntax below) {
        if (Linearity.isOne(below)) {
            return above;
        }
        return Printer.text(above).equals(Printer.text(below))
                ? Syntax.Literal.whole(0, 1)
                : new Syntax.Binary(0, Operator.OVER, above, below);
    }

    private List<Term> termsOrNone(Syntax syntax) {
        try {
            return linearity.terms(syntax);
        } catch (Mistake notLinear) {
            return List.of();
        }
    }

    /** {@code y = a*exp(b*x)} becomes {@code ln(y) = lna + b*x}, {@code y = a*x^b} becomes {@code ln(y) = lna + b*ln(x)}. */
    private @Nullable String logarithm(Syntax right) {
        List<String> terms = new ArrayList<>();
        List<String> meanings = new ArrayList<>();
        boolean linear = factors(right, false, terms, meanings);
        if (!linear) {
            return null;
        }
        String with = meanings.isEmpty() ? "" : ", with " + String.join(", ", meanings);
        return "write ln(" + plain(response, responseUnit) + ") = " + sum(terms) + with;
    }

    /** The logarithm of a product, term by term; false where one factor has none that is linear. */
    private boolean factors(Syntax syntax, boolean inverse, List<String> terms, List<String> meanings) {
        if (syntax instanceof Syntax.Binary binary) {
            return switch (binary.operator()) {
                case TIMES ->
                    factors(binary.left(), inverse, terms, meanings)
                            && factors(binary.right(), inverse, terms, meanings);
                case OVER ->
                    factors(binary.left(), inverse, terms, meanings)
                            && factors(binary.right(), !inverse, terms, meanings);
                case POWER -> power(binary, inverse, terms);
                default -> known(syntax, inverse, terms);
            };
        }
        if (syntax instanceof Syntax.Call call && call.function() == Function.EXP && isLinear(call.argument())) {
            terms.add(signed(inverse, Printer.text(call.argument(), inverse ? 2 : 1)));
            return true;
        }
        if (syntax instanceof Syntax.Name name && linearity.hasUnknown(name)) {
            terms.add(signed(inverse, "ln" + name.name()));
            meanings.add("ln" + name.name() + " = ln(" + name.name() + ")");
            return true;
        }
        return known(syntax, inverse, terms);
    }

    private boolean power(Syntax.Binary power, boolean inverse, List<String> terms) {
        if (linearity.hasUnknown(power.left()) || !isLinear(power.right())) {
            return false;
        }
        String exponent = Printer.text(power.right(), Operator.TIMES.binding);
        terms.add(signed(inverse, exponent + "*ln(" + Printer.text(power.left()) + ")"));
        return true;
    }

    private boolean known(Syntax syntax, boolean inverse, List<String> terms) {
        if (linearity.hasUnknown(syntax)) {
            return false;
        }
        if (!Linearity.isOne(syntax)) {
            terms.add(signed(inverse, "ln(" + Printer.text(syntax) + ")"));
        }
        return true;
    }

    private boolean isLinear(Syntax syntax) {
        List<Term> terms = termsOrNone(syntax);
        return !terms.isEmpty()
                && terms.stream().allMatch(term -> term.unknowns().size() <= 1);
    }

    private static String plain(Syntax syntax, Unit unit) {
        return unit.fits(Unit.ONE)
                ? Printer.text(syntax)
                : Printer.text(syntax, Operator.OVER.binding) + "/(1 " + unit.difference() + ")";
    }

    private static String written(String name, Syntax coefficient) {
        boolean negative = coefficient instanceof Syntax.Negation;
        Syntax size = coefficient instanceof Syntax.Negation negation ? negation.operand() : coefficient;
        String factor = Printer.text(size, Operator.TIMES.binding);
        String term = name.isEmpty() ? factor : Linearity.isOne(size) ? name : name + "*" + factor;
        return signed(negative, term);
    }

    private static String signed(boolean negative, String term) {
        return negative ? "-" + term : term;
    }

    private static String sum(List<String> terms) {
        return String.join(" + ", terms).replace("+ -", "- ");
    }
}
