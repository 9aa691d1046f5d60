package benchtrue.screen;

/** Texts in columns of a fixed width. */
final class Columns {
    private Columns() {}

    static String left(Canvas canvas, String text, int width) {
        String fitted = canvas.fitted(text, width);
        return fitted + " ".repeat(Math.max(0, width - canvas.width(fitted)));
    }

    static String right(Canvas canvas, String text, int width) {
        String fitted = canvas.fitted(text, width);
        return " ".repeat(Math.max(0, width - canvas.width(fitted))) + fitted;
    }
}
