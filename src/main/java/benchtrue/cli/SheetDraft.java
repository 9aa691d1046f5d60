package benchtrue.cli;

import java.util.ArrayList;
import java.util.List;

/** A bench sheet while its questions are being answered. */
final class SheetDraft {
    private final String title;
    private final String item;
    private final List<String> channels = new ArrayList<>();
    private final List<String> fields = new ArrayList<>();
    private String equation = "";
    private String memory = "all";
    private String line = "";

    SheetDraft(String title, String item) {
        this.title = title;
        this.item = item;
    }

    /** @param unit empty: a plain number; {@code noise} empty: not known */
    void channel(String name, String unit, String noise) {
        StringBuilder entry = new StringBuilder();
        if (!unit.isEmpty()) {
            entry.append("unit = ").append(quoted(unit));
        }
        if (!noise.isEmpty()) {
            entry.append(entry.isEmpty() ? "" : ", ").append("noise = ").append(noise);
        }
        channels.add(name + " = { " + entry + " }");
        fields.add(name);
    }

    void dropLastChannel() {
        channels.remove(channels.size() - 1);
        fields.remove(fields.size() - 1);
    }

    /** A field of the line that is no channel. */
    void ignoredField() {
        fields.add("-");
    }

    boolean hasChannels() {
        return !channels.isEmpty();
    }

    void equation(String text, String memoryText) {
        equation = text;
        memory = memoryText;
    }

    /** @param separator of the fields of a line */
    void line(String port, String baud, String separator, boolean decimalComma) {
        line = "\n[line]\nport = " + quoted(port) + "\nbaud = " + baud + "\nseparator = " + quoted(separator) + "\n"
                + (decimalComma ? "decimal_comma = true\n" : "");
    }

    String text() {
        StringBuilder text = new StringBuilder();
        text.append("title = ").append(quoted(title)).append('\n');
        text.append("item = ").append(quoted(item)).append("\n\n[channels]\n");
        channels.forEach(c -> text.append(c).append('\n'));
        text.append("\n[[relations]]\nequation = ").append(quoted(equation));
        text.append("\nmemory = ").append(quoted(memory)).append('\n').append(line);
        if (!line.isEmpty() && fields.contains("-")) {
            text.append("fields = [");
            text.append(
                    String.join(", ", fields.stream().map(SheetDraft::quoted).toList()));
            text.append("]\n");
        }
        return text.toString();
    }

    private static String quoted(String text) {
        return '"' + text.replace("\\", "\\\\").replace("\"", "\\\"") + '"';
    }
}
