package benchtrue.cli;

import benchtrue.record.SheetPage;
import benchtrue.sheet.BenchSheet;
import benchtrue.sheet.Dialect;
import benchtrue.sheet.LineSpec;
import benchtrue.sheet.Mistake;
import benchtrue.sheet.SheetReader;
import benchtrue.sheet.SheetReading;
import benchtrue.source.LineTrial;
import benchtrue.source.Overheard;
import benchtrue.source.RawBytes;
import java.io.BufferedReader;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import org.jspecify.annotations.Nullable;

/** The questions of a first sheet; what was answered is read as a sheet at once, and asked again where it is none. */
final class SheetDialogue {
    private static final Pattern HEADED = Pattern.compile("\\s*\"?([^\\[\"]*?)\\s*(?:\\[([^\\]]*)\\])?\"?\\s*");
    private static final double LISTEN_SECONDS = 3;
    private static final int SHOWN = 3;
    private static final String SKIP = "-";

    private final Output out;
    private final BufferedReader answers;
    private @Nullable Path readings;
    private List<String> heard = List.of();

    SheetDialogue(Output out, BufferedReader answers) {
        this.out = out;
        this.answers = answers;
    }

    /** All questions; the text of the sheet. */
    String text() throws Refusal, IOException {
        out.line("Enter keeps what stands in brackets; the end of the input leaves without writing anything.");
        SheetDraft draft = new SheetDraft(ask("What is measured", "Bench run"), ask("Item under test", ""));
        String from = ask("Readings come from: a file readings.csv, or a port (path of either)", "");
        Path file = Path.of(from);
        if (Files.isRegularFile(file)) {
            readings = file;
            fromFile(draft, file);
        } else {
            fromPort(draft, from);
        }
        equation(draft);
        return draft.text();
    }

    /** The command that uses the sheet. */
    String next(Path sheet) {
        return readings == null ? "watch " + sheet : "replay --sheet " + sheet + " " + readings;
    }

    private void fromFile(SheetDraft draft, Path file) throws Refusal, IOException {
        List<String> lines;
        try (Stream<String> all = Files.lines(file)) {
            lines = all.limit(SHOWN + 1L).toList();
        } catch (UncheckedIOException e) {
            throw new Refusal(file + ": is no text in UTF-8; save it as one");
        }
        lines.forEach(l -> out.line("  " + l));
        String[] heads = lines.isEmpty() ? new String[0] : lines.get(0).split(",", -1);
        if (heads.length < 2 || !heads[0].replace("\"", "").strip().startsWith("time")) {
            throw new Refusal(file + ": does not begin with a header row: time, then the channels, between commas");
        }
        for (String head : Arrays.asList(heads).subList(1, heads.length)) {
            Matcher parts = HEADED.matcher(head);
            String name = parts.matches() ? parts.group(1) : head;
            String unit = parts.matches() && parts.group(2) != null ? parts.group(2) : "";
            out.line("Column " + name + ":");
            channel(draft, name, unit, true);
        }
        needChannels(draft);
    }

    private void fromPort(SheetDraft draft, String port) throws Refusal, IOException {
        String baud = ask("Baud of " + port, "9600");
        String separator = ask("What stands between the fields of a line", ",");
        boolean comma =
                !separator.equals(",") && ask("Decimal mark, . or ,", ".").equals(",");
        draft.line(port, baud, separator, comma);
        int rate = baud.matches("\\d{2,7}") ? Integer.parseInt(baud) : 9600;
        LineSpec spec = new LineSpec(port, rate, "8N1", separator, comma, Map.of(), Dialect.PLAIN);
        out.line("Listening to " + port + " for " + (int) LISTEN_SECONDS + " s …");
        try {
            heard = Overheard.on(port, spec, LISTEN_SECONDS);
        } catch (IOException e) {
            out.line(port + ": " + e.getMessage() + ". Go on without seeing its lines; docs/serial.md helps.");
        }
        heard.forEach(l -> out.line("  " + l));
        int fields = heard.isEmpty()
                ? number(ask("How many fields has a line", "2"))
                : heard.get(0).split(Pattern.quote(separator), -1).length;
        for (int i = 1; i <= fields; i++) {
            out.line("Field " + i + ":");
            channel(draft, "x" + i, "", false);
        }
        needChannels(draft);
    }

    private static int number(String text) {
        return text.matches("\\d{1,3}") ? Integer.parseInt(text) : 1;
    }

    private static void needChannels(SheetDraft draft) throws Refusal {
        if (!draft.hasChannels()) {
            throw new Refusal("No channel was named, so there is nothing to measure; nothing was written.");
        }
    }

    /** @param fixed whether the name is that of a column, and can only be kept or skipped */
    private void channel(SheetDraft draft, String name, String unit, boolean fixed) throws Refusal, IOException {
        while (true) {
            String kept = ask(fixed ? "  name, or - to leave it out" : "  name of the channel, or - for none", name);
            if (kept.equals(SKIP)) {
                draft.ignoredField();
                return;
            }
            draft.channel(kept, ask("  unit", unit), ask("  noise (1 sd), if known", ""));
            List<Mistake> mistakes = mistakes(draft);
            if (mistakes.isEmpty()) {
                return;
            }
            mistakes.forEach(m -> out.line("  " + m.message() + "; " + m.remedy()));
            draft.dropLastChannel();
        }
    }

    private void equation(SheetDraft draft) throws Refusal, IOException {
        while (true) {
            String equation = ask("Equation: a channel = a sum of unknowns times channels, as V = R*I + V0", "");
            String memory = ask("Memory: all, or \"120 s\", or \"600 readings\"", "all");
            draft.equation(equation, memory);
            SheetReading reading = read(draft.text());
            if (reading.sheet() != null) {
                out.text(SheetPage.of(reading.sheet()));
                understood(reading.sheet());
                return;
            }
            reading.mistakes().forEach(m -> out.line("  " + m.message() + "; " + m.remedy()));
        }
    }

    /** What the lines that were heard become. */
    private void understood(BenchSheet sheet) {
        ByteArrayOutputStream bytes = new ByteArrayOutputStream();
        heard.forEach(l -> bytes.writeBytes(RawBytes.of(l + "\n")));
        new LineTrial(sheet).of(bytes.toByteArray()).forEach(t -> out.line("  " + t.text() + "  -> " + t.becomes()));
    }

    /** Of the channels alone: there is no equation yet. */
    private static List<Mistake> mistakes(SheetDraft draft) {
        List<Mistake> found = new ArrayList<>();
        for (Mistake mistake : read(draft.text()).mistakes()) {
            if (mistake.line() <= lineOfEquation(draft.text())) {
                found.add(mistake);
            }
        }
        return found;
    }

    private static long lineOfEquation(String text) {
        return text.substring(0, text.indexOf("[[relations]]")).lines().count();
    }

    private static SheetReading read(String text) {
        return SheetReader.read("the sheet", text.getBytes(StandardCharsets.UTF_8));
    }

    /** @throws Refusal at the end of the input */
    private String ask(String question, String kept) throws Refusal, IOException {
        out.ask(question + (kept.isEmpty() ? ":" : " [" + kept + "]:"));
        String answer = answers.readLine();
        if (answer == null) {
            out.line("");
            throw new Refusal("The answers ended before the sheet was whole; nothing was written.");
        }
        return answer.isBlank() ? kept : answer.strip();
    }
}
