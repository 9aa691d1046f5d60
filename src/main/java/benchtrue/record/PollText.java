package benchtrue.record;

import benchtrue.sheet.BenchSheet;
import benchtrue.sheet.PollSpec;
import benchtrue.sheet.PollSpec.Modbus;
import benchtrue.sheet.PollSpec.Register;
import benchtrue.sheet.PollSpec.Scpi;
import java.util.Locale;

/** What is asked of polled instruments, for people. */
final class PollText {
    private PollText() {}

    static void write(TextPage page, BenchSheet sheet, PollSpec poll) {
        page.heading("Questions");
        String language = poll.asking() instanceof Scpi ? "SCPI" : "Modbus RTU";
        page.paragraph("Asked over " + language + " every " + Figures.exact(poll.periodSeconds())
                + " s, one after the other; an answer may take " + Figures.exact(poll.timeoutSeconds()) + " s.");
        TextTable table = new TextTable(poll.asking() instanceof Scpi ? "ll" : "lrlrllr");
        if (poll.asking() instanceof Modbus) {
            table.row("", "address", "function", "register", "type", "order", "scale");
        }
        for (int i = 0; i < sheet.channels().size(); i++) {
            String channel = sheet.channels().get(i).name();
            if (poll.asking() instanceof Scpi scpi) {
                table.row(channel, scpi.queries().get(i));
            } else if (poll.asking() instanceof Modbus modbus) {
                table.row(row(channel, modbus.registers().get(i)));
            }
        }
        page.table(table);
    }

    private static String[] row(String channel, Register register) {
        return new String[] {
            channel,
            String.valueOf(register.address()),
            register.function() == 3 ? "3 (holding)" : "4 (input)",
            String.valueOf(register.register()),
            register.type().name().toLowerCase(Locale.ROOT),
            register.type().registers() == 1 ? "" : register.order(),
            Figures.exact(register.scale())
        };
    }
}
