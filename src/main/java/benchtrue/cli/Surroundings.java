package benchtrue.cli;

import java.io.IOException;
import java.util.Locale;
import java.util.Map;
import java.util.concurrent.TimeUnit;

/** What the program was started in: a terminal or a pipe, and what its locale can show. */
final class Surroundings {
    private Surroundings() {}

    /** Whether panes can be drawn: both ends are a terminal that is neither dumb nor unnamed. */
    static boolean canDraw(Map<String, String> environment) {
        String term = environment.getOrDefault("TERM", "");
        return !term.isEmpty() && !term.equals("dumb") && isTerminal();
    }

    /** Asked of the shell: from Java 22 on a console is there without a terminal too. */
    static boolean isTerminal() {
        try {
            Process test = new ProcessBuilder("sh", "-c", "test -t 0 && test -t 1")
                    .inheritIO()
                    .start();
            return test.waitFor(5, TimeUnit.SECONDS) && test.exitValue() == 0;
        } catch (IOException e) {
            return false;
        } catch (InterruptedException e) {
            Thread.currentThread().interrupt();
            return false;
        }
    }

    /** Whether the locale's encoding is other than UTF-8, so that only ASCII is safe. */
    static boolean onlyAscii(Map<String, String> environment) {
        for (String name : new String[] {"LC_ALL", "LC_CTYPE", "LANG"}) {
            String value = environment.getOrDefault(name, "");
            if (!value.isEmpty()) {
                String encoding = value.toUpperCase(Locale.ROOT);
                return !(encoding.contains("UTF-8") || encoding.contains("UTF8"));
            }
        }
        return true;
    }
}
