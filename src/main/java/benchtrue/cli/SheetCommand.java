package benchtrue.cli;

import benchtrue.record.SheetPage;
import benchtrue.sheet.BenchSheet;
import benchtrue.sheet.Mistake;
import benchtrue.sheet.SheetReader;
import benchtrue.sheet.SheetReading;
import benchtrue.source.Failure;
import benchtrue.source.Opened;
import benchtrue.source.RawBytes;
import benchtrue.source.ReplaySource;
import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.InvalidPathException;
import java.nio.file.LinkOption;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.util.List;
import java.util.concurrent.Callable;
import java.util.function.Predicate;
import picocli.CommandLine.Command;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;

/** Makes a first sheet by asking, one line at a time; it is written when it is whole, and never over another file. */
@Command(name = "sheet", description = "Make a first bench sheet by answering questions.")
final class SheetCommand implements Callable<Integer> {
    private static final int WIDTH = 100;

    private final Output given;
    private final InputStream typed;

    @Parameters(paramLabel = "NEW.toml", description = "The sheet to make; a file that is there already is left alone.")
    @SuppressWarnings("NullAway.Init")
    private Path file;

    @Option(names = "--ascii", description = "Nothing but ASCII characters.")
    private boolean ascii;

    SheetCommand(Output output, InputStream typed) {
        given = output;
        this.typed = typed;
    }

    @Override
    public Integer call() throws Refusal {
        refuseExisting();
        Output output = ascii ? given.inAscii() : given;
        Answers answers = new Answers(typed, output);
        SheetLines sheet = new SheetLines(output);
        output.line("One line for each answer; an empty one takes what stands in [ ], or leaves the matter out."
                + " Nothing is written before the end.");
        head(answers, sheet);
        String from = from(answers);
        if (isPort(from)) {
            ofPort(new LineQuestions(answers, output, from), answers, sheet, output);
        } else {
            ofFile(Path.of(from), answers, sheet, output);
        }
        return ExitStatus.NOTHING_FOUND.code();
    }

    private void ofFile(Path readings, Answers answers, SheetLines sheet, Output output) throws Refusal {
        questions(answers, sheet, output, Sample.of(readings), true);
        replayNext(output, write(sheet, output), readings);
    }

    private void ofPort(LineQuestions line, Answers answers, SheetLines sheet, Output output) throws Refusal {
        Sample sample = line.ask();
        List<String> names = questions(answers, sheet, output, sample, false);
        line.write(sheet, sample, names);
        watchNext(output, write(sheet, output), sample);
    }

    private void refuseExisting() throws Refusal {
        if (Files.exists(file, LinkOption.NOFOLLOW_LINKS)) {
            throw new Refusal(file + ": is there already and stays as it is; name a new file");
        }
        Path folder = file.toAbsolutePath().getParent();
        if (folder == null || !Files.isDirectory(folder)) {
            throw new Refusal(file + ": there is no such folder; make it first");
        }
    }

    private static void head(Answers answers, SheetLines sheet) throws Refusal {
        String title = answers.until(
                "What is measured (the title of the record)?",
                answer -> answer.isEmpty()
                        ? new Answers.Heard.Refused<>("a title is needed: it heads every record")
                        : new Answers.Heard.Taken<>(answer));
        sheet.add("title", title, "");
        String item = answers.ask("On which item, as pump 0417?");
        if (!item.isEmpty()) {
            sheet.add("item", item, "");
        }
    }

    /** A file that is there, or a port. */
    private static String from(Answers answers) throws Refusal {
        return answers.until(
                "Where do readings come from: a file, or a serial port as /dev/ttyUSB0 (benchtrue ports lists them)?",
                answer -> isPort(answer) || isFile(answer)
                        ? new Answers.Heard.Taken<>(answer)
                        : new Answers.Heard.Refused<>(
                                "\"" + answer + "\" is neither a file that is there nor a port; a port begins with"
                                        + " /dev/ or is called COM1"));
    }

    /** A device that is there or may be plugged in later; pseudo-terminals are anywhere. */
    private static boolean isPort(String answer) {
        return answer.matches("/dev/.+|COM\\d+")
                || (is(answer, Files::exists) && !is(answer, Files::isRegularFile) && !is(answer, Files::isDirectory));
    }

    private static boolean isFile(String answer) {
        return is(answer, Files::isRegularFile);
    }

    private static boolean is(String answer, Predicate<Path> kind) {
        try {
            return !answer.isEmpty() && kind.test(Path.of(answer));
        } catch (InvalidPathException e) {
            return false; // no file can be called so
        }
    }

    /** What each field is called. */
    private static List<String> questions(
            Answers answers, SheetLines sheet, Output output, Sample sample, boolean timed) throws Refusal {
        sample.lines().forEach(l -> output.line("  | " + (l.length() > WIDTH ? l.substring(0, WIDTH) + "…" : l)));
        ChannelQuestions channels = new ChannelQuestions(answers, sheet, output);
        channels.ask(sample, timed);
        new RelationQuestions(answers, sheet, output, channels.scope()).ask();
        return channels.names();
    }

    private BenchSheet write(SheetLines lines, Output output) throws Refusal {
        byte[] text = lines.toString().getBytes(StandardCharsets.UTF_8);
        SheetReading read = SheetReader.read(String.valueOf(file), text);
        BenchSheet sheet = read.sheet();
        if (sheet == null) {
            throw new Refusal(
                    ExitStatus.USAGE,
                    read.mistakes().stream()
                            .map(m -> m + " (nothing was written)")
                            .toList());
        }
        try {
            Files.write(file, text, StandardOpenOption.CREATE_NEW);
        } catch (IOException e) {
            throw new Refusal(file + ": cannot be written (" + Failure.words(e) + "); name another file");
        }
        output.line("");
        output.text(SheetPage.of(sheet));
        output.line("");
        output.line("Written: " + file);
        read.notices().stream().map(Mistake::toString).forEach(n -> output.line("note: " + n));
        return sheet;
    }

    private void replayNext(Output output, BenchSheet sheet, Path readings) throws Refusal {
        Opened opened = ReplaySource.open(readings, sheet);
        if (opened instanceof Opened.Ready ready) {
            close(ready);
            output.line("Next: benchtrue replay --sheet " + file + " " + readings);
            return;
        }
        output.line("The readings do not fit the sheet yet:");
        ((Opened.Refused) opened).mistakes().forEach(m -> output.line("  " + m));
        output.line("Then: benchtrue replay --sheet " + file + " " + readings);
    }

    private static void close(Opened.Ready ready) throws Refusal {
        try {
            ready.source().close();
        } catch (IOException e) {
            throw new Refusal("the readings cannot be closed (" + Failure.words(e) + ")");
        }
    }

    private void watchNext(Output output, BenchSheet sheet, Sample sample) {
        output.line("Your line would become:");
        boolean understood = new LineCheck(output, sheet)
                .understands(RawBytes.of(sample.lines().get(0) + "\n"));
        if (!understood) {
            output.line("Mend [line] in the sheet (docs/serial.md) and try: benchtrue check " + file + " --line \""
                    + sample.lines().get(0) + "\"");
        }
        output.line("Next: benchtrue watch " + file);
    }
}
