package benchtrue.cli;

import benchtrue.cli.Answers.Heard;
import java.util.List;
import java.util.Objects;

/** Asks how readings come over a serial line. */
final class LineQuestions {
    private final Answers answers;
    private final String port;
    private int baud;
    private String frame = "";

    LineQuestions(Answers answers, String port) {
        this.answers = answers;
        this.port = port;
    }

    /** One line of the instrument, and the settings with which it came. */
    Sample ask() throws Refusal {
        baud = Integer.parseInt(answers.until(
                "Baud? [9600]",
                answer -> answer.isEmpty() || answer.matches("[1-9]\\d{1,6}")
                        ? new Heard.Taken<>(answer.isEmpty() ? "9600" : answer)
                        : new Heard.Refused<>("\"" + answer + "\" is no rate; write it as 9600")));
        frame = answers.until(
                "Data bits, parity and stop bits? [8N1]",
                answer -> answer.isEmpty() || answer.matches("[5-8][NEOMS][12]")
                        ? new Heard.Taken<>(answer.isEmpty() ? "8N1" : answer)
                        : new Heard.Refused<>("\"" + answer + "\" is no frame; write it as 8N1 or 7E1"));
        return answers.until(
                "One line as the instrument sends it (its manual has one):",
                answer -> answer.isEmpty()
                        ? new Heard.Refused<>("a line is needed to tell its fields; type one from the manual")
                        : new Heard.Taken<>(Sample.of(List.of(answer))));
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
