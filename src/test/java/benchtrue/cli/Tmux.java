package benchtrue.cli;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Duration;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.awaitility.Awaitility;
import org.awaitility.core.ConditionTimeoutException;

/**
 * The finished jar in a real terminal, as an operator has it. A server of its own, so that nobody's sessions are touched. Before
 * and after the program the shell writes the settings of the terminal into files.
 */
final class Tmux implements AutoCloseable {
    private static final Duration PATIENCE = Duration.ofSeconds(40);

    private final Path folder;
    private final Path socket;

    /** @param arguments of the program, as a shell reads them */
    Tmux(Path folder, int width, int height, String environment, String arguments) throws IOException {
        this.folder = folder;
        socket = folder.resolve("tmux");
        Path script = folder.resolve("session.sh");
        String java = Path.of(System.getProperty("java.home"), "bin", "java").toString();
        Files.writeString(
                script,
                String.join(
                        "\n",
                        "stty -a > " + folder + "/before",
                        "export LC_ALL=C.UTF-8 " + environment,
                        java + " -Xmx256m -jar " + System.getProperty("benchtrue.jar") + " " + arguments + " & "
                                + "echo $! > " + folder + "/pid; fg >/dev/null 2>&1",
                        "status=$?",
                        "stty -a > " + folder + "/after",
                        "echo exit=$status",
                        "sleep 600",
                        ""));
        tmux(
                "-f",
                "/dev/null",
                "new-session",
                "-d",
                "-x",
                Integer.toString(width),
                "-y",
                Integer.toString(height),
                "bash -m " + script);
    }

    private String tmux(String... arguments) throws IOException {
        List<String> command = new ArrayList<>(List.of("tmux", "-S", socket.toString()));
        command.addAll(Arrays.asList(arguments));
        Process process = new ProcessBuilder(command).redirectErrorStream(true).start();
        return new String(process.getInputStream().readAllBytes(), StandardCharsets.UTF_8);
    }

    /** Text as it is typed. */
    void type(String text) throws IOException {
        tmux("send-keys", "-l", text);
    }

    /** A key by its name: Enter, Escape, Tab, C-c, … */
    void press(String... keys) throws IOException {
        for (String key : keys) {
            tmux("send-keys", key);
        }
    }

    void resize(int width, int height) throws IOException {
        tmux("resize-window", "-x", Integer.toString(width), "-y", Integer.toString(height));
    }

    /** What is on the screen. */
    String screen() throws IOException {
        return tmux("capture-pane", "-p");
    }

    /** What has been printed since the start, and is not in panes. */
    String printed() throws IOException {
        return tmux("capture-pane", "-p", "-J", "-S", "-1000");
    }

    String awaitText(String words) throws IOException {
        try {
            Awaitility.await()
                    .atMost(PATIENCE)
                    .pollInterval(Duration.ofMillis(100))
                    .until(() -> screen().contains(words));
        } catch (ConditionTimeoutException e) {
            throw new AssertionError("\"" + words + "\" did not come. The screen:\n" + screen(), e);
        }
        return screen();
    }

    void awaitNoText(String words) throws IOException {
        try {
            Awaitility.await()
                    .atMost(PATIENCE)
                    .pollInterval(Duration.ofMillis(100))
                    .until(() -> !screen().contains(words));
        } catch (ConditionTimeoutException e) {
            throw new AssertionError("\"" + words + "\" did not go. The screen:\n" + screen(), e);
        }
    }

    long pid() throws IOException {
        return Long.parseLong(Files.readString(folder.resolve("pid")).strip());
    }

    /** Sends the program a signal by name. */
    void signal(String name) throws IOException, InterruptedException {
        new ProcessBuilder("kill", "-" + name, Long.toString(pid())).start().waitFor();
    }

    /** Settings of the terminal before and after the program, with the exit status on the last row of what was printed. */
    boolean restored() throws IOException {
        String before = settings("before");
        String after = settings("after");
        // Not in the alternate screen, cursor shown.
        String state =
                tmux("display-message", "-p", "#{alternate_on} #{cursor_flag}").strip();
        return before.equals(after) && state.equals("0 1");
    }

    /** All but the size, which is the window's own. */
    private String settings(String file) throws IOException {
        return Files.readString(folder.resolve(file)).replaceAll("rows \\d+; columns \\d+", "");
    }

    @Override
    public void close() throws IOException {
        tmux("kill-server");
    }
}
