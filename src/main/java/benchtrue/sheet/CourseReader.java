package benchtrue.sheet;

import java.util.List;
import org.jspecify.annotations.Nullable;

/** Courses of a rehearsal: a number that stays, or a table with one of the kinds. */
final class CourseReader {
    private static final List<String> KINDS =
            List.of("value", "steps", "ramps", "stairs", "sine", "triangle", "follows");

    private final List<String> channels;

    /** @param channels names that a course may follow; empty where it may follow none */
    CourseReader(List<String> channels) {
        this.channels = channels;
    }

    /** The course of an unknown or the whole entry of a channel, where that is a plain number. */
    @Nullable
    Course read(Keys table, String name, String called) {
        if (!table.hasTable(name)) {
            return table.has(name) ? new Course.Constant(table.number(name, 0)) : null;
        }
        Keys keys = table.table(name, called);
        Course course = keys == null ? null : read(keys);
        if (keys != null) {
            keys.done();
        }
        return course;
    }

    /** Null where the table has no course, or with a mistake. */
    @Nullable
    Course read(Keys keys) {
        List<String> given = KINDS.stream().filter(keys::has).toList();
        if (given.size() > 1) {
            keys.mistake(
                    given.get(1),
                    keys.name() + " has two courses, " + given.get(0) + " and " + given.get(1),
                    "keep one");
            return null;
        }
        return given.isEmpty() ? null : read(given.get(0), keys);
    }

    private @Nullable Course read(String kind, Keys keys) {
        return switch (kind) {
            case "value" -> new Course.Constant(keys.number(kind, 0));
            case "steps", "ramps" -> points(kind, keys);
            case "stairs" -> stairs(keys);
            case "sine", "triangle" -> wave(kind, keys);
            default -> following(keys);
        };
    }

    private static @Nullable Course stairs(Keys keys) {
        double[] values = keys.numbers("stairs");
        double dwell = positive(keys, "dwell", "\"20 s\"");
        return values == null || !(dwell > 0) ? null : new Course.Stairs(values, dwell);
    }

    private static @Nullable Course points(String kind, Keys keys) {
        double[] flat = keys.numbers(kind);
        if (flat == null) {
            return null;
        }
        double[] times = new double[flat.length / 2];
        double[] values = new double[flat.length / 2];
        boolean rising = flat.length % 2 == 0;
        for (int i = 0; i < times.length; i++) {
            times[i] = flat[2 * i];
            values[i] = flat[2 * i + 1];
            rising &= i == 0 || times[i] > times[i - 1];
        }
        if (!rising) {
            keys.mistake(
                    kind, kind + " needs pairs of time and value, the times rising", "write [[0, 1.5], [60, 2.5]]");
            return null;
        }
        return kind.equals("steps") ? new Course.Steps(times, values) : new Course.Ramps(times, values);
    }

    private static @Nullable Course wave(String kind, Keys keys) {
        double[] two = keys.numbers(kind);
        double period = positive(keys, "period", "\"310 s\"");
        if (two == null || !(period > 0)) {
            return null;
        }
        if (two.length != 2) {
            String wanted = kind.equals("sine") ? "[mean, amplitude]" : "[low, high]";
            keys.mistake(kind, kind + " needs two numbers", "write " + kind + " = " + wanted);
            return null;
        }
        return kind.equals("sine")
                ? new Course.Sine(two[0], two[1], period)
                : new Course.Triangle(two[0], two[1], period);
    }

    /** A duration that must be there and above 0; NaN, with a mistake, where it is not. */
    private static double positive(Keys keys, String key, String example) {
        boolean given = keys.has(key);
        double seconds = keys.seconds(key, Double.NaN);
        if (!given) {
            keys.needed(key, example);
        } else if (seconds == 0) {
            keys.mistake(key, key + " must be above 0", "write it as " + key + " = " + example);
        }
        return seconds > 0 ? seconds : Double.NaN;
    }

    private @Nullable Course following(Keys keys) {
        String name = keys.text("follows", "");
        double gain = keys.number("gain", 1);
        double offset = keys.number("offset", 0);
        int channel = channels.indexOf(name);
        if (channel < 0) {
            keys.mistake("follows", "there is no channel " + name + " to follow", Nearest.remedy(name, channels));
            return null;
        }
        return new Course.Following(channel, gain, offset);
    }
}
