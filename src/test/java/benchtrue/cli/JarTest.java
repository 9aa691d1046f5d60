package benchtrue.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.List;
import java.util.jar.Attributes;
import java.util.jar.JarFile;
import java.util.zip.ZipEntry;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;

/** What lies in the finished jar. */
@Tag("end-to-end")
final class JarTest {
    private final Path jar = Path.of(System.getProperty("benchtrue.jar"));

    @Test
    void namesALicenceForEveryLibraryWhoseClassesItHolds() throws IOException {
        try (JarFile file = new JarFile(jar.toFile())) {
            List<String[]> libraries = text(file, "META-INF/licenses/THIRD-PARTY.txt")
                    .lines()
                    .map(line -> line.split("\\s{2,}", -1))
                    .filter(cells -> cells.length == 3)
                    .toList();
            assertThat(libraries).isNotEmpty();
            List<String> unnamed = file.stream()
                    .map(ZipEntry::getName)
                    .map(name -> name.replaceFirst("^META-INF/versions/\\d+/", ""))
                    .filter(name -> name.endsWith(".class") && !name.startsWith("benchtrue/"))
                    .filter(name -> libraries.stream().noneMatch(cells -> name.startsWith(cells[2] + "/")))
                    .toList();
            assertThat(unnamed)
                    .as("classes of libraries that THIRD-PARTY.txt does not name")
                    .isEmpty();
            for (String[] cells : libraries) {
                assertThat(text(file, "META-INF/licenses/" + cells[0] + ".txt")).contains(":" + cells[0] + ")");
            }
        }
    }

    @Test
    void holdsTheLicencesThemselves() throws IOException {
        try (JarFile file = new JarFile(jar.toFile())) {
            assertThat(text(file, "META-INF/LICENSE"))
                    .contains("Apache License")
                    .contains("END OF TERMS AND CONDITIONS");
            assertThat(text(file, "META-INF/licenses/lanterna.txt")).contains("GNU LESSER GENERAL PUBLIC LICENSE");
            assertThat(text(file, "META-INF/licenses/GPL-3.0.txt")).contains("GNU GENERAL PUBLIC LICENSE");
        }
    }

    @Test
    void runsAloneAndMayLoadTheSerialLibrary() throws IOException {
        try (JarFile file = new JarFile(jar.toFile())) {
            Attributes manifest = file.getManifest().getMainAttributes();
            assertThat(manifest.getValue("Main-Class")).isEqualTo("benchtrue.cli.Main");
            assertThat(manifest.getValue("Enable-Native-Access")).isEqualTo("ALL-UNNAMED");
            assertThat(manifest.getValue("Class-Path")).isNull();
        }
    }

    private static String text(JarFile file, String name) throws IOException {
        ZipEntry entry = file.getEntry(name);
        assertThat(entry).as(name).isNotNull();
        return new String(file.getInputStream(entry).readAllBytes(), StandardCharsets.UTF_8);
    }
}
