package benchtrue.cli;

import benchtrue.record.RunFiles;
import benchtrue.source.Failure;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.LinkOption;
import java.nio.file.Path;
import java.util.List;

/**
 * The folder that a replay writes into. It is never a run's own folder, whichever way it is named, and a file in it is
 * replaced only where an earlier replay wrote it.
 */
final class OutFolder {
    private static final List<String> OF_A_RUN = List.of("readings.csv", "raw.log", "sheet.toml");

    private OutFolder() {}

    /**
     * Makes the folder if need be.
     *
     * @param replaceForeign whether files may be replaced that no replay wrote
     * @throws Refusal where it belongs to a run, holds files that are not ours, or cannot be made
     */
    static void claim(Path folder, boolean replaceForeign) throws Refusal {
        try {
            Files.createDirectories(folder);
            for (String name : OF_A_RUN) {
                if (Files.exists(folder.resolve(name), LinkOption.NOFOLLOW_LINKS)) {
                    throw new Refusal(folder + ": this folder holds a run (" + name
                            + "), and a replay never writes into one; name another folder with --out");
                }
            }
            for (String name : RunFiles.names()) {
                check(folder.resolve(name), replaceForeign);
            }
        } catch (IOException e) {
            throw new Refusal(
                    folder + ": cannot be written to (" + Failure.words(e) + "); name another folder with --out");
        }
    }

    private static void check(Path file, boolean replaceForeign) throws IOException, Refusal {
        if (Files.isSymbolicLink(file)) {
            throw new Refusal(file + ": is a link, and a replay does not write through links; remove it or name another"
                    + " folder with --out");
        }
        if (Files.exists(file) && !replaceForeign && !RunFiles.wrote(file)) {
            throw new Refusal(
                    file + ": is there already and was not written by this program; move it away, name another"
                            + " folder with --out, or give --yes to replace it");
        }
    }
}
