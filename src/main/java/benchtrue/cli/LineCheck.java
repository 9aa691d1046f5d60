package benchtrue.cli;

import benchtrue.sheet.BenchSheet;
import benchtrue.source.Failure;
import benchtrue.source.LineTrial;
import benchtrue.source.RawBytes;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.regex.Pattern;

/** Shows what lines of an instrument would become under a sheet. */
final class LineCheck {
    private static final int SHOWN = 200;
    private static final byte[] STX = {2};
    private static final Pattern RAW_LOG = Pattern.compile("-?\\d+\\.\\d{6}\\t.*");

    private final Output output;
    private final BenchSheet sheet;

    LineCheck(Output output, BenchSheet sheet) {
        this.output = output;
        this.sheet = sheet;
    }

    /** The bytes of a file of lines; of a raw.log those that it stands for. */
    static byte[] read(Path file) throws Refusal {
        try {
            byte[] bytes = Files.readAllBytes(file);
            List<String> text =
                    new String(bytes, StandardCharsets.UTF_8).lines().toList();
            if (text.isEmpty() || !text.stream().allMatch(RAW_LOG.asMatchPredicate())) {
                return bytes;
            }
            ByteArrayOutputStream raw = new ByteArrayOutputStream();
            text.forEach(l -> raw.writeBytes(RawBytes.of(l.substring(l.indexOf('\t') + 1))));
            return raw.toByteArray();
        } catch (IOException e) {
            throw new Refusal(file + ": cannot be read (" + Failure.words(e) + ")");
        }
    }

    /** Whether each line becomes a reading. A text without a frame of its own is framed as the sheet says. */
    boolean understands(byte[] bytes) {
        boolean framed = sheet.line() != null && sheet.line().dialect().framed();
        LineTrial trial = new LineTrial(sheet);
        List<LineTrial.Tried> tried = framed && bytes[0] != STX[0] ? trial.of(inFrame(bytes)) : trial.of(bytes);
        tried.stream().limit(SHOWN).forEach(t -> {
            output.line(t.text());
            output.line((t.understood() ? "  -> " : "  not understood: ") + t.becomes());
        });
        long understood = tried.stream().filter(LineTrial.Tried::understood).count();
        if (tried.size() > 1 || tried.isEmpty()) {
            output.line(understood + " of " + tried.size() + " lines understood");
        }
        return !tried.isEmpty() && understood == tried.size();
    }

    private static byte[] inFrame(byte[] bytes) {
        String text = new String(bytes, StandardCharsets.ISO_8859_1).stripTrailing();
        return ("\u0002" + text + "\u0003").getBytes(StandardCharsets.ISO_8859_1);
    }
}
