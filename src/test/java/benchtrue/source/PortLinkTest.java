package benchtrue.source;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import benchtrue.sheet.LineSpec;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.concurrent.CompletableFuture;
import java.util.concurrent.TimeUnit;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** On pseudo-terminals, which have neither a speed nor a frame: what these do on a wire is not tested here. */
@Tag("end-to-end")
class PortLinkTest {
    private static final LineSpec LINE = Sheets.line("8N1");

    @TempDir
    Path folder;

    private final byte[] buffer = new byte[64];

    private String text(int length) {
        return new String(buffer, 0, length, StandardCharsets.ISO_8859_1);
    }

    private static void send(PortLink link, String text) throws IOException {
        byte[] bytes = text.getBytes(StandardCharsets.ISO_8859_1);
        link.write(bytes, bytes.length);
    }

    @Test
    void bytesGoBothWaysAsTheyAre() throws IOException {
        try (TerminalPair pair = new TerminalPair(folder);
                PortLink near = PortLink.open(pair.near(), LINE);
                PortLink far = PortLink.open(pair.far(), LINE)) {
            send(near, "\0\3\r\n\21\23\377");
            assertThat(text(far.read(buffer))).isEqualTo("\0\3\r\n\21\23\377");
            send(far, "1.5\r\n");
            assertThat(text(near.read(buffer))).isEqualTo("1.5\r\n");
        }
    }

    @Test
    void whatHasComeCanBeThrownAway() throws IOException {
        try (TerminalPair pair = new TerminalPair(folder);
                PortLink near = PortLink.open(pair.near(), LINE);
                PortLink far = PortLink.open(pair.far(), LINE)) {
            send(far, "old");
            assertThat(near.read(new byte[1])).isEqualTo(1);
            near.discard();
            assertThat(near.read(buffer)).isZero();
            send(far, "new");
            assertThat(text(near.read(buffer))).isEqualTo("new");
        }
    }

    @Test
    void aSilentLineAnswersNothingInGoodTime() throws IOException {
        try (TerminalPair pair = new TerminalPair(folder);
                PortLink near = PortLink.open(pair.near(), LINE)) {
            long start = System.nanoTime();
            assertThat(near.read(buffer)).isZero();
            assertThat(System.nanoTime() - start)
                    .as("about %d ms", PortLink.WAIT_MILLIS)
                    .isBetween(TimeUnit.MILLISECONDS.toNanos(100), TimeUnit.MILLISECONDS.toNanos(1000));
        }
    }

    @Test
    void aPulledCableIsGoneForReadingAndForWriting() throws IOException {
        TerminalPair pair = new TerminalPair(folder);
        try (PortLink near = PortLink.open(pair.near(), LINE)) {
            pair.pull();
            assertThat(near.read(buffer)).isEqualTo(-1);
            assertThatThrownBy(() -> send(near, "x"))
                    .isInstanceOf(IOException.class)
                    .hasMessage("the port is gone");
        }
    }

    @Test
    void aPortThatCameBackIsOpenedAnewByTheSameName() throws IOException {
        new TerminalPair(folder).close();
        try (TerminalPair pair = new TerminalPair(folder);
                PortLink near = PortLink.open(pair.near(), LINE);
                PortLink far = PortLink.open(pair.far(), LINE)) {
            send(far, "again");
            assertThat(text(near.read(buffer))).isEqualTo("again");
        }
    }

    @Test
    void closingFreesAReadThatWaits() throws Exception {
        try (TerminalPair pair = new TerminalPair(folder)) {
            PortLink near = PortLink.open(pair.near(), LINE);
            CompletableFuture<Integer> read = CompletableFuture.supplyAsync(() -> near.read(buffer));
            near.close();
            assertThat(read.get(2, TimeUnit.SECONDS)).isLessThanOrEqualTo(0);
        }
    }

    @Test
    void whyAPortCannotBeOpenedIsSaidInWords() throws IOException {
        assertThatThrownBy(() -> PortLink.open(folder.resolve("none").toString(), LINE))
                .hasMessage("there is no such port");
        Path file = Files.writeString(folder.resolve("file"), "no port");
        assertThatThrownBy(() -> PortLink.open(file.toString(), LINE)).isInstanceOf(IOException.class);
        try (TerminalPair pair = new TerminalPair(folder)) {
            Process other =
                    new ProcessBuilder("flock", "-F", pair.near(), "sh", "-c", "echo held; exec sleep 30").start();
            try {
                assertThat(other.getInputStream().read()).isEqualTo('h');
                assertThatThrownBy(() -> PortLink.open(pair.near(), LINE)).hasMessage("another program has it open");
            } finally {
                other.destroy();
            }
        }
    }

    @Test
    void aPseudoTerminalTakesAnyFrameAsOftenAsItIsOpened() throws IOException {
        try (TerminalPair pair = new TerminalPair(folder);
                PortLink far = PortLink.open(pair.far(), Sheets.line("7E1"))) {
            for (String text : List.of("1.5", "2.5", "3.5")) {
                try (PortLink near = PortLink.open(pair.near(), Sheets.line("7E1"))) {
                    send(far, text);
                    assertThat(text(near.read(buffer))).isEqualTo(text);
                }
            }
        }
        assertThat(PortLink.isPseudoTerminal("/dev/null")).isFalse();
        assertThat(PortLink.isPseudoTerminal(folder.resolve("none").toString())).isFalse();
    }
}
