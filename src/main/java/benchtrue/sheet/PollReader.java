package benchtrue.sheet;

import benchtrue.sheet.PollSpec.NumberType;
import benchtrue.sheet.PollSpec.Register;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Set;
import org.jspecify.annotations.Nullable;

/** What is asked of polled instruments. */
final class PollReader {
    private static final double LONGEST_SECONDS = 86_400;
    private static final Set<String> PORT_KEYS = Set.of("port", "baud", "frame");
    private static final int LAST_ADDRESS = 247;
    private static final int LAST_REGISTER = 0xFFFF;
    private static final List<String> ORDERS = List.of("ABCD", "CDAB", "BADC", "DCBA");
    private static final Map<String, String> TERMINATORS = Map.of("LF", "\n", "CR", "\r", "CRLF", "\r\n");

    private final Keys keys;
    private final List<String> channels;
    private final @Nullable Keys asked;

    private PollReader(Keys keys, List<String> channels) {
        this.keys = keys;
        this.channels = channels;
        asked = keys.table("channels", "[poll.channels]");
    }

    /** Null where the sheet has no [poll]. */
    static @Nullable PollSpec read(Keys sheet, List<Channel> channels) {
        Keys keys = sheet.table("poll", "[poll]");
        if (keys == null || channels.isEmpty()) {
            return null;
        }
        PollSpec spec =
                new PollReader(keys, channels.stream().map(Channel::name).toList()).read();
        checkLine(sheet, spec != null && spec.asking() instanceof PollSpec.Modbus);
        return spec;
    }

    /** Of the keys of [line], only those of the port mean something. */
    private static void checkLine(Keys sheet, boolean modbus) {
        Keys line = sheet.table("line", "[line]");
        if (line == null) {
            sheet.mistake("poll", "[poll] needs a [line]", "add one with baud and frame as the instrument has them");
            return;
        }
        for (String key : line.all()) {
            if (!PORT_KEYS.contains(key)) {
                line.mistake(key, key + " of [line] is for lines, and with [poll] there are answers", "leave it out");
            }
        }
        if (modbus && line.text("frame", "8N1").startsWith("7")) {
            line.mistake(
                    "frame",
                    "Modbus RTU needs 8 data bits",
                    "write it as frame = \"8E1\", or as the instrument has it");
        }
    }

    private @Nullable PollSpec read() {
        String kind = neededWord(keys, "kind", List.of("scpi", "modbus"), "");
        if (kind.isEmpty()) {
            return null; // of the other keys it cannot be said whether they are right
        }
        boolean scpi = kind.equals("scpi");
        double period = duration("period", 1);
        double timeout = duration("timeout", scpi ? 2 : 0.5);
        PollSpec.Asking asking = scpi
                ? new PollSpec.Scpi(queries(), terminator(), errors())
                : new PollSpec.Modbus(registers(), keys.truth("single"));
        if (asked == null) {
            keys.mistake("kind", "[poll] does not say what is asked", "add a [poll.channels] with every channel");
        } else {
            asked.done();
        }
        keys.done();
        return new PollSpec(period, timeout, asking);
    }

    private double duration(String key, double absent) {
        double seconds = keys.seconds(key, absent);
        if (seconds == 0 || seconds > LONGEST_SECONDS) {
            keys.mistake(
                    key, key + " of [poll] must be above 0 and not above a day", "write it as " + key + " = \"1 s\"");
            return absent;
        }
        return seconds;
    }

    private String terminator() {
        String name = keys.word("terminator", "LF", List.of("LF", "CR", "CRLF"));
        return TERMINATORS.getOrDefault(name, "\n");
    }

    private @Nullable String errors() {
        return keys.has("errors") ? ScpiQuery.read(keys, "errors") : null;
    }

    /** What is written for a channel; null, with a mistake, where nothing is. */
    private @Nullable Keys of(String channel) {
        if (asked == null) {
            return null;
        }
        if (!asked.has(channel)) {
            keys.mistake(
                    "channels",
                    "[poll.channels] does not say how to ask for " + channel,
                    "add " + channel + " = { … } to it");
        }
        return asked.table(channel, channel + " in [poll.channels]");
    }

    private List<String> queries() {
        List<String> queries = new ArrayList<>();
        for (String channel : channels) {
            Keys one = of(channel);
            if (one != null) {
                queries.add(ScpiQuery.read(one, "query"));
                one.done();
            }
        }
        return queries;
    }

    private List<Register> registers() {
        List<Register> registers = new ArrayList<>();
        for (String channel : channels) {
            Keys one = of(channel);
            if (one != null) {
                registers.add(register(one));
                one.done();
            }
        }
        return registers;
    }

    private static Register register(Keys keys) {
        int address = whole(keys, "address", 1, LAST_ADDRESS, "see what the instrument is set to");
        int function = keys.has("function")
                ? whole(keys, "function", 3, 4, "3 reads holding registers, 4 input registers")
                : 3;
        NumberType type = type(keys);
        int register = whole(
                keys,
                "register",
                0,
                LAST_REGISTER - type.registers() + 1,
                "count from 0: what a manual calls 40108 is 107");
        double scale = keys.number("scale", 1);
        if (scale == 0 || Double.isInfinite(scale)) {
            keys.mistake("scale", "scale of " + keys.name() + " makes every value the same", "write it as scale = 0.1");
        }
        double[] missing = keys.numbers("missing");
        return new Register(
                address,
                function,
                register,
                type,
                order(keys, type),
                scale,
                missing == null ? List.of() : Arrays.stream(missing).boxed().toList());
    }

    private static NumberType type(Keys keys) {
        List<String> names = Arrays.stream(NumberType.values())
                .map(type -> type.name().toLowerCase(Locale.ROOT))
                .toList();
        return NumberType.valueOf(neededWord(keys, "type", names, "int16").toUpperCase(Locale.ROOT));
    }

    private static String order(Keys keys, NumberType type) {
        if (keys.has("order") && type.registers() == 1) {
            keys.mistake("order", "order of " + keys.name() + " is for values of two registers", "leave it out");
        }
        return keys.word("order", "ABCD", ORDERS);
    }

    /** {@code wrong}, with a mistake, where none of the words stands there. */
    private static String neededWord(Keys keys, String key, List<String> words, String wrong) {
        if (!keys.has(key)) {
            keys.needed(key, "\"" + String.join("\" or \"", words) + "\"");
        }
        return keys.word(key, wrong, words);
    }

    private static int whole(Keys keys, String key, int lowest, int highest, String remedy) {
        if (!keys.has(key)) {
            keys.needed(key, lowest + ": " + remedy);
            return lowest;
        }
        double number = keys.number(key, lowest);
        if (number != Math.rint(number) || number < lowest || number > highest) {
            String range = key + " of " + keys.name() + " must be a whole number from " + lowest + " to " + highest;
            keys.mistake(key, range, remedy);
            return lowest;
        }
        return (int) number;
    }
}
