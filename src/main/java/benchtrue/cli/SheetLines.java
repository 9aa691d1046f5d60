package benchtrue.cli;

import benchtrue.record.Figures;
import java.util.ArrayList;
import java.util.List;

/** The text of a sheet as it grows; each line is shown when it is added. */
final class SheetLines {
    private static final String SHOWN = "  -> ";

    private final List<String> lines = new ArrayList<>();
    private final Output output;

    SheetLines(Output output) {
        this.output = output;
    }

    /** @param understood what the line means, beside it; may be empty */
    void add(String line, String understood) {
        lines.add(line);
        output.line(SHOWN + line + (understood.isEmpty() ? "" : "    (" + understood + ")"));
    }

    void add(String key, String text, String understood) {
        add(key + " = " + quoted(text), understood);
    }

    /** The head of a table, not shown. */
    void table(String head) {
        lines.add("");
        lines.add(head);
    }

    @Override
    public String toString() {
        return String.join("\n", lines) + "\n";
    }

    /** The entries of one line that have a value. */
    static final class Entries {
        private final List<String> entries = new ArrayList<>();

        Entries text(String key, String value) {
            if (!value.isEmpty()) {
                entries.add(key + " = " + quoted(value));
            }
            return this;
        }

        Entries number(String key, double value) {
            if (!Double.isNaN(value)) {
                entries.add(key + " = " + Figures.exact(value));
            }
            return this;
        }

        Entries interval(String key, double... two) {
            if (two.length == 2) {
                entries.add(key + " = [" + Figures.exact(two[0]) + ", " + Figures.exact(two[1]) + "]");
            }
            return this;
        }

        boolean isEmpty() {
            return entries.isEmpty();
        }

        @Override
        public String toString() {
            return entries.isEmpty() ? "{}" : "{ " + String.join(", ", entries) + " }";
        }
    }

    /** A TOML key: names outside ASCII are quoted. */
    static String key(String name) {
        return name.matches("[A-Za-z0-9_-]+") ? name : quoted(name);
    }

    /** A basic string of TOML. */
    static String quoted(String text) {
        StringBuilder quoted = new StringBuilder("\"");
        text.codePoints().forEach(c -> {
            if (c == '"' || c == '\\') {
                quoted.append('\\').appendCodePoint(c);
            } else if (c < ' ' || c == 127) {
                quoted.append(String.format("\\u%04X", c));
            } else {
                quoted.appendCodePoint(c);
            }
        });
        return quoted.append('"').toString();
    }
}
