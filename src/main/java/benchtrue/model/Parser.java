package benchtrue.model;

import benchtrue.model.Syntax.Operator;
import benchtrue.model.Token.Kind;
import java.util.ArrayList;
import java.util.List;
import java.util.function.Predicate;
import java.util.function.Supplier;

/**
 * The grammar of expressions. {@code ^} binds strongest and to the right, then the sign, then {@code * /}, then {@code + -}:
 * {@code -2^2} is −4, {@code 2^3^2} is 512, {@code 2^-1} is ½. Raised digits are a power.
 */
final class Parser {
    private static final int DEEPEST = 100;

    private final Tokens tokens;
    private final Predicate<String> isOfSheet;
    private int depth;

    /** @param isOfSheet whether a name is one of the sheet, and therefore ends the unit behind a number */
    private Parser(Tokens tokens, Predicate<String> isOfSheet) {
        this.tokens = tokens;
        this.isOfSheet = isOfSheet;
    }

    /** An expression that fills the text. */
    static Syntax parse(String text, Predicate<String> isOfSheet) {
        List<Token> tokens = Lexer.tokens(text);
        return parse(text, tokens.subList(0, tokens.size() - 1), text.length(), isOfSheet);
    }

    /** An expression that fills a part of the text, up to the column {@code end}. */
    static Syntax parse(String text, List<Token> part, int end, Predicate<String> isOfSheet) {
        List<Token> closed = new ArrayList<>(part);
        closed.add(new Token(Kind.END, "", end, end, Double.NaN));
        Parser parser = new Parser(new Tokens(text, closed), isOfSheet);
        Syntax expression = parser.expression();
        parser.expectEnd();
        return expression;
    }

    private void expectEnd() {
        Token rest = tokens.peek();
        if (rest.kind() == Kind.END) {
            return;
        }
        if (rest.is(")")) {
            throw new Mistake(rest.column(), "')' without its '('", "remove it, or open the parenthesis");
        }
        if (rest.kind() == Kind.SIGN) {
            throw new Mistake(rest.column(), rest.quoted() + " has no meaning in an expression", "use + - * / ^");
        }
        throw new Mistake(
                rest.column(), "an operator is missing before " + rest.quoted(), "a product is written with '*'");
    }

    private Syntax expression() {
        Syntax left = product();
        while (tokens.peek().is("+") || tokens.peek().is("-")) {
            Token sign = tokens.next();
            left = new Syntax.Binary(sign.column(), sign.is("+") ? Operator.PLUS : Operator.MINUS, left, product());
        }
        return left;
    }

    private Syntax product() {
        Syntax left = signed();
        while (tokens.peek().is("*") || tokens.peek().is("/")) {
            Token sign = tokens.next();
            left = new Syntax.Binary(sign.column(), sign.is("*") ? Operator.TIMES : Operator.OVER, left, signed());
        }
        return left;
    }

    private Syntax signed() {
        Token sign = tokens.peek();
        if (tokens.take("-")) {
            return new Syntax.Negation(sign.column(), deeper(sign, this::signed));
        }
        return tokens.take("+") ? deeper(sign, this::signed) : power();
    }

    private Syntax power() {
        Syntax base = primary();
        Token sign = tokens.peek();
        if (sign.kind() == Kind.SUPERSCRIPT) {
            tokens.next();
            Syntax exponent = Syntax.Literal.whole(sign.column(), (int) sign.number());
            return new Syntax.Binary(sign.column(), Operator.POWER, base, exponent);
        }
        return tokens.take("^")
                ? new Syntax.Binary(sign.column(), Operator.POWER, base, deeper(sign, this::signed))
                : base;
    }

    private Syntax primary() {
        Token token = tokens.next();
        if (token.is("(")) {
            return inside(token, token);
        }
        return switch (token.kind()) {
            case NUMBER -> number(token);
            case NAME -> name(token);
            default -> throw expected(token);
        };
    }

    private Mistake expected(Token token) {
        String remedy = "put a number, a name or a parenthesis here";
        if (token.kind() == Kind.END) {
            boolean empty = tokens.end() == 0;
            return new Mistake(
                    token.column(),
                    empty ? "the expression is empty" : "the expression ends where a value is expected",
                    remedy);
        }
        return new Mistake(token.column(), "a value is expected, not " + token.quoted(), remedy);
    }

    private Syntax number(Token token) {
        Unit unit = UnitParser.literal(tokens, isOfSheet);
        return new Syntax.Literal(token.column(), token.text(), token.number(), unit);
    }

    private Syntax name(Token token) {
        Function function = Function.named(token.text());
        Token open = tokens.peek();
        if (function != null && tokens.take("(")) {
            return new Syntax.Call(token.column(), function, inside(open, token));
        }
        if (function != null) {
            throw new Mistake(
                    token.column(),
                    "the function " + token.text() + " needs its argument",
                    "write " + token.text() + "(…); no channel or unknown can have this name");
        }
        if (open.is("(")) {
            throw unknownFunction(token);
        }
        return new Syntax.Name(token.column(), token.text());
    }

    private Mistake unknownFunction(Token token) {
        String name = token.text();
        if (name.equals(Function.TIME) || isOfSheet.test(name)) {
            return new Mistake(
                    token.column(), name + " is no function", "a product is written with '*': " + name + "*(…)");
        }
        String nearest = Nearest.to(name, Function.words());
        String meant = nearest == null
                ? "a product is written with '*'; functions"
                : "did you mean " + nearest + "? Functions";
        return new Mistake(
                token.column(), "there is no function " + name, meant + " are " + String.join(" ", Function.words()));
    }

    /** The expression up to the closing parenthesis. */
    private Syntax inside(Token open, Token blamed) {
        Syntax inner = deeper(blamed, this::expression);
        if (!tokens.take(")")) {
            throw unclosed(open);
        }
        return inner;
    }

    private Mistake unclosed(Token open) {
        Token token = tokens.peek();
        if (token.kind() == Kind.END || token.is("=")) {
            return new Mistake(open.column(), "'(' is never closed", "add the missing ')'");
        }
        return new Mistake(
                token.column(),
                "an operator or ')' is missing before " + token.quoted(),
                "a product is written with '*'");
    }

    private Syntax deeper(Token at, Supplier<Syntax> part) {
        if (++depth > DEEPEST) {
            throw new Mistake(
                    at.column(), "nested more than " + DEEPEST + " deep", "give the inner part a name under [derived]");
        }
        Syntax syntax = part.get();
        depth--;
        return syntax;
    }
}
