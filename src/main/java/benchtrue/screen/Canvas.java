package benchtrue.screen;

import com.googlecode.lanterna.TerminalPosition;
import com.googlecode.lanterna.TerminalSize;
import com.googlecode.lanterna.TerminalTextUtils;
import com.googlecode.lanterna.graphics.TextGraphics;

/**
 * A rectangle of cells to draw on. What does not fit is cut; what a terminal could obey, or could not show in one cell of its
 * own, is replaced before it gets there.
 */
final class Canvas {
    private static final char REPLACED = '\uFFFD';
    private static final char FIRST_WIDE = '\u1100';
    private static final char FIRST_LINE = '\u2500';
    private static final char LAST_BRAILLE = '\u28FF';

    private final TextGraphics graphics;
    private final boolean ascii;
    private final Cells cells;

    Canvas(TextGraphics graphics, boolean ascii, Cells cells) {
        this.graphics = graphics;
        this.ascii = ascii;
        this.cells = cells;
    }

    int width() {
        return graphics.getSize().getColumns();
    }

    int height() {
        return graphics.getSize().getRows();
    }

    boolean ascii() {
        return ascii;
    }

    /** The part of it that begins at a cell; its size may be 0, never less. */
    Canvas part(int x, int y, int width, int height) {
        int columns = Math.max(0, Math.min(width, width() - x));
        int rows = Math.max(0, Math.min(height, height() - y));
        return new Canvas(
                graphics.newTextGraphics(new TerminalPosition(x, y), new TerminalSize(columns, rows)), ascii, cells);
    }

    void blank() {
        graphics.fill(' ');
    }

    /** Writes a text; returns the column after it. */
    int put(int x, int y, String text) {
        return put(x, y, text, Style.PLAIN);
    }

    int put(int x, int y, String text, Style style) {
        int column = x;
        String shown = shown(text, ascii);
        int right = width();
        if (y < 0 || y >= height()) {
            return column;
        }
        for (int i = 0; i < shown.length(); i++) {
            char c = shown.charAt(i);
            int taken = cells(c);
            if (column + taken > right) {
                break;
            }
            graphics.setCharacter(column, y, cells.of(c, style));
            column += taken;
        }
        return column;
    }

    /** Writes a text so that it ends before a column. */
    void putLeftOf(int end, int y, String text, Style style) {
        put(Math.max(0, end - width(text)), y, text, style);
    }

    /** A whole row of one style, with a text in it. */
    void bar(int y, String text, Style style) {
        put(0, y, text + " ".repeat(Math.max(0, width() - width(text))), style);
    }

    /** How many cells a text takes here. */
    int width(String text) {
        String shown = shown(text, ascii);
        int width = 0;
        for (int i = 0; i < shown.length(); i++) {
            width += cells(shown.charAt(i));
        }
        return width;
    }

    private static int cells(char c) {
        boolean narrow =
                c < FIRST_WIDE || (c >= FIRST_LINE && c <= LAST_BRAILLE); // what nearly all of a frame is made of
        return !narrow && TerminalTextUtils.isCharDoubleWidth(c) ? 2 : 1;
    }

    /** Shortened to a width, the last cell then saying so. */
    String fitted(String text, int width) {
        if (width(text) <= width) {
            return text;
        }
        String more = ascii ? "~" : "…";
        StringBuilder kept = new StringBuilder(shown(text, ascii));
        while (kept.length() > 0 && width(kept.toString()) > width - 1) {
            kept.setLength(kept.length() - 1);
        }
        return width < 1 ? "" : kept + more;
    }

    private static boolean isSimple(String text, boolean ascii) {
        for (int i = 0; i < text.length(); i++) {
            char c = text.charAt(i);
            boolean ours = !ascii && c >= FIRST_LINE && c <= LAST_BRAILLE;
            if (c < ' ' || (c >= 127 && !ours)) {
                return false;
            }
        }
        return true;
    }

    /** Each character a cell or two of its own: no controls, nothing that combines, nothing beyond what terminals agree on. */
    private static String shown(String text, boolean ascii) {
        if (isSimple(text, ascii)) {
            return text;
        }
        StringBuilder shown = new StringBuilder();
        text.codePoints().forEach(c -> {
            int type = Character.getType(c);
            boolean bad = Character.isISOControl(c)
                    || !Character.isBmpCodePoint(c)
                    || type == Character.NON_SPACING_MARK
                    || type == Character.ENCLOSING_MARK
                    || type == Character.COMBINING_SPACING_MARK
                    || type == Character.FORMAT
                    || type == Character.SURROGATE
                    || type == Character.UNASSIGNED
                    || type == Character.PRIVATE_USE
                    || type == Character.LINE_SEPARATOR
                    || type == Character.PARAGRAPH_SEPARATOR;
            shown.append(bad ? REPLACED : (char) c);
        });
        return ascii ? Ascii.of(shown.toString()) : shown.toString();
    }
}
