package benchtrue.cli;

import benchtrue.screen.Ascii;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.util.function.Consumer;
import org.jspecify.annotations.Nullable;

/**
 * Standard output and standard error. Once whoever reads the output has gone ({@code | head}), nothing more is written and
 * nothing is said about it. Control characters of texts from outside never reach a terminal.
 */
final class Output {
    private final PrintStream out;
    private final PrintStream err;
    private final boolean ascii;
    private final @Nullable Consumer<String> errors;

    /** @param ascii whether everything outside ASCII is transcribed */
    Output(PrintStream out, PrintStream err, boolean ascii) {
        this(out, err, ascii, null);
    }

    private Output(PrintStream out, PrintStream err, boolean ascii, @Nullable Consumer<String> errors) {
        this.out = out;
        this.err = err;
        this.ascii = ascii;
        this.errors = errors;
    }

    Output inAscii() {
        return new Output(out, err, true, errors);
    }

    /** The same, but errors go elsewhere. */
    Output withErrors(Consumer<String> elsewhere) {
        return new Output(out, err, ascii, elsewhere);
    }

    boolean ascii() {
        return ascii;
    }

    void line(String line) {
        write(out, clean(line) + "\n");
    }

    /** A text of several lines, each ended. */
    void text(String lines) {
        lines.lines().forEach(this::line);
    }

    /** JSON as it is; outside ASCII it is escaped, never transcribed. */
    void json(String json) {
        write(out, ascii ? escaped(json) : json);
    }

    /** A question, with the cursor left behind it. */
    void ask(String question) {
        write(out, clean(question) + " ");
    }

    void error(String line) {
        if (errors != null) {
            errors.accept(line);
            return;
        }
        write(err, clean(line) + "\n");
    }

    /** Whether whoever read the output has gone. */
    boolean closed() {
        return out.checkError();
    }

    private static void write(PrintStream to, String text) {
        byte[] bytes = text.getBytes(StandardCharsets.UTF_8);
        to.write(bytes, 0, bytes.length);
        to.flush();
    }

    private String clean(String text) {
        String safe = text.replaceAll("[\\p{Cntrl}\\x{80}-\\x{9f}]", "\uFFFD");
        return ascii ? Ascii.of(safe) : safe;
    }

    private static String escaped(String json) {
        StringBuilder plain = new StringBuilder();
        json.chars().forEach(c -> plain.append(c < 128 ? Character.toString(c) : String.format("\\u%04x", c)));
        return plain.toString();
    }
}
