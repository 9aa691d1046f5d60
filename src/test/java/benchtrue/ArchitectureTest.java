package benchtrue;

import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.noClasses;
import static com.tngtech.archunit.library.dependencies.SlicesRuleDefinition.slices;
import static org.assertj.core.api.Assertions.assertThat;

import com.tngtech.archunit.core.domain.JavaClasses;
import com.tngtech.archunit.core.importer.ClassFileImporter;
import com.tngtech.archunit.core.importer.ImportOption;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Clock;
import java.time.Instant;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;

/**
 * The shape of the program. Each rule is checked on the classes and, because the compiler copies constants and so hides where
 * they came from, on the import lines too.
 */
final class ArchitectureTest {
    /** A package may import those before it. */
    private static final List<String> ORDER =
            List.of("reading", "model", "sheet", "source", "estimate", "alarm", "run", "screen", "record", "cli");

    private static final List<String> PURE = List.of("reading", "model", "estimate", "alarm");

    /** Library package to the only packages of ours that may know it. */
    private static final Map<String, List<String>> LIBRARIES = Map.of(
            "org.tomlj", List.of("sheet"),
            "com.fazecast", List.of("source"),
            "org.ejml", List.of("estimate"),
            "org.apache.commons.statistics", List.of("estimate"),
            "com.googlecode.lanterna", List.of("screen"),
            "org.apache.commons.csv", List.of("record"),
            "com.fasterxml.jackson", List.of("record"),
            "picocli", List.of("cli"),
            "ch.randelshofer", List.of("sheet", "source"));

    /** What would tie numbers to a machine: files, network, threads, clocks. */
    private static final String[] OUTSIDE_WORLD = {
        "java.io..",
        "java.nio.file..",
        "java.nio.channels..",
        "java.net..",
        "java.util.concurrent..",
        "java.util.logging.."
    };

    private static final Pattern IMPORT = Pattern.compile("^import (?:static )?([\\w.]+);", Pattern.MULTILINE);
    private static final Path SOURCES = Path.of("src/main/java/benchtrue");

    private static final JavaClasses CLASSES = new ClassFileImporter()
            .withImportOption(ImportOption.Predefined.DO_NOT_INCLUDE_TESTS)
            .importPackages("benchtrue");

    @Test
    void packagesUseOnlyThoseBelowThem() {
        for (int i = 0; i < ORDER.size() - 1; i++) {
            String[] above = ORDER.subList(i + 1, ORDER.size()).stream()
                    .map(ArchitectureTest::within)
                    .toArray(String[]::new);
            noClasses()
                    .that()
                    .resideInAPackage(within(ORDER.get(i)))
                    .should()
                    .dependOnClassesThat()
                    .resideInAnyPackage(above)
                    .check(CLASSES);
        }
    }

    @Test
    void noPackagesDependOnEachOtherInACircle() {
        slices().matching("benchtrue.(*)..").should().beFreeOfCycles().check(CLASSES);
    }

    @Test
    void librariesStayBehindTheirPackage() {
        LIBRARIES.forEach((library, homes) -> noClasses()
                .that()
                .resideOutsideOfPackages(
                        homes.stream().map(ArchitectureTest::within).toArray(String[]::new))
                .should()
                .dependOnClassesThat()
                .resideInAPackage(library + "..")
                .check(CLASSES));
    }

    @Test
    void numbersDependOnNoClockThreadFileOrConsole() {
        String[] pure = PURE.stream().map(ArchitectureTest::within).toArray(String[]::new);
        noClasses()
                .that()
                .resideInAnyPackage(pure)
                .should()
                .dependOnClassesThat()
                .resideInAnyPackage(OUTSIDE_WORLD)
                .orShould()
                .dependOnClassesThat()
                .belongToAnyOf(Thread.class, ProcessBuilder.class, Clock.class)
                .orShould()
                .callMethod(System.class, "nanoTime")
                .orShould()
                .callMethod(System.class, "currentTimeMillis")
                .orShould()
                .accessField(System.class, "out")
                .orShould()
                .accessField(System.class, "err")
                .orShould()
                .callMethod(Instant.class, "now")
                .orShould()
                .callMethod(LocalDate.class, "now")
                .check(CLASSES);
    }

    @Test
    void importLinesKeepTheSameRules() throws IOException {
        List<String> broken = new ArrayList<>();
        for (Path file : sources()) {
            String home = SOURCES.relativize(file).getName(0).toString();
            Matcher imports = IMPORT.matcher(Files.readString(file));
            while (imports.find()) {
                if (!allowed(home, imports.group(1))) {
                    broken.add(file + " imports " + imports.group(1));
                }
            }
        }
        assertThat(broken).isEmpty();
    }

    private static boolean allowed(String home, String imported) {
        if (imported.startsWith("benchtrue.")) {
            String other = imported.split("\\.", -1)[1];
            return ORDER.indexOf(other) <= ORDER.indexOf(home);
        }
        boolean library = LIBRARIES.entrySet().stream()
                .allMatch(e ->
                        !imported.startsWith(e.getKey() + ".") || e.getValue().contains(home));
        boolean outside = Arrays.stream(OUTSIDE_WORLD)
                .anyMatch(world -> imported.startsWith(world.substring(0, world.length() - 1)));
        return library && !(PURE.contains(home) && outside);
    }

    @Test
    void everyPackageIsInTheOrderAndHasAPageOfItsOwn() throws IOException {
        try (Stream<Path> folders = Files.list(SOURCES)) {
            List<Path> packages = folders.toList();
            assertThat(packages.stream().map(p -> p.getFileName().toString()))
                    .containsExactlyInAnyOrderElementsOf(ORDER);
            assertThat(packages)
                    .allSatisfy(p -> assertThat(p.resolve("package-info.java")).exists());
        }
    }

    private static List<Path> sources() throws IOException {
        try (Stream<Path> files = Files.walk(SOURCES)) {
            return files.filter(f -> f.toString().endsWith(".java")).toList();
        }
    }

    private static String within(String name) {
        return "benchtrue." + name + "..";
    }
}
