package benchtrue.screen;

import benchtrue.run.Snapshot;
import java.util.ArrayList;
import java.util.List;
import java.util.function.Function;

/** Each channel's value, unit, age, status and a short trend. */
final class ReadingsPane implements Pane {
    private static final int DIGITS = 6;
    /** Cells of the longest word for the state of a channel. */
    private static final int STATUS = 9;

    private static final int TREND = 8;
    private static final String STEPS = "▁▂▃▄▅▆▇█";
    private static final String ASCII_STEPS = "_.-=+*#@";
    /** A value older than this is shown with its age. */
    private static final double FRESH = 2;

    @Override
    public String title(Shown shown) {
        Snapshot.Counts counts = shown.snapshot().counts();
        StringBuilder title = new StringBuilder("Readings  " + counts.seen());
        if (counts.heldOut() > 0) {
            title.append(", held out ").append(counts.heldOut());
        }
        if (counts.malformed() > 0) {
            title.append(", garbled ").append(counts.malformed());
        }
        if (counts.gaps() > 0) {
            title.append(", gaps ").append(counts.gaps());
        }
        if (counts.lost() > 0) {
            title.append(", lost ").append(counts.lost());
        }
        if (counts.queued() > 0) {
            title.append(", waiting ").append(counts.queued());
        }
        return title.toString();
    }

    @Override
    public void draw(Canvas canvas, Shown shown) {
        List<Snapshot.ChannelView> channels = shown.snapshot().channels();
        int value = widest(canvas, channels, c -> Texts.value(c.value(), DIGITS), 13);
        int unit = widest(canvas, channels, Snapshot.ChannelView::unit, 8);
        int name = widest(canvas, channels, Snapshot.ChannelView::name, canvas.width() - value - unit - STATUS - 3);
        List<Line> lines = new ArrayList<>();
        for (Snapshot.ChannelView channel : channels) {
            boolean good = channel.status().equals("good") || channel.status().equals("derived");
            String age = channel.age() > FRESH ? " " + Texts.span(channel.age()) : "";
            String start = Columns.left(canvas, channel.name(), name)
                    + " " + Columns.right(canvas, Texts.value(channel.value(), DIGITS), value)
                    + " " + Columns.left(canvas, channel.unit(), unit) + " ";
            int room = canvas.width() - canvas.width(start) - STATUS - 1 - age.length();
            String trend = trend(channel.trend(), Math.max(0, Math.min(room, 3 * TREND)), canvas.ascii());
            lines.add(Line.of(start)
                    .and(trend + (trend.isEmpty() ? "" : " "))
                    .and(channel.status(), good ? Style.PLAIN : Style.REVERSE)
                    .and(age));
        }
        Line.draw(canvas, lines, shown.look().from(PaneKind.READINGS));
    }

    private static int widest(
            Canvas canvas, List<Snapshot.ChannelView> channels, Function<Snapshot.ChannelView, String> text, int most) {
        int widest = channels.stream()
                .mapToInt(c -> canvas.width(text.apply(c)))
                .max()
                .orElse(0);
        return Math.max(1, Math.min(most, widest));
    }

    /** The last values between their own least and greatest. */
    private static String trend(double[] values, int cells, boolean ascii) {
        if (cells < TREND / 2 || values.length == 0) {
            return "";
        }
        int from = Math.max(0, values.length - cells);
        double least = Double.POSITIVE_INFINITY;
        double greatest = Double.NEGATIVE_INFINITY;
        for (int i = from; i < values.length; i++) {
            least = Math.min(least, values[i]);
            greatest = Math.max(greatest, values[i]);
        }
        String steps = ascii ? ASCII_STEPS : STEPS;
        StringBuilder trend = new StringBuilder();
        for (int i = from; i < values.length; i++) {
            double share = greatest > least ? (values[i] - least) / (greatest - least) : 0.5;
            trend.append(steps.charAt((int) Math.round(share * (steps.length() - 1))));
        }
        return " ".repeat(cells - trend.length()) + trend;
    }
}
