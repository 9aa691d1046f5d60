package benchtrue.model;

/**
 * One symbol of an expression or unit.
 *
 * @param column of its first character, {@code end} just behind its last
 * @param number of a {@link Kind#NUMBER} or {@link Kind#SUPERSCRIPT}, else NaN
 */
record Token(Kind kind, String text, int column, int end, double number) {
    enum Kind {
        NUMBER,
        NAME,
        /** One of {@code + - * / ^ ( ) = < >}, in its plain form. */
        SIGN,
        /** Raised digits: a power. */
        SUPERSCRIPT,
        END
    }

    boolean is(String sign) {
        return kind == Kind.SIGN && text.equals(sign);
    }

    /** How messages name it. */
    String quoted() {
        return kind == Kind.END ? "the end" : "'" + text + "'";
    }
}
