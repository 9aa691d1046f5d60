package benchtrue.screen;

import static org.assertj.core.api.Assertions.assertThat;

import benchtrue.run.Shots;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/**
 * The pictures of the run screen in the manual show what the screen shows. {@code mvn test -Dtest=PicturesTest
 * -Dpictures=write} makes them anew.
 */
final class PicturesTest {
    private static final String SHOWN = "gear-pump";
    private static final List<Path> PAGES = List.of(Path.of("README.md"), Path.of("docs", "screen.md"));
    private static final Path FOLDER = Path.of("docs", "pictures");

    @BeforeAll
    static void numbersHavePoints() {
        Locale.setDefault(Locale.ROOT);
    }

    @ParameterizedTest
    @CsvSource({
        "gear-pump, 402, gear-pump.txt",
        "thermoelectric-stage, 960, thermoelectric-stage.txt",
        "electrolyser-cell, 1100, electrolyser-cell.txt"
    })
    void theManualShowsTheScreen(String rig, double seconds, String file) throws IOException {
        String picture = Picture.of(Shots.of(rig, seconds), 120, 36);
        Path path = FOLDER.resolve(file);
        if ("write".equals(System.getProperty("pictures"))) {
            write(path, picture);
        }
        assertThat(path).as("made by -Dpictures=write").hasContent(picture);
        if (rig.equals(SHOWN)) {
            for (Path page : PAGES) {
                assertThat(page).as("made by -Dpictures=write").content().contains(picture.strip());
            }
        }
    }

    /** The pages that show the picture change with it. */
    private static void write(Path path, String picture) throws IOException {
        String before = Files.exists(path) ? Files.readString(path).strip() : "";
        Files.createDirectories(FOLDER);
        Files.writeString(path, picture);
        for (Path page : PAGES) {
            String text = Files.readString(page);
            if (!before.isEmpty() && text.contains(before)) {
                Files.writeString(page, text.replace(before, picture.strip()));
            }
        }
    }
}
