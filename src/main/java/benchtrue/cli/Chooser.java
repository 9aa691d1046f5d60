package benchtrue.cli;

import benchtrue.source.Ports;
import java.io.BufferedReader;
import java.io.IOException;
import java.io.InputStream;
import java.io.InputStreamReader;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.function.Predicate;
import java.util.stream.Stream;

/** Offers what lies at hand to somebody at a terminal who named nothing. */
final class Chooser {
    private static final List<Path> HOMES = List.of(Path.of("replays"), Path.of("runs"));

    private final Output output;
    private final BufferedReader answers;

    Chooser(Output output, InputStream answers) {
        this.output = output;
        this.answers = new BufferedReader(new InputStreamReader(answers, StandardCharsets.UTF_8));
    }

    /** A run folder below replays/ or runs/. */
    Path run() throws Refusal, IOException {
        List<Path> runs = below(f -> Files.exists(f.resolve(LiveFolder.READINGS)));
        if (runs.isEmpty()) {
            throw new Refusal("There is no run in replays/ or runs/; name a RUN folder: benchtrue replay RUN");
        }
        return chosen("Runs", runs);
    }

    /** A sheet that has a line: of the runs, or a file of this folder. */
    Path sheet() throws Refusal, IOException {
        List<Path> sheets = new ArrayList<>();
        try (Stream<Path> here = Files.list(Path.of(""))) {
            here.filter(f -> f.toString().endsWith(".toml")).sorted().forEach(sheets::add);
        }
        below(f -> Files.exists(f.resolve(LiveFolder.SHEET))).forEach(f -> sheets.add(f.resolve(LiveFolder.SHEET)));
        List<Path> live = sheets.stream().filter(Chooser::hasLine).toList();
        if (live.isEmpty()) {
            throw new Refusal("There is no sheet with a [line] here; make one: benchtrue sheet NEW.toml");
        }
        return chosen("Sheets with a [line]", live);
    }

    /** A serial port of this machine. */
    String port() throws Refusal, IOException {
        List<Ports.Port> ports = Ports.list();
        if (ports.isEmpty()) {
            throw new Refusal("No serial port was found; plug it in, or name one: --port PORT");
        }
        return ports.get(ask(
                        "Ports",
                        ports.stream()
                                .map(p -> p.path() + "  " + p.description())
                                .toList()))
                .path();
    }

    private static boolean hasLine(Path sheet) {
        try {
            return Files.readString(sheet).contains("[line]");
        } catch (IOException e) {
            return false; // what cannot be read is nothing to offer
        }
    }

    private static List<Path> below(Predicate<Path> wanted) throws IOException {
        List<Path> found = new ArrayList<>();
        for (Path home : HOMES) {
            if (Files.isDirectory(home)) {
                try (Stream<Path> folders = Files.list(home)) {
                    folders.filter(wanted).sorted().forEach(found::add);
                }
            }
        }
        return found;
    }

    private Path chosen(String heading, List<Path> paths) throws Refusal, IOException {
        return paths.get(ask(heading, paths.stream().map(Path::toString).toList()));
    }

    /** The place in the list. */
    private int ask(String heading, List<String> labels) throws Refusal, IOException {
        output.line(heading + ":");
        for (int i = 0; i < labels.size(); i++) {
            output.line(String.format("%4d  %s", i + 1, labels.get(i)));
        }
        while (true) {
            output.ask("Which (1 to " + labels.size() + ")?");
            String answer = answers.readLine();
            if (answer == null || answer.isBlank()) {
                throw new Refusal("Nothing was chosen.");
            }
            if (answer.strip().matches("\\d{1,6}")) {
                int number = Integer.parseInt(answer.strip());
                if (number >= 1 && number <= labels.size()) {
                    return number - 1;
                }
            }
        }
    }
}
