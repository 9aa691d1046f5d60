package benchtrue.sheet;

import benchtrue.model.Relation;
import java.math.BigDecimal;
import java.time.Instant;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import org.jspecify.annotations.Nullable;

/** What the simulated rig does. */
final class RehearsalReader {
    private static final double STEPS_IN_NOISE = 50;
    private static final BigDecimal DEFAULT_STEP = new BigDecimal("0.000001");
    private static final double MOST_READINGS = 1e9;

    private final Keys keys;
    private final List<Channel> channels;
    private final List<String> names;
    private final List<Relation> relations;
    private final List<Derived> derived;

    private RehearsalReader(Keys keys, List<Channel> channels, List<Derived> derived, List<Relation> relations) {
        this.keys = keys;
        this.channels = channels;
        names = channels.stream().map(Channel::name).toList();
        this.derived = derived;
        this.relations = relations;
    }

    /** Null where the sheet has no [rehearsal], or one with mistakes. */
    static @Nullable Rehearsal read(Keys sheet, ChannelsReader channels, RelationsReader relations) {
        Keys keys = sheet.table("rehearsal", "[rehearsal]");
        if (keys == null || channels.channels().isEmpty()) {
            return null;
        }
        return new RehearsalReader(keys, channels.channels(), channels.derived(), relations.relations()).read();
    }

    private @Nullable Rehearsal read() {
        long seed = (long) keys.number("seed", 1);
        double rate = above0("rate", keys.size("rate", Double.NaN, false), "5");
        double duration = above0("duration", keys.seconds("duration", Double.NaN), "\"600 s\"");
        Instant start = start();
        Map<String, Course> truth = truth();
        List<Rehearsal.Instrument> instruments = instruments();
        List<Fault> faults = new ArrayList<>();
        for (Keys one : keys.tables("faults")) {
            Fault fault = new FaultReader(names, one).read();
            if (fault != null) {
                faults.add(fault);
            }
        }
        keys.done();
        if (rate * duration > MOST_READINGS) {
            keys.mistake(
                    "duration", "that would be more than a billion readings", "shorten the duration or lower the rate");
        }
        return keys.sheet().isSound() ? new Rehearsal(seed, rate, duration, start, truth, instruments, faults) : null;
    }

    private double above0(String key, double value, String example) {
        if (!keys.has(key)) {
            keys.needed(key, example);
        } else if (value == 0) {
            keys.mistake(key, key + " must be above 0", "write it as " + key + " = " + example);
        }
        return value;
    }

    private @Nullable Instant start() {
        Instant start = keys.instant("start");
        if (start == null && keys.has("start")) {
            keys.mistake(
                    "start",
                    "start must be a date with its time, without quotes",
                    "write start = 2027-03-01T08:00:00Z");
        }
        return start;
    }

    private Map<String, Course> truth() {
        Map<String, Course> truth = new HashMap<>();
        Keys table = keys.table("truth", "[rehearsal.truth]");
        if (table == null) {
            keys.needed("truth", "{ R = 1.87 }, the true value of each unknown in its unit");
            return truth;
        }
        CourseReader courses = new CourseReader(List.of());
        for (Relation relation : relations) {
            for (Relation.Unknown unknown : relation.unknowns()) {
                String name = unknown.name();
                Course course = courses.read(table, name, "the truth of " + name);
                if (course != null) {
                    truth.put(name, course);
                } else if (!table.has(name)) {
                    keys.mistake(
                            "truth",
                            "the truth of " + name + " is not given",
                            "add " + name + " = its true value in " + unknown.unit());
                }
            }
        }
        table.done();
        return truth;
    }

    private List<Rehearsal.Instrument> instruments() {
        Keys table = keys.table("channels", "[rehearsal.channels]");
        List<Rehearsal.Instrument> instruments = new ArrayList<>();
        for (Channel channel : channels) {
            instruments.add(table == null ? indicating(channel, null) : instrument(channel, table));
        }
        for (int channel = 0; channel < channels.size(); channel++) {
            checkSource(table == null ? keys : table, channel, instruments);
        }
        if (table != null) {
            table.done();
        }
        checkResponses(instruments);
        return instruments;
    }

    private Rehearsal.Instrument instrument(Channel channel, Keys table) {
        String name = channel.name();
        if (!table.hasTable(name)) {
            return indicating(channel, new CourseReader(List.of()).read(table, name, name));
        }
        Keys one = table.table(name, "channel " + name + " of [rehearsal.channels]");
        if (one == null) {
            return indicating(channel, null);
        }
        Course course = new CourseReader(names).read(one);
        double noise = one.size("noise", declared(channel.noise()), true);
        double correlation = one.size("correlation", 0, true);
        if (correlation >= 1) {
            one.mistake(
                    "correlation",
                    "the correlation of neighbouring readings is below 1",
                    "write it as correlation = 0.8");
            correlation = 0;
        }
        double resolution = one.size("resolution", channel.resolution(), false);
        double lag = one.seconds("lag", 0);
        one.done();
        return new Rehearsal.Instrument(course, lag, noise, correlation, step(resolution, noise));
    }

    private static Rehearsal.Instrument indicating(Channel channel, @Nullable Course course) {
        double noise = declared(channel.noise());
        return new Rehearsal.Instrument(course, 0, noise, 0, step(channel.resolution(), noise));
    }

    private static double declared(double noise) {
        return noise > 0 ? noise : 0;
    }

    /** The resolution; where there is none, a decimal step that the noise hides. */
    private static BigDecimal step(double resolution, double noise) {
        if (resolution > 0) {
            return BigDecimal.valueOf(resolution).stripTrailingZeros();
        }
        return noise > 0
                ? BigDecimal.ONE.scaleByPowerOfTen((int) Math.floor(Math.log10(noise / STEPS_IN_NOISE)))
                : DEFAULT_STEP;
    }

    private void checkResponses(List<Rehearsal.Instrument> instruments) {
        for (Relation relation : relations) {
            int channel = names.indexOf(relation.responseText());
            boolean made = channel >= 0 && instruments.get(channel).course() == null;
            if (made && SelfReference.isIn(relation, channel, names.size(), derived)) {
                keys.mistake(
                        "channels",
                        relation.text() + " computes its response from itself, which a rehearsal cannot",
                        "give " + names.get(channel) + " a course of its own");
            }
        }
    }

    /** A channel has a course, or a relation whose response it is; a course follows a channel that follows none. */
    private void checkSource(Keys table, int channel, List<Rehearsal.Instrument> instruments) {
        String name = names.get(channel);
        Course course = instruments.get(channel).course();
        boolean response = relations.stream().anyMatch(r -> r.responseText().equals(name));
        if (course == null && !response) {
            table.mistake(
                    table.has(name) ? name : "channels",
                    "nothing says what channel " + name
                            + " measures: it has no course and is the response of no relation",
                    "give it one in [rehearsal.channels], as " + name + " = { stairs = [1, 2, 3], dwell = \"20 s\" }");
        }
        boolean chained = course instanceof Course.Following following
                && (following.channel() == channel
                        || instruments.get(following.channel()).course() instanceof Course.Following
                        || instruments.get(following.channel()).course() == null);
        if (chained) {
            table.mistake(
                    name,
                    "channel " + name + " follows a channel that has no course of its own",
                    "follow one that has");
        }
    }
}
