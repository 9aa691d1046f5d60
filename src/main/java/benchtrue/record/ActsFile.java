package benchtrue.record;

import benchtrue.model.Memory;
import benchtrue.run.Act;
import benchtrue.run.MemoryWords;
import benchtrue.run.TimedAct;
import benchtrue.sheet.MemoryText;
import benchtrue.sheet.Mistake;
import java.io.Closeable;
import java.io.IOException;
import java.io.Reader;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.function.Consumer;
import org.apache.commons.csv.CSVFormat;
import org.apache.commons.csv.CSVParser;
import org.apache.commons.csv.CSVRecord;
import org.jspecify.annotations.Nullable;

/** acts.csv: what the operator did, each act in the file at once; a replay of the folder applies them again. */
public final class ActsFile implements Closeable {
    public static final String NAME = "acts.csv";

    private static final List<String> COLUMNS = List.of("reading", "time", "act", "argument", "text");
    private static final String SKIPPED = " skipped";

    private final CsvOut csv;

    /** Begins the file, or goes on with the one that is there. */
    ActsFile(Path folder, Consumer<String> trouble) {
        Path file = folder.resolve(NAME);
        boolean there = Files.exists(file);
        csv = new CsvOut(GrowingFile.goingOn(file, trouble));
        if (!there) {
            COLUMNS.forEach(csv::text);
            csv.endRow();
            csv.flush();
        }
    }

    public void act(TimedAct timed) {
        csv.whole(timed.reading()).number(timed.time());
        for (String cell : cells(timed.act())) {
            csv.text(cell);
        }
        csv.endRow();
        csv.flush();
    }

    private static List<String> cells(Act act) {
        if (act instanceof Act.Acknowledge acknowledge) {
            return List.of("acknowledge", String.valueOf(acknowledge.alarm()), acknowledge.comment());
        } else if (act instanceof Act.Shelve shelve) {
            return List.of("shelve", shelve.alarm() + " " + shelve.seconds() + " s", shelve.reason());
        } else if (act instanceof Act.Mark mark) {
            return List.of("mark", "", mark.note());
        } else if (act instanceof Act.ChangeMemory change) {
            return List.of("memory", MemoryWords.of(change.memory()), "");
        } else if (act instanceof Act.Hold) {
            return List.of("hold", "", "");
        } else if (act instanceof Act.Release) {
            return List.of("release", "", "");
        } else if (act instanceof Act.Adopt adopt) {
            return List.of("adopt", adopt.name(), adopt.reason());
        } else if (act instanceof Act.NewSegment segment) {
            return List.of("segment", "", segment.reason());
        }
        Act.SetUp setUp = (Act.SetUp) act;
        return List.of("set-up", setUp.step() + (setUp.skipped() ? SKIPPED : ""), setUp.text());
    }

    @Override
    public void close() {
        csv.close();
    }

    /** What a folder's acts.csv says; a row that cannot be read is a mistake and left out. Without the file there are none. */
    public static List<TimedAct> read(Path folder, List<Mistake> mistakes) {
        Path file = folder.resolve(NAME);
        List<TimedAct> acts = new ArrayList<>();
        if (!Files.exists(file)) {
            return acts;
        }
        CSVFormat format = CSVFormat.RFC4180
                .builder()
                .setHeader()
                .setSkipHeaderRecord(true)
                .get();
        try (Reader reader = Files.newBufferedReader(file, StandardCharsets.UTF_8);
                CSVParser parser = format.parse(reader)) {
            if (!parser.getHeaderNames().equals(COLUMNS)) {
                mistakes.add(new Mistake(
                        file.toString(),
                        1,
                        1,
                        "is no list of acts",
                        "its header must be " + String.join(",", COLUMNS)));
                return acts;
            }
            for (CSVRecord row : parser) {
                TimedAct act = act(row);
                if (act == null) {
                    int line = (int) parser.getCurrentLineNumber();
                    mistakes.add(new Mistake(file.toString(), line, 1, "this act cannot be read and is left out", ""));
                } else {
                    acts.add(act);
                }
            }
        } catch (IOException | RuntimeException e) {
            mistakes.add(new Mistake(
                    file.toString(), 0, 0, "the rest of the acts cannot be read", "mend or remove the file"));
        }
        return acts;
    }

    private static @Nullable TimedAct act(CSVRecord row) {
        if (!row.isConsistent()) {
            return null;
        }
        try {
            Act act = act(row.get("act"), row.get("argument"), row.get("text"));
            return act == null
                    ? null
                    : new TimedAct(Long.parseLong(row.get("reading")), Double.parseDouble(row.get("time")), act);
        } catch (NumberFormatException e) {
            return null;
        }
    }

    private static @Nullable Act act(String word, String argument, String text) {
        return switch (word) {
            case "acknowledge" -> new Act.Acknowledge(Integer.parseInt(argument), text);
            case "shelve" -> shelve(argument, text);
            case "mark" -> new Act.Mark(text);
            case "memory" -> memory(argument);
            case "hold" -> new Act.Hold();
            case "release" -> new Act.Release();
            case "adopt" -> new Act.Adopt(argument, text);
            case "segment" -> new Act.NewSegment(text);
            case "set-up" ->
                argument.endsWith(SKIPPED)
                        ? new Act.SetUp(argument.substring(0, argument.length() - SKIPPED.length()), true, text)
                        : new Act.SetUp(argument, false, text);
            default -> null;
        };
    }

    private static @Nullable Act memory(String argument) {
        Memory memory = MemoryText.parse(argument);
        return memory == null ? null : new Act.ChangeMemory(memory);
    }

    private static @Nullable Act shelve(String argument, String text) {
        String[] parts = argument.split(" ", -1);
        return parts.length == 3
                ? new Act.Shelve(Integer.parseInt(parts[0]), Double.parseDouble(parts[1]), text)
                : null;
    }
}
