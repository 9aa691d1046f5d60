package benchtrue.screen;

import java.util.ArrayList;
import java.util.List;

/** One row of a pane: pieces of text, each in its style. */
record Line(List<Piece> pieces) {
    record Piece(String text, Style style) {}

    Line {
        pieces = List.copyOf(pieces);
    }

    static Line of(String text) {
        return of(text, Style.PLAIN);
    }

    static Line of(String text, Style style) {
        return new Line(List.of(new Piece(text, style)));
    }

    Line and(String text) {
        return and(text, Style.PLAIN);
    }

    Line and(String text, Style style) {
        List<Piece> more = new ArrayList<>(pieces);
        more.add(new Piece(text, style));
        return new Line(more);
    }

    /** A sentence over as many lines as it needs; all but the first are indented. */
    static List<Line> wrapped(String text, int width, int indent) {
        List<Line> lines = new ArrayList<>();
        for (String part : Texts.wrapped(text, width - indent)) {
            lines.add(of(lines.isEmpty() ? part : " ".repeat(indent) + part));
        }
        return lines;
    }

    void draw(Canvas canvas, int y) {
        int x = 0;
        for (Piece piece : pieces) {
            x = canvas.put(x, y, canvas.fitted(piece.text(), canvas.width() - x), piece.style());
        }
    }

    /**
     * Draws as many lines as there is room for.
     *
     * @param from first line wanted; an end of the list that would leave room empty is pulled up
     */
    static void draw(Canvas canvas, List<Line> lines, int from) {
        int first = Math.max(0, Math.min(from, lines.size() - canvas.height()));
        for (int row = 0; row < canvas.height() && first + row < lines.size(); row++) {
            lines.get(first + row).draw(canvas, row);
        }
        int below = lines.size() - first - canvas.height();
        if (below > 0 && canvas.height() > 0) {
            canvas.putLeftOf(canvas.width(), canvas.height() - 1, " " + below + " more ▼", Style.STRONG);
        }
        if (first > 0) {
            canvas.putLeftOf(canvas.width(), 0, " " + first + " more ▲", Style.STRONG);
        }
    }
}
