package benchtrue.screen;

import java.util.Arrays;

/**
 * A raster finer than the cells it is drawn in: 2 × 4 dots a cell as braille, or one mark a cell in ASCII, where the mark that
 * was set last stands.
 */
final class Dots {
    private static final int BRAILLE = 0x2800;
    /** Bit of the dot in column (first index) and row of a braille cell. */
    private static final int[][] BITS = {{0x01, 0x02, 0x04, 0x40}, {0x08, 0x10, 0x20, 0x80}};

    private final int columns;
    private final int rows;
    private final boolean ascii;
    private final char[] cells;

    /** @param columns in cells, as is {@code rows} */
    Dots(int columns, int rows, boolean ascii) {
        this.columns = Math.max(0, columns);
        this.rows = Math.max(0, rows);
        this.ascii = ascii;
        cells = new char[this.columns * this.rows];
        Arrays.fill(cells, ' ');
    }

    int width() {
        return ascii ? columns : 2 * columns;
    }

    int height() {
        return ascii ? rows : 4 * rows;
    }

    /** Outside of the raster nothing happens. */
    void set(int x, int y, char mark) {
        if (x < 0 || y < 0 || x >= width() || y >= height()) {
            return;
        }
        int cell = ascii ? y * columns + x : y / 4 * columns + x / 2;
        if (ascii) {
            cells[cell] = mark;
        } else {
            int bits = cells[cell] == ' ' ? 0 : cells[cell] - BRAILLE;
            cells[cell] = (char) (BRAILLE + (bits | BITS[x % 2][y % 4]));
        }
    }

    /** Whole cells between two heights of one column, without the ends. */
    void join(int x, int from, int to, char mark) {
        for (int y = Math.min(from, to); y <= Math.max(from, to); y++) {
            set(x, y, mark);
        }
    }

    void draw(Canvas canvas, int x, int y) {
        for (int row = 0; row < rows; row++) {
            canvas.put(x, y + row, new String(cells, row * columns, columns));
        }
    }
}
