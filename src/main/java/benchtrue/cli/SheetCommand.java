package benchtrue.cli;

import benchtrue.source.Failure;
import java.io.BufferedReader;
import java.io.IOException;
import java.io.InputStream;
import java.io.InputStreamReader;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;

/** Makes a first sheet by asking. */
@Command(name = "sheet", description = "Make a first bench sheet by answering questions.")
final class SheetCommand implements Callable<Integer> {
    private final Output output;
    private final InputStream answers;

    @Parameters(
            paramLabel = "NEW.toml",
            description = "The sheet to write; a file that is there is never written over.")
    @SuppressWarnings("NullAway.Init")
    private Path file;

    @Option(names = "--ascii", description = "Nothing but ASCII characters.")
    private boolean ascii;

    SheetCommand(Output output, InputStream answers) {
        this.output = output;
        this.answers = answers;
    }

    @Override
    public Integer call() throws Refusal, IOException {
        Output out = ascii ? output.inAscii() : output;
        if (Files.exists(file)) {
            throw new Refusal(file + ": is there already and is not written over; give another name");
        }
        BufferedReader reader = new BufferedReader(new InputStreamReader(answers, StandardCharsets.UTF_8));
        SheetDialogue dialogue = new SheetDialogue(out, reader);
        String text = dialogue.text();
        try {
            Files.writeString(file, text, StandardOpenOption.CREATE_NEW);
        } catch (IOException e) {
            throw new Refusal(file + ": cannot be written (" + Failure.words(e) + "); give another name");
        }
        out.line("");
        out.line(file + " is written. See what it says: benchtrue check " + file);
        out.line("Then: benchtrue " + dialogue.next(file));
        out.line("docs/sheet.md says what else a sheet can have: limits, wanted U, planned points, references.");
        return ExitStatus.NOTHING_FOUND.code();
    }
}
