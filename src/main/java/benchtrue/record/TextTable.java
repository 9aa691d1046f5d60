package benchtrue.record;

import java.util.ArrayList;
import java.util.List;

/**
 * Rows in columns as wide as their content. A table wider than the page puts the first cell of each row on a line of its own,
 * so that no name is cut.
 */
final class TextTable {
    private static final String GAP = "  ";

    private final List<String[]> rows = new ArrayList<>();
    private final String layout;

    /** @param layout for each column l (left) or r (right) */
    TextTable(String layout) {
        this.layout = layout;
    }

    TextTable row(String... cells) {
        if (cells.length != layout.length()) {
            throw new IllegalArgumentException(cells.length + " cells in a table of " + layout.length() + " columns");
        }
        rows.add(cells);
        return this;
    }

    /** @param width of the page in characters, indent included */
    List<String> lines(String indent, int width) {
        int[] widths = widths();
        int total = indent.length() - GAP.length();
        for (int w : widths) {
            total += w + GAP.length();
        }
        boolean broken = total > width;
        List<String> lines = new ArrayList<>();
        for (String[] row : rows) {
            if (broken) {
                lines.add(indent + row[0]);
            }
            String rest = join(row, widths, broken ? 1 : 0);
            lines.add((indent + (broken ? GAP + GAP : "") + rest).stripTrailing());
        }
        return lines;
    }

    private String join(String[] row, int[] widths, int from) {
        StringBuilder line = new StringBuilder();
        for (int i = from; i < row.length; i++) {
            if (i > from) {
                line.append(GAP);
            }
            String fill = " ".repeat(widths[i] - width(row[i]));
            line.append(layout.charAt(i) == 'r' ? fill + row[i] : row[i] + fill);
        }
        return line.toString();
    }

    private int[] widths() {
        int[] widths = new int[layout.length()];
        for (String[] row : rows) {
            for (int i = 0; i < row.length; i++) {
                widths[i] = Math.max(widths[i], width(row[i]));
            }
        }
        return widths;
    }

    private static int width(String cell) {
        return cell.codePointCount(0, cell.length());
    }
}
