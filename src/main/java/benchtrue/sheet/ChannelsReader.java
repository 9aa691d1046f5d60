package benchtrue.sheet;

import benchtrue.model.Expression;
import benchtrue.model.Interval;
import benchtrue.model.Scope;
import benchtrue.model.Unit;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import org.jspecify.annotations.Nullable;

/** Channels, constants and derived channels: all that an equation can speak of. */
final class ChannelsReader {
    private static final Interval UNBOUNDED = new Interval(Double.NEGATIVE_INFINITY, Double.POSITIVE_INFINITY);

    private final SheetText text;
    private final List<Channel> channels = new ArrayList<>();
    private final List<Derived> derived = new ArrayList<>();
    private final Map<String, Unit> units = new HashMap<>();
    private Scope scope = Scope.EMPTY;

    ChannelsReader(Keys sheet) {
        text = sheet.sheet();
        Keys table = sheet.table("channels", "[channels]");
        if (table == null) {
            text.mistake(
                    1, 1, "the sheet has no [channels]", "add [channels] with a line for each: p = { unit = \"bar\" }");
            return;
        }
        Keys constants = sheet.table("constants", "[constants]");
        names(table);
        if (constants != null) {
            constants(constants);
        }
        for (String name : table.all()) {
            Keys one = table.table(name, "channel " + name);
            if (one != null && units.containsKey(name)) {
                one.has("unit");
                channels.add(channel(name, one));
            }
        }
        Keys more = sheet.table("derived", "[derived]");
        if (more != null) {
            derived(more);
        }
    }

    List<Channel> channels() {
        return channels;
    }

    List<Derived> derived() {
        return derived;
    }

    Scope scope() {
        return scope;
    }

    /** The names come first, so that a correction can use constants and know its own channel. */
    private void names(Keys table) {
        for (String name : table.all()) {
            Keys one = table.table(name, "channel " + name);
            if (one != null && allowed(table, name)) {
                Unit unit = one.unit("unit");
                units.put(name, unit);
                scope = scope.withChannel(name, unit, one.size("resolution", Double.NaN, false));
            }
        }
        if (table.all().isEmpty()) {
            text.mistake(1, 1, "[channels] is empty", "add a line for each channel: p = { unit = \"bar\" }");
        }
    }

    private boolean allowed(Keys table, String name) {
        String refusal = scope.refusal(name);
        if (refusal != null) {
            table.mistake(name, "name \"" + name + "\" " + refusal, "choose another name");
        }
        return refusal == null;
    }

    private Channel channel(String name, Keys keys) {
        Interval interval = keys.interval("interval");
        Interval operate = keys.interval("operate");
        boolean adjustable = keys.truth("adjustable");
        if (operate != null && !adjustable) {
            keys.mistake(
                    "operate",
                    "channel " + name + " has operating limits but is not adjustable",
                    "add adjustable = true");
        }
        Channel channel = new Channel(
                name,
                units.getOrDefault(name, Unit.ONE),
                interval == null ? UNBOUNDED : interval,
                keys.number("resolution", Double.NaN),
                keys.size("noise", Double.NaN, true),
                keys.size("u_other", 0, true),
                keys.truth("current_loop"),
                adjustable,
                operate,
                correction(name, keys),
                keys.date("due"));
        keys.done();
        return channel;
    }

    private @Nullable Expression correction(String name, Keys keys) {
        String correction = keys.text("correction");
        if (correction == null) {
            return null;
        }
        var parsed = Expression.parseCorrection(correction, scope, name);
        text.problems(keys.place("correction"), correction, parsed.problems());
        return parsed.value();
    }

    private void constants(Keys table) {
        for (String name : table.all()) {
            Keys one = table.table(name, "constant " + name);
            if (one == null || !allowed(table, name)) {
                continue;
            }
            if (!one.has("value")) {
                table.mistake(
                        name,
                        "constant " + name + " has no value",
                        "write it as " + name + " = { value = 1, unit = \"A\" }");
            }
            scope = scope.withConstant(name, one.number("value", Double.NaN), one.unit("unit"));
            one.done();
        }
    }

    private void derived(Keys table) {
        for (String name : table.all()) {
            String expression = table.needed(name, "\"I^2*R0\"");
            if (expression.isEmpty() || !allowed(table, name)) {
                continue;
            }
            var parsed = Expression.parse(expression, scope);
            text.problems(table.place(name), expression, parsed.problems());
            text.notices(table.place(name), expression, parsed.notices());
            Expression value = parsed.value();
            if (value != null) {
                derived.add(new Derived(name, value));
                scope = scope.withDerived(name, value);
            }
        }
    }
}
