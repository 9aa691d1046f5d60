package benchtrue.alarm;

import benchtrue.sheet.Channel;
import java.util.Locale;
import org.jspecify.annotations.Nullable;

/** One channel: stuck, saturated, outside its measuring interval, silent. Works on the indication, before any correction. */
final class ChannelWatch {
    /** A value must be wrong, or right again, for so many readings before the alarm is raised or returns. */
    private static final int DELAY = 3;

    private static final int SHORTEST_STUCK = 6;
    /** A run of identical values less likely than this is a question that must be resolved before a cause is told. */
    private static final double SUSPICIOUS = 0.01;
    /** Silent after so many of the channel's own intervals. */
    private static final double SILENT = 3;

    private final Channel channel;
    private final AlarmBook book;
    private final ChannelNoise noise;
    private final UsualInterval ownInterval = new UsualInterval();
    private Status status = Status.GOOD;
    private Status candidate = Status.GOOD;
    private int candidateFor;
    private double candidateTime;
    private long candidateReading;
    private double last = Double.NaN;
    private double lastTime = Double.NaN;
    private double lowest = Double.POSITIVE_INFINITY;
    private double highest = Double.NEGATIVE_INFINITY;
    private int run;
    private double runTime;
    private long runReading;
    private int stuckLength = Integer.MAX_VALUE;

    ChannelWatch(Channel channel, AlarmBook book) {
        this.channel = channel;
        this.book = book;
        noise = new ChannelNoise(channel.noise(), channel.resolution());
    }

    /** What a channel is worth. */
    enum Status {
        GOOD("good"),
        STUCK("stuck"),
        SATURATED("saturated"),
        OUTSIDE("outside"),
        SILENT("silent");

        private final String word;

        Status(String word) {
            this.word = word;
        }

        String word() {
            return word;
        }

        Alarm.@Nullable Kind kind() {
            return switch (this) {
                case GOOD -> null;
                case STUCK -> Alarm.Kind.STUCK;
                case SATURATED -> Alarm.Kind.SATURATED;
                case OUTSIDE -> Alarm.Kind.INTERVAL;
                case SILENT -> Alarm.Kind.SILENT;
            };
        }
    }

    /**
     * @param value NaN: missing
     * @param time running time in s
     * @param perReading false alarms that the test for a stuck channel may raise; NaN: not yet known
     */
    void arrive(double value, double time, long number, double perReading) {
        if (Double.isNaN(value)) {
            missing(time, number);
            return;
        }
        ownInterval.add(time - lastTime);
        count(value, time, number);
        noise.add(value);
        if (Double.isInfinite(perReading) || Double.isNaN(perReading) || !noise.telling()) {
            stuckLength = Integer.MAX_VALUE;
        } else if (stuckLength == Integer.MAX_VALUE) {
            stuckLength = lengthFor(perReading);
        }
        settle(judge(value), time, number);
        lowest = Math.min(lowest, value);
        highest = Math.max(highest, value);
        last = value;
        lastTime = time;
    }

    private void missing(double time, long number) {
        double patience = SILENT * ownInterval.seconds();
        if (ownInterval.known() && time - lastTime > patience && status != Status.SILENT) {
            candidateTime = lastTime;
            candidateReading = number;
            become(Status.SILENT, time);
        }
    }

    private void count(double value, double time, long number) {
        if (value == last) {
            run++;
        } else {
            run = 1;
            runTime = time;
            runReading = number;
        }
    }

    private int lengthFor(double perReading) {
        int likely = 1 + (int) Math.ceil(Math.log(perReading) / Math.log(noise.repeats()));
        return Math.max(Math.max(SHORTEST_STUCK, likely), 2 * noise.longestRun());
    }

    private Status judge(double value) {
        double half = noise.step() < Double.POSITIVE_INFINITY ? noise.step() / 2 : 0;
        if (channel.currentLoop() && !CurrentLoop.valid(CurrentLoop.milliamperes(value, channel.unit()))) {
            return Status.SATURATED;
        }
        if (value > channel.interval().upper() + half
                || value < channel.interval().lower() - half) {
            return Status.OUTSIDE;
        }
        if (run >= DELAY && atLimit(value, half)) {
            return Status.SATURATED;
        }
        if (run >= stuckLength) {
            return value <= lowest || value >= highest ? Status.SATURATED : Status.STUCK;
        }
        return Status.GOOD;
    }

