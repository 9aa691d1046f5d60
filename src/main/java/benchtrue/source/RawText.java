package benchtrue.source;

import benchtrue.sheet.Dialect;
import benchtrue.sheet.LineSpec;
import java.io.ByteArrayOutputStream;
import java.math.BigDecimal;
import java.nio.charset.Charset;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;

/** The lines that the simulated rig sends: status words where the sheet declares some, then the channels. */
final class RawText {
    private static final byte STX = 2;
    private static final byte[] ETX = {3};
    private static final byte[] LINE_END = {'\r', '\n'};

    private RawText() {}

    /** The line of the reading at which the rows are, as bytes with its start and its end. */
    static byte[] sent(LineSpec line, SimulatedRows rows) {
        Dialect dialect = line.dialect();
        byte[] text = text(line, rows).getBytes(charset(dialect));
        String digits = "";
        if (dialect.checksum() != Dialect.Checksum.NONE) {
            digits = String.format(
                    "%0" + dialect.checksum().digits() + "X", Checksums.of(dialect.checksum(), text, 0, text.length));
        }
        byte[] whole = (new String(text, charset(dialect)) + digits).getBytes(charset(dialect));
        int kept = rows.isGarbled() ? whole.length / 2 : whole.length;
        ByteArrayOutputStream sent = new ByteArrayOutputStream();
        if (dialect.framed()) {
            sent.write(STX);
        }
        sent.write(whole, 0, kept);
        sent.writeBytes(dialect.framed() ? ETX : LINE_END);
        return sent.toByteArray();
    }

    private static Charset charset(Dialect dialect) {
        return dialect.latin1() ? StandardCharsets.ISO_8859_1 : StandardCharsets.UTF_8;
    }

    private static String text(LineSpec line, SimulatedRows rows) {
        List<String> fields = new ArrayList<>();
        String stable = line.words().get(rows.isMoving() ? "unstable" : "stable");
        String gross = line.words().get("gross");
        if (stable != null) {
            fields.add(stable);
        }
        if (gross != null) {
            fields.add(gross);
        }
        List<String> cells = new ArrayList<>();
        for (BigDecimal cell : rows.cells()) {
            String number = cell == null ? "" : cell.toPlainString();
            cells.add(line.decimalComma() ? number.replace('.', ',') : number);
        }
        fields.addAll(arranged(line.dialect(), rows.names(), cells));
        String text = String.join(line.separator(), fields);
        return switch (line.dialect().checksum()) {
            case NONE -> text;
            case NMEA -> "$" + text + "*";
            default -> text + line.separator();
        };
    }

    private static List<String> arranged(Dialect dialect, List<String> names, List<String> cells) {
        if (dialect.named()) {
            return IntStream.range(0, cells.size())
                    .mapToObj(i -> names.get(i) + "=" + cells.get(i))
                    .toList();
        }
        return dialect.fields().isEmpty()
                ? cells
                : dialect.fields().stream()
                        .map(f -> f.equals(Dialect.IGNORED) ? Dialect.IGNORED : cells.get(names.indexOf(f)))
                        .toList();
    }
}
