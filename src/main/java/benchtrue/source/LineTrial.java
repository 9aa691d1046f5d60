package benchtrue.source;

import benchtrue.reading.Reading;
import benchtrue.sheet.BenchSheet;
import benchtrue.sheet.Channel;
import benchtrue.sheet.LineSpec;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Objects;

/** What lines would become if an instrument sent them: for finding the right [line]. */
public final class LineTrial implements FrameSink {
    /**
     * @param text of the line as raw.log would have it
     * @param becomes the values with their units, or what is wrong
     */
    public record Tried(String text, boolean understood, String becomes) {}

    private final List<Channel> channels;
    private final LineParser parser;
    private final Framer framer;
    private final Reading reading;
    private final List<Tried> tried = new ArrayList<>();

    public LineTrial(BenchSheet sheet) {
        channels = sheet.channels();
        parser = new LineParser(sheet);
        LineSpec spec = Objects.requireNonNullElse(sheet.line(), RehearsedLines.PLAIN);
        framer = new Framer(spec);
        reading = new Reading(channels.size());
    }

    /** Bytes as they would come over the line; what they become, line after line. Blank lines are nothing. */
    public List<Tried> of(byte[] bytes) {
        tried.clear();
        framer.add(bytes, 0, bytes.length, 0, this);
        return List.copyOf(tried);
    }

    @Override
    public void frame(byte[] bytes, int from, int to, int end, long firstByteNanos, boolean cutShort) {
        byte[] line = Arrays.copyOfRange(bytes, from, to);
        if (LineParser.isBlank(line)) {
            return;
        }
        String text = RawBytes.text(line);
        if (cutShort) {
            tried.add(new Tried(text, false, "longer than " + Framer.LONGEST + " bytes"));
            return;
        }
        String wrong = parser.parse(line, 0, line.length, reading);
        tried.add(new Tried(text, wrong.isEmpty(), wrong.isEmpty() ? values() : wrong));
    }

    private String values() {
        List<String> values = new ArrayList<>();
        for (int i = 0; i < channels.size(); i++) {
            Channel channel = channels.get(i);
            double value = reading.values[i];
            values.add(channel.name() + " = "
                    + (Double.isNaN(value)
                                    ? "missing"
                                    : value + " " + channel.unit().symbol())
                            .strip());
        }
        return String.join(", ", values);
    }
}
