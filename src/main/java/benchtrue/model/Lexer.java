package benchtrue.model;

import benchtrue.model.Token.Kind;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;

/**
 * Cuts a text into tokens. Names are letters, {@code _} and, not first, digits, raised letters and lowered digits; the marks
 * of units {@code % ‰ °} count as letters. Signs that look alike are one: {@code − – ·  ×} are {@code - * }.
 */
final class Lexer {
    /** A sheet's equation has some tens of symbols; what is longer is a mistake and would nest too deep. */
    static final int LARGEST = 1000;

    private static final String SIGNS = "+-*/^()=<>";
    private static final Map<Character, String> LIKE_SIGNS = Map.of(
            '\u2212', "-", '\u2013', "-", '\u00b7', "*", '\u22c5', "*", '\u00d7', "*", '\u2215', "/", '\u2264', "<",
            '\u2265', ">");
    private static final String RAISED = "⁰¹²³⁴⁵⁶⁷⁸⁹";
    private static final char RAISED_MINUS = '⁻';

    private final String text;
    private final List<Token> tokens = new ArrayList<>();
    private int at;

    private Lexer(String text) {
        this.text = text;
    }

    /** The tokens, an {@link Kind#END} behind them. */
    static List<Token> tokens(String text) {
        Lexer lexer = new Lexer(text);
        lexer.run();
        return lexer.tokens;
    }

    private void run() {
        while (skipBlanks()) {
            if (tokens.size() == LARGEST) {
                throw new Mistake(
                        at,
                        "an expression of more than " + LARGEST + " symbols",
                        "split it into channels under [derived]");
            }
            next();
        }
        add(Kind.END, "", at, Double.NaN);
    }

    private boolean skipBlanks() {
        while (at < text.length()
                && (Character.isWhitespace(text.charAt(at)) || Character.isSpaceChar(text.charAt(at)))) {
            at++;
        }
        return at < text.length();
    }

    private void next() {
        char c = text.charAt(at);
        if (isDigit(c) || c == '.') {
            number();
        } else if (isNameStart(text.codePointAt(at))) {
            name();
        } else if (RAISED.indexOf(c) >= 0 || c == RAISED_MINUS) {
            superscript();
        } else {
            sign(c);
        }
    }

    private void sign(char c) {
        String plain = SIGNS.indexOf(c) >= 0 ? String.valueOf(c) : LIKE_SIGNS.get(c);
        if (plain == null) {
            throw unknown(c);
        }
        int start = at++;
        boolean comparison = plain.equals("<") || plain.equals(">");
        if (comparison && at < text.length() && text.charAt(at) == '=') {
            at++;
        }
        if (plain.equals("*") && tokens.size() > 0 && isSecondStar(start)) {
            throw new Mistake(start - 1, "'**' is no operator here", "a power is written with '^'");
        }
        add(Kind.SIGN, plain, start, Double.NaN);
    }

    private boolean isSecondStar(int start) {
        Token last = tokens.get(tokens.size() - 1);
        return last.is("*") && last.end() == start;
    }

    private Mistake unknown(char c) {
        String shown = Character.isISOControl(c)
                ? String.format("U+%04X", (int) c)
                : new String(Character.toChars(text.codePointAt(at)));
        String remedy = switch (c) {
            case ',' -> "the decimal sign is a point, and every function takes one argument";
            case '[', ']', '{', '}' -> "group with ( )";
            case '√' -> "write sqrt(…)";
            default -> "an expression has numbers, names, + - * / ^ and ( )";
        };
        return new Mistake(at, "'" + shown + "' has no meaning here", remedy);
    }

    private void name() {
        int start = at;
        while (at < text.length() && isNamePart(text.codePointAt(at))) {
            at += Character.charCount(text.codePointAt(at));
        }
        add(Kind.NAME, text.substring(start, at), start, Double.NaN);
    }

    /** Digits with at most one point; an exponent only where {@code e} is followed by its digits, so that {@code 5 eV} stays a unit. */
    private void number() {
        int start = at;
        digits();
        if (at < text.length() && text.charAt(at) == '.') {
            at++;
            digits();
        }
        exponent();
        String number = text.substring(start, at);
        if (number.equals(".") || (at < text.length() && text.charAt(at) == '.')) {
            throw new Mistake(
                    start,
                    "'" + text.substring(start, Math.min(at + 1, text.length())) + "' is no number",
                    "write digits with one decimal point");
        }
        double value = Double.parseDouble(number);
        if (Double.isInfinite(value)) {
            throw new Mistake(start, number + " is too large for a number", "the largest is 1.797e308");
        }
        add(Kind.NUMBER, number, start, value);
    }

    private void exponent() {
        if (at >= text.length() || (text.charAt(at) | 0x20) != 'e') {
            return;
        }
        int digits = at + 1;
        if (digits < text.length() && (text.charAt(digits) == '+' || text.charAt(digits) == '-')) {
            digits++;
        }
        if (digits < text.length() && isDigit(text.charAt(digits))) {
            at = digits;
            digits();
        }
    }

    private void digits() {
        while (at < text.length() && isDigit(text.charAt(at))) {
            at++;
        }
    }

    private void superscript() {
        int start = at;
        StringBuilder digits = new StringBuilder();
        if (text.charAt(at) == RAISED_MINUS) {
            digits.append('-');
            at++;
        }
        while (at < text.length() && RAISED.indexOf(text.charAt(at)) >= 0) {
            digits.append(RAISED.indexOf(text.charAt(at++)));
        }
        String raised = text.substring(start, at);
        if (digits.indexOf("-") == digits.length() - 1 || digits.length() > 4) {
            throw new Mistake(start, "'" + raised + "' is no power", "raise one to three digits, or write ^");
        }
        add(Kind.SUPERSCRIPT, raised, start, Integer.parseInt(digits.toString()));
    }

    private void add(Kind kind, String shown, int start, double number) {
        tokens.add(new Token(kind, shown, start, at, number));
    }

    private static boolean isDigit(char c) {
        return c >= '0' && c <= '9';
    }

    static boolean isNameStart(int c) {
        return Character.isLetter(c) || c == '_' || c == '%' || c == '‰' || c == '°' || c == '℃' || c == '℉';
    }

    static boolean isNamePart(int c) {
        return isNameStart(c)
                || (c >= '0' && c <= '9')
                || (c >= '₀' && c <= '₉')
                || Character.getType(c) == Character.NON_SPACING_MARK;
    }
}
