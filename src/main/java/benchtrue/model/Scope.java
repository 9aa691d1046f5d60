package benchtrue.model;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;
import org.jspecify.annotations.Nullable;

/** The names that a sheet gives: what an expression can speak of. Immutable; each {@code with…} is a larger scope. */
public final class Scope {
    public static final Scope EMPTY = new Scope(Map.of(), 0);

    /** What a name stands for. */
    sealed interface Meaning {
        Unit unit();
    }

    /**
     * @param index in {@link Observation#values}
     * @param resolution smallest step; 0 where it is not known
     * @param sources real channels that it is made of
     */
    record Value(Unit unit, int index, double resolution, Set<Integer> sources) implements Meaning {}

    record Constant(Unit unit, double value) implements Meaning {}

    private final Map<String, Meaning> meanings;
    private final int values;

    private Scope(Map<String, Meaning> meanings, int values) {
        this.meanings = meanings;
        this.values = values;
    }

    /**
     * The next channel of the line.
     *
     * @param resolution NaN or 0 where it is not declared
     */
    public Scope withChannel(String name, Unit unit, double resolution) {
        return with(name, new Value(unit, values, resolution > 0 ? resolution : 0, Set.of(values)), 1);
    }

    /** The next derived channel; all channels of the line come before the first of these. */
    public Scope withDerived(String name, Expression expression) {
        return with(name, new Value(expression.unit(), values, 0, expression.sources()), 1);
    }

    public Scope withConstant(String name, double value, Unit unit) {
        return with(name, new Constant(unit, value), 0);
    }

    private Scope with(String name, Meaning meaning, int added) {
        String refusal = refusal(name);
        if (refusal != null) {
            throw new IllegalArgumentException("name \"" + name + "\": " + refusal);
        }
        Map<String, Meaning> more = new LinkedHashMap<>(meanings);
        more.put(name, meaning);
        return new Scope(more, values + added);
    }

    /** Why the name cannot be given; null where it can. */
    public @Nullable String refusal(String name) {
        if (meanings.containsKey(name)) {
            return "stands for something else already";
        }
        return isName(name) ? reserved(name) : "is no name: letters, digits and _ only, a letter first";
    }

    /** Whether an expression can speak of it: a letter or {@code _}, then letters, digits, {@code _}, lowered digits. */
    public static boolean isName(String text) {
        return !text.isEmpty()
                && Lexer.isNameStart(text.codePointAt(0))
                && text.codePoints().allMatch(Lexer::isNamePart)
                && text.chars().noneMatch(c -> "%‰°℃℉".indexOf(c) >= 0);
    }

    private static @Nullable String reserved(String name) {
        boolean reserved = name.equals(Function.TIME) || Function.named(name) != null;
        return reserved ? "is a function of equations" : null;
    }

    /** The scope of a correction: {@code x} is the channel's indication; the constants stay. */
    Scope ofCorrection(String channel) {
        Map<String, Meaning> names = new LinkedHashMap<>();
        names.put("x", meanings.getOrDefault(channel, new Constant(Unit.ONE, Double.NaN)));
        meanings.forEach((name, meaning) -> {
            if (meaning instanceof Constant) {
                names.putIfAbsent(name, meaning);
            }
        });
        return new Scope(names, values);
    }

    /** The same with every value as the plain number that it is in its unit. */
    Scope ofPlainNumbers() {
        Map<String, Meaning> plain = new LinkedHashMap<>();
        meanings.forEach((name, meaning) -> plain.put(name, plain(meaning)));
        return new Scope(plain, values);
    }

    private static Meaning plain(Meaning meaning) {
        if (meaning instanceof Value value) {
            return new Value(Unit.ONE, value.index, value.resolution, value.sources);
        }
        return new Constant(Unit.ONE, ((Constant) meaning).value);
    }

    @Nullable
    Meaning find(String name) {
        return meanings.get(name);
    }

    boolean has(String name) {
        return meanings.containsKey(name);
    }

    List<String> names() {
        return new ArrayList<>(meanings.keySet());
    }
}
