package benchtrue.record;

import static org.assertj.core.api.Assertions.assertThat;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

final class CsvOutTest {
    @TempDir
    private Path folder;

    @Test
    void quotesAsRfc4180AsksAndLeavesWhatIsNotKnownEmpty() throws IOException {
        Path file = folder.resolve("a.csv");
        try (CsvOut csv = new CsvOut(new GrowingFile(file, CsvOutTest::unexpected))) {
            csv.whole(-7)
                    .number(0.1)
                    .number(Double.NaN)
                    .text("say \"a, b\"")
                    .text(null)
                    .number(1 / 0.0)
                    .text("µ");
            csv.endRow();
        }
        assertThat(Files.readString(file)).isEqualTo("-7,0.1,,\"say \"\"a, b\"\"\",,,µ\n");
    }

    @Test
    void everyNumberReadsBackToTheSameBits() throws IOException {
        Path file = folder.resolve("b.csv");
        SplittableRandom random = new SplittableRandom(11);
        List<Double> written =
                new ArrayList<>(List.of(-0.0, Double.MIN_VALUE, Double.MAX_VALUE, 1e7, 2e-3, 9007199254740992.0));
        while (written.size() < 20_000) {
            double value = Double.longBitsToDouble(random.nextLong());
            if (Double.isFinite(value)) {
                written.add(value);
            }
        }
        try (CsvOut csv = new CsvOut(new GrowingFile(file, CsvOutTest::unexpected))) {
            written.forEach(value -> csv.number(value).endRow());
        }
        assertThat(Files.readAllLines(file).stream().map(Double::valueOf)).containsExactlyElementsOf(written);
    }

    @Test
    void aFolderThatIsNotThereIsToldOnceAndTheRunGoesOn() {
        List<String> told = new ArrayList<>();
        try (CsvOut csv = new CsvOut(new GrowingFile(folder.resolve("gone/a.csv"), told::add))) {
            for (int i = 0; i < 100_000; i++) {
                csv.number(i).endRow();
            }
        }
        assertThat(told)
                .singleElement()
                .asString()
                .contains("a.csv: cannot be written")
                .contains("The run goes on");
    }

    @Test
    void aFullDiskIsToldOnceAndTheRunGoesOn() {
        Path full = Path.of("/dev/full");
        assumeTrue(Files.exists(full));
        List<String> told = new ArrayList<>();
        try (CsvOut csv = new CsvOut(new GrowingFile(full, told::add))) {
            for (int i = 0; i < 100_000; i++) {
                csv.number(i).endRow();
            }
        }
        assertThat(told).singleElement().asString().contains("No space left on device");
    }

    private static void unexpected(String trouble) {
        throw new AssertionError(trouble);
    }
}