    /** At a declared limit other than zero, where a rig at rest belongs, on a channel that nobody sets. */
    private boolean atLimit(double value, double half) {
        double upper = channel.interval().upper();
        double lower = channel.interval().lower();
        return !channel.adjustable()
                && value != 0
                && (Math.abs(value - upper) <= half || Math.abs(value - lower) <= half);
    }

    /** On and off only after the same finding in a few readings; the tests of runs have waited long enough by themselves. */
    private void settle(Status found, double time, long number) {
        if (found != candidate) {
            candidate = found;
            candidateFor = 0;
            candidateTime = time;
            candidateReading = number;
        }
        candidateFor++;
        boolean sure = candidateFor >= DELAY || found == Status.STUCK || (found == Status.SATURATED && run >= DELAY);
        if (found != status && sure) {
            become(found, time);
        }
    }

    private void become(Status next, double time) {
        Alarm.Kind before = status.kind();
        if (before != null) {
            book.normal(before, null, channel.name());
        }
        status = next;
        Alarm.Kind now = next.kind();
        if (now != null) {
            book.report(Finding.of(
                    now, channel.name(), onset(), size(), channel.unit().symbol(), priority(), text(time)));
        }
    }

    private Finding.Onset onset() {
        boolean byRun = status == Status.STUCK || (status == Status.SATURATED && run >= DELAY);
        return byRun ? Finding.Onset.at(runTime, runReading) : Finding.Onset.at(candidateTime, candidateReading);
    }

    private double size() {
        return status == Status.SILENT ? Double.NaN : last;
    }

    private Alarm.Priority priority() {
        return status == Status.OUTSIDE || status == Status.SILENT ? Alarm.Priority.ACT_NOW : Alarm.Priority.NEXT_STOP;
    }

    private String text(double time) {
        String value = Words.number(last) + Words.unit(channel.unit().symbol());
        String since = Words.number(time - onset().time()) + " s";
        return switch (status) {
            case GOOD -> "";
            case STUCK ->
                channel.name() + " has read " + value + " for " + run + " readings (" + since + "); its noise is "
                        + Words.number(noise.noise())
                        + Words.unit(channel.unit().symbol())
                        + ". Its rows are held out, and no cause is told of anything else until it moves: check lead, display hold, converter";
            case SATURATED ->
                channel.name() + " is saturated at " + value + CurrentLoop.note(channel, last)
                        + ". Its rows are held out: lower the load or widen the range";
            case OUTSIDE ->
                channel.name() + " reads " + value + ", outside its measuring interval ["
                        + Words.number(channel.interval().lower()) + ", "
                        + Words.number(channel.interval().upper())
                        + "]. Its rows are held out: make the rig safe, then check range and wiring";
            case SILENT ->
                String.format(
                        Locale.ROOT,
                        "%s is silent: no value for %s while others arrive: check its lead and its field of the line",
                        channel.name(),
                        since);
        };
    }

    /** Why rows that depend on this channel are not to be used now, or null. */
    @Nullable
    String objection() {
        Status now = status != Status.GOOD ? status : candidate;
        return now == Status.GOOD || now == Status.SILENT ? null : channel.name() + " " + now.word();
    }

    /** When the present trouble began, in s. */
    double troubleSince() {
        return onset().time();
    }

    /** Whether identical values have come in a row that may yet turn out to be a stuck channel. */
    boolean unresolved() {
        return noise.telling() && run >= DELAY && run * Math.log(noise.repeats()) < Math.log(SUSPICIOUS);
    }

    /** As the screen says it: good, doubtful, stuck, saturated, outside, silent. */
    String word() {
        return (status == Status.GOOD && (candidate != Status.GOOD || unresolved())) ? "doubtful" : status.word();
    }

    /** A warning that its resolution hides its noise, or null; a channel that somebody sets may stand still. */
    @Nullable
    String coarse() {
        return channel.adjustable() || !noise.coarse()
                ? null
                : channel.name() + ": its noise is below 0.3 of its step of " + Words.number(noise.step())
                        + Words.unit(channel.unit().symbol())
                        + ", so averaging helps little; declare u_other of at least "
                        + Words.number(noise.step() / Math.sqrt(12));
    }

    ChannelNoise noise() {
        return noise;
    }
}
