package benchtrue.source;

import benchtrue.model.Conversion;
import benchtrue.model.Parsed;
import benchtrue.model.Unit;
import benchtrue.sheet.Channel;
import benchtrue.sheet.Dialect;
import benchtrue.sheet.LineSpec;
import java.nio.charset.Charset;
import java.nio.charset.StandardCharsets;
import java.util.HashMap;
import java.util.HashSet;
import java.util.Map;
import java.util.Set;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.jspecify.annotations.Nullable;

/** One field of a line as the value of a channel: plain numbers at once, odd ones by looking closer. */
final class FieldValue {
    /** A sign before or behind the digits, blanks between them, a unit behind. */
    private static final Pattern NUMBER =
            Pattern.compile("([+-]?)\\s*([0-9]*[0-9.,]*(?:[eE]\\s*[+-]?[0-9]+)?)\\s*([+-]?)\\s*(.*)", Pattern.DOTALL);

    private final Channel channel;
    private final char point;
    private final Dialect dialect;
    private final Charset charset;
    private final Set<String> missing;
    private final Map<String, Parsing> units = new HashMap<>();
    private String problem = "";

    /** What a unit in the line means. */
    private record Parsing(@Nullable Conversion conversion, String problem) {}

    FieldValue(Channel channel, LineSpec spec) {
        this.channel = channel;
        dialect = spec.dialect();
        point = spec.decimalComma() ? ',' : '.';
        charset = dialect.latin1() ? StandardCharsets.ISO_8859_1 : StandardCharsets.UTF_8;
        missing = new HashSet<>(dialect.missing());
        String overload = spec.words().get("overload");
        if (overload != null) {
            missing.add(overload);
        }
    }

    /**
     * In the unit of the channel.
     *
     * @return NaN where it is missing, or where {@link #problem()} says what is wrong
     */
    double of(byte[] bytes, int from, int to) {
        problem = "";
        double plain = Decimals.parse(bytes, from, to, point);
        return Double.isInfinite(plain) ? closely(bytes, from, to) : plain;
    }

    /** What is wrong with the last field; empty where nothing is. */
    String problem() {
        return problem;
    }

    private double closely(byte[] bytes, int from, int to) {
        String text = new String(bytes, from, to - from, charset).strip();
        if (missing.contains(text)) {
            return Double.NaN;
        }
        Matcher matcher = NUMBER.matcher(text.replace('\u2212', '-'));
        if (!matcher.matches()
                || matcher.group(2).isEmpty()
                || !(matcher.group(1).isEmpty() || matcher.group(3).isEmpty())) {
            return wrong(bytes, from, to, " is no number");
        }
        String digits = matcher.group(1) + matcher.group(3) + matcher.group(2).replaceAll("\\s", "");
        byte[] number = (dialect.grouping() ? digits.replace(point == ',' ? "." : ",", "") : digits)
                .getBytes(StandardCharsets.US_ASCII);
        double value = Decimals.parse(number, 0, number.length, point);
        if (Double.isInfinite(value)) {
            return wrong(bytes, from, to, " is no number");
        }
        return converted(value, matcher.group(4).strip());
    }

    private double converted(double value, String unit) {
        if (unit.isEmpty()) {
            return value;
        }
        Parsing parsing = units.computeIfAbsent(unit, this::parse);
        problem = parsing.problem();
        return parsing.conversion() == null
                ? (problem.isEmpty() ? value : Double.NaN)
                : parsing.conversion().apply(value);
    }

    private Parsing parse(String symbol) {
        if (symbol.equals(channel.unit().symbol())) {
            return new Parsing(null, "");
        }
        Parsed<Unit> parsed = Unit.parse(symbol);
        Unit unit = parsed.value();
        byte[] bytes = symbol.getBytes(StandardCharsets.UTF_8);
        String shown = '"' + CellText.shown(bytes, 0, bytes.length) + '"';
        if (unit == null) {
            return new Parsing(null, channel.name() + ": " + shown + " behind the number is no unit");
        }
        if (!unit.convertsTo(channel.unit())) {
            return new Parsing(
                    null,
                    channel.name() + ": the unit " + shown + " does not fit "
                            + channel.unit().symbol() + " of the sheet");
        }
        return new Parsing(unit.conversionTo(channel.unit()), "");
    }

    private double wrong(byte[] bytes, int from, int to, String what) {
        problem = channel.name() + ": \"" + CellText.shown(bytes, from, to) + '"' + what;
        return Double.NaN;
    }
}
