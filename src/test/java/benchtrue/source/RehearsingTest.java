package benchtrue.source;

import static org.assertj.core.api.Assertions.assertThat;

import benchtrue.reading.Reading;
import benchtrue.sheet.BenchSheet;
import benchtrue.sheet.Rehearsal;
import benchtrue.sheet.SheetReader;
import benchtrue.sheet.SheetReading;
import benchtrue.source.Source.Outcome;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Objects;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

class RehearsingTest {
    private static final Path REPLAYS = Path.of("replays");

    @TempDir
    Path folder;

    static List<Path> replays() throws IOException {
        try (Stream<Path> folders = Files.list(REPLAYS)) {
            return folders.filter(Files::isDirectory).sorted().toList();
        }
    }

    static List<Path> sheets() throws IOException {
        return replays().stream().map(replay -> replay.resolve("sheet.toml")).toList();
    }

    private static BenchSheet sheet(Path file) {
        SheetReading reading = SheetReader.read(file);
        assertThat(reading.mistakes()).isEmpty();
        return Objects.requireNonNull(reading.sheet());
    }

    private static Rehearsal rehearsal(BenchSheet sheet) {
        return Objects.requireNonNull(sheet.rehearsal());
    }

    private Rehearsed write(Path sheetFile, long seed, Path out) {
        BenchSheet sheet = sheet(sheetFile);
        return Rehearsing.write(sheetFile, sheet, rehearsal(sheet), out, seed);
    }

    @ParameterizedTest
    @MethodSource("replays")
    void aReplayIsRebuiltToTheByteFromItsOwnSheet(Path replay) throws IOException {
        Path sheetFile = replay.resolve("sheet.toml");
        Path rebuilt = folder.resolve("rebuilt");
        assertThat(write(sheetFile, rehearsal(sheet(sheetFile)).seed(), rebuilt))
                .isInstanceOf(Rehearsed.Written.class);
        try (Stream<Path> files = Files.list(replay)) {
            for (Path file : files.toList()) {
                assertThat(rebuilt.resolve(file.getFileName())).hasSameBinaryContentAs(file);
            }
        }
        assertThat(Files.exists(rebuilt.resolve("raw.log"))).isEqualTo(Files.exists(replay.resolve("raw.log")));
    }

    /** The simulated rig and the file that it wrote give the same readings to the last bit, restarts and all. */
    @ParameterizedTest
    @MethodSource("sheets")
    void theRigGivesWhatItsFileGives(Path sheetFile) throws IOException {
        BenchSheet sheet = sheet(sheetFile);
        assertThat(write(sheetFile, 99, folder)).isInstanceOf(Rehearsed.Written.class);
        int channels = sheet.channels().size();
        Reading fromRig = new Reading(channels);
        Reading fromFile = new Reading(channels);
        long count = 0;
        try (Source rig = SimulatedRig.source(sheet, rehearsal(sheet), 99);
                Source file = ((Opened.Ready) ReplaySource.open(folder.resolve("readings.csv"), sheet)).source()) {
            Outcome outcome;
            do {
                outcome = rig.next(fromRig);
                while (outcome == Outcome.MALFORMED) {
                    outcome = rig.next(fromRig);
                }
                assertThat(file.next(fromFile)).isEqualTo(outcome);
                count += outcome == Outcome.READING ? 1 : 0;
                assertThat(fromFile.number).isEqualTo(fromRig.number);
                assertThat(fromFile.time).isEqualTo(fromRig.time);
                assertThat(fromFile.values).isEqualTo(fromRig.values);
            } while (outcome != Outcome.END);
            assertThat(file.startedUtc()).isEqualTo(rig.startedUtc());
        }
        assertThat(count).isGreaterThan(100);
    }

    @Test
    void anotherSeedGivesOtherReadingsAndTheSameSeedTheSame() throws IOException {
        Path sheet = REPLAYS.resolve("gear-pump/sheet.toml");
        write(sheet, 1, folder.resolve("a"));
        write(sheet, 1, folder.resolve("b"));
        write(sheet, 2, folder.resolve("c"));
        Path a = folder.resolve("a/readings.csv");
        assertThat(folder.resolve("b/readings.csv")).hasSameBinaryContentAs(a);
        assertThat(Files.mismatch(folder.resolve("c/readings.csv"), a)).isNotNegative();
    }

    @Test
    void nothingThatIsThereIsReplaced() throws IOException {
        Path sheet = REPLAYS.resolve("gear-pump/sheet.toml");
        assertThat(write(sheet, 1, folder)).isInstanceOf(Rehearsed.Written.class);
        assertThat(write(sheet, 1, folder)).isEqualTo(new Rehearsed.Written(3000));
        String before = Files.readString(folder.resolve("readings.csv"));
        assertThat(write(sheet, 2, folder).toString())
                .contains("the folder holds other readings", "name another folder");
        assertThat(Files.readString(folder.resolve("readings.csv"))).isEqualTo(before);
        Files.writeString(folder.resolve("sheet.toml"), "title = \"mine\"\n");
        assertThat(write(sheet, 1, folder).toString()).contains("the folder holds another sheet");
        Path foreign = Files.createDirectory(folder.resolve("foreign"));
        Files.writeString(foreign.resolve("notes.txt"), "keep me");
        assertThat(write(sheet, 1, foreign).toString()).contains("is not empty");
        try (Stream<Path> left = Files.list(foreign)) {
            assertThat(left).hasSize(1);
        }
    }
}
