package benchtrue.record;

import java.util.List;

/** A page of plain text, {@value #WIDTH} characters wide: headings, wrapped paragraphs, tables. */
final class TextPage {
    static final int WIDTH = 80;
    private static final String INDENT = "  ";

    private final StringBuilder text = new StringBuilder();

    void title(String title) {
        wrapped("", "", title);
        text.append("=".repeat(WIDTH)).append('\n');
    }

    void heading(String heading) {
        text.append('\n');
        wrapped("", INDENT, heading);
        text.append("-".repeat(Math.min(WIDTH, heading.length()))).append('\n');
    }

    void paragraph(String words) {
        wrapped(INDENT, INDENT, words);
    }

    /** A list item; its later lines stand under the first word. */
    void item(String words) {
        wrapped(INDENT + "- ", INDENT + "  ", words);
    }

    void table(TextTable table) {
        for (String line : table.lines(INDENT, WIDTH)) {
            text.append(line).append('\n');
        }
    }

    void items(List<String> items) {
        items.forEach(this::item);
    }

    void space() {
        text.append('\n');
    }

    private void wrapped(String first, String later, String words) {
        StringBuilder line = new StringBuilder(first);
        boolean empty = true;
        for (String word : clean(words).split(" ", -1)) {
            if (!empty && line.length() + 1 + word.length() > WIDTH) {
                text.append(line.toString().stripTrailing()).append('\n');
                line.setLength(0);
                line.append(later);
                empty = true;
            }
            line.append(empty ? "" : " ").append(word);
            empty = false;
        }
        text.append(line.toString().stripTrailing()).append('\n');
    }

    /** Text from outside must not move the paper or the cursor. */
    private static String clean(String words) {
        return words.replaceAll("\\p{Cntrl}", " ").strip();
    }

    @Override
    public String toString() {
        return text.toString();
    }
}
