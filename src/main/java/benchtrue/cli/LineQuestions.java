package benchtrue.cli;

import benchtrue.cli.Answers.Heard;
import benchtrue.sheet.Dialect;
import benchtrue.sheet.LineSpec;
import benchtrue.source.Overheard;
import java.io.IOException;
import java.util.List;
import java.util.Map;
import java.util.Objects;

/** Asks how readings come over a serial line. */
final class LineQuestions {
    private static final double LISTEN_SECONDS = 3;

    private final Answers answers;
    private final Output output;
    private final String port;
    private int baud;
    private String frame = "";

    LineQuestions(Answers answers, Output output, String port) {
        this.answers = answers;
        this.output = output;
        this.port = port;
    }

    /** One line of the instrument, and the settings with which it came. */
    Sample ask() throws Refusal {
        output.line(
                "Opening a port may reset a board that controls a rig: make the rig safe first. The port is listened"
                        + " to once its settings are known; nothing is sent.");
        baud = Integer.parseInt(answers.until(
                "Baud? [9600]",
                answer -> answer.isEmpty() || answer.matches("[1-9]\\d{1,6}")
                        ? new Heard.Taken<>(answer.isEmpty() ? "9600" : answer)
                        : new Heard.Refused<>("\"" + answer + "\" is no rate; write it as 9600")));
        frame = answers.until(
                "Data bits, parity and stop bits? [8N1]",
                answer -> answer.isEmpty() || answer.matches("8[NEO]1|8N2|7[NEO]1|7[EO]2")
                        ? new Heard.Taken<>(answer.isEmpty() ? "8N1" : answer)
                        : new Heard.Refused<>("\"" + answer + "\" is no frame; write it as 8N1 or 7E1"));
        List<String> heard = heard();
        return heard.isEmpty() ? typed() : Sample.ofLines(heard);
    }

    /** Nothing where the port is not there yet, or silent. */
    private List<String> heard() {
        LineSpec spec = new LineSpec(port, baud, frame, ",", false, Map.of(), Dialect.PLAIN);
        output.line("Listening to " + port + " for " + (int) LISTEN_SECONDS + " s …");
        try {
            return Overheard.on(port, spec, LISTEN_SECONDS).stream()
                    .filter(l -> !l.isBlank())
                    .toList();
        } catch (IOException e) {
            output.line("  " + port + ": " + e.getMessage());
            return List.of();
        }
    }

    private Sample typed() throws Refusal {
        return answers.until(
                "No line was heard (docs/serial.md says where to look). One line as the instrument sends it, from its"
                        + " manual?",
                answer -> answer.isEmpty()
                        ? new Heard.Refused<>("a line is needed to tell its fields; type one from the manual")
                        : new Heard.Taken<>(Sample.ofLines(List.of(answer))));
    }

    /** Adds the table of the line to the sheet. */
    void write(SheetLines sheet, Sample sample, List<String> names) {
        sheet.table("[line]");
        sheet.add("port", port, "another one: --port");
        sheet.add("baud = " + baud, "");
        sheet.add("frame", frame, "");
        if (!sample.separator().equals(",")) {
            sheet.add("separator", sample.separator(), sample.separator().equals(" ") ? "any number of blanks" : "");
        }
        if (sample.decimalComma()) {
            sheet.add("decimal_comma = true", "");
        }
        boolean renamed = false;
        for (int i = 0; i < names.size(); i++) {
            renamed |= !Objects.equals(names.get(i), sample.fields().get(i).name());
        }
        if (sample.named() && !renamed) {
            sheet.add("named = true", "fields are name=value");
        } else if (names.contains(ChannelQuestions.SKIP)) {
            String fields =
                    String.join(", ", names.stream().map(SheetLines::quoted).toList());
            sheet.add("fields = [" + fields + "]", "- is no channel");
        }
    }
}
