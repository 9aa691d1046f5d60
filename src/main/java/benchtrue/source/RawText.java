package benchtrue.source;

import benchtrue.sheet.LineSpec;
import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.List;

/** The lines that the simulated rig sends: status words where the sheet declares some, then the channels. */
final class RawText {
    private RawText() {}

    /** The line of the reading at which the rows are, without its end. */
    static String of(LineSpec line, SimulatedRows rows) {
        List<String> fields = new ArrayList<>();
        String stable = line.words().get(rows.isMoving() ? "unstable" : "stable");
        String gross = line.words().get("gross");
        if (stable != null) {
            fields.add(stable);
        }
        if (gross != null) {
            fields.add(gross);
        }
        for (BigDecimal cell : rows.cells()) {
            String number = cell == null ? "" : cell.toPlainString();
            fields.add(line.decimalComma() ? number.replace('.', ',') : number);
        }
        String text = String.join(line.separator(), fields);
        return rows.isGarbled() ? text.substring(0, text.length() / 2) : text;
    }
}
