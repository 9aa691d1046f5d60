package benchtrue.record;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;

/** A file that is there whole or not at all, however the program ends. */
final class WholeFile {
    private WholeFile() {}

    /** Written beside its place and moved there; where that fails nothing of it is left. */
    static void write(Path path, String text) throws IOException {
        Path beside = path.resolveSibling("." + path.getFileName() + ".part");
        try {
            Files.write(beside, text.getBytes(StandardCharsets.UTF_8));
            Files.move(beside, path, StandardCopyOption.ATOMIC_MOVE, StandardCopyOption.REPLACE_EXISTING);
        } finally {
            Files.deleteIfExists(beside);
        }
    }
}
