package benchtrue.model;

import benchtrue.model.Token.Kind;
import java.util.List;

/** A place in a list of tokens that ends with {@link Kind#END}. */
final class Tokens {
    private final String text;
    private final List<Token> list;
    private int place;

    /** @param text that the tokens were cut from */
    Tokens(String text, List<Token> list) {
        this.text = text;
        this.list = list;
    }

    Token peek() {
        return list.get(place);
    }

    /** The end again and again, once it is reached. */
    Token next() {
        Token token = peek();
        if (token.kind() != Kind.END) {
            place++;
        }
        return token;
    }

    /** Steps over the sign if it is the next. */
    boolean take(String sign) {
        boolean is = peek().is(sign);
        if (is) {
            next();
        }
        return is;
    }

    boolean at(Kind kind) {
        return peek().kind() == kind;
    }

    /** The token {@code steps} behind the next; the end where there is none. */
    Token ahead(int steps) {
        return list.get(Math.min(place + steps, list.size() - 1));
    }

    /** Just behind the token that was taken last. */
    int end() {
        return place == 0 ? 0 : list.get(place - 1).end();
    }

    String textSince(int earlier) {
        return text.substring(list.get(earlier).column(), end());
    }

    int place() {
        return place;
    }
}
