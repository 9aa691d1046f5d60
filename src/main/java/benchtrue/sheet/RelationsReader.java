package benchtrue.sheet;

import benchtrue.model.Expression;
import benchtrue.model.Forgetting;
import benchtrue.model.Memory;
import benchtrue.model.Relation;
import benchtrue.model.Scope;
import benchtrue.model.Unit;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.jspecify.annotations.Nullable;

/** The relations with their unknowns, gathered into groups that share unknowns. */
final class RelationsReader {
    private static final Memory DEFAULT_MEMORY = new Memory.All();

    /** One relation as it was read, before it is known which others share its unknowns. */
    private record Read(Keys keys, Relation relation, String label, boolean holdOut, Forgetting forgetting) {}

    private final SheetText text;
    private final Scope scope;
    private final List<Read> relations = new ArrayList<>();
    private final Map<String, UnknownSpec> unknowns = new LinkedHashMap<>();
    private final Map<String, Unit> units = new LinkedHashMap<>();

    RelationsReader(Keys sheet, Scope scope) {
        text = sheet.sheet();
        this.scope = scope;
        List<Keys> tables = sheet.tables("relations");
        if (tables.isEmpty()) {
            text.mistake(
                    1,
                    1,
                    "the sheet has no relation",
                    "add [[relations]] with equation = \"V = R*I + V0\" and your own names");
        }
        Map<String, Integer> counts = new HashMap<>();
        for (Keys table : tables) {
            relation(table, counts);
        }
    }

    private void relation(Keys keys, Map<String, Integer> counts) {
        String equation = keys.needed("equation", "\"V = R*I + V0\"");
        Keys declared = keys.table("unknowns", "[relations.unknowns]");
        if (declared != null) {
            declaredUnits(declared);
        }
        Expression weight = weight(keys);
        Forgetting forgetting = forgetting(keys);
        boolean holdOut =
                keys.word("outliers", "hold out", List.of("hold out", "use")).equals("hold out");
        keys.done();
        if (equation.isEmpty()) {
            return;
        }
        var parsed = Relation.parse(equation, scope, units, weight);
        text.problems(keys.place("equation"), equation, parsed.problems());
        text.notices(keys.place("equation"), equation, parsed.notices());
        Relation relation = parsed.value();
        if (relation == null) {
            return;
        }
        int count = counts.merge(relation.responseText(), 1, Integer::sum);
        String label = count == 1 ? relation.responseText() : relation.responseText() + "#" + count;
        relations.add(new Read(keys, relation, label, holdOut, forgetting));
        for (Relation.Unknown unknown : relation.unknowns()) {
            units.putIfAbsent(unknown.name(), unknown.unit());
            unknowns.putIfAbsent(unknown.name(), plain(unknown));
        }
        if (declared != null) {
            settings(declared, relation);
        }
    }

    private static UnknownSpec plain(Relation.Unknown unknown) {
        return new UnknownSpec(unknown.name(), unknown.unit(), unknown.constantTerm(), null, Double.NaN, null, 0);
    }

    private void declaredUnits(Keys declared) {
        for (String name : declared.all()) {
            Keys one = declared.table(name, "unknown " + name);
            Unit unit = one == null ? null : one.optionalUnit("unit");
            if (one != null && unit != null) {
                Unit before = units.putIfAbsent(name, unit);
                if (before != null && !before.equals(unit)) {
                    one.mistake("unit", name + " has the unit " + before + " already", "give one unit to " + name);
                }
            }
        }
    }

    private void settings(Keys declared, Relation relation) {
        for (String name : declared.all()) {
            Keys one = declared.table(name, "unknown " + name);
            UnknownSpec spec = unknowns.get(name);
            if (one == null) {
                continue;
            }
            boolean known = relation.unknowns().stream().anyMatch(u -> u.name().equals(name));
            if (spec == null || !known) {
                declared.mistake(
                        name,
                        "the equation has no unknown " + name,
                        Nearest.remedy(
                                name,
                                relation.unknowns().stream()
                                        .map(Relation.Unknown::name)
                                        .toList()));
                continue;
            }
            one.has("unit");
            unknowns.put(
                    name,
                    new UnknownSpec(
                            name,
                            spec.unit(),
                            spec.constantTerm(),
                            one.has("plausible") ? one.interval("plausible") : spec.plausible(),
                            one.size("wanted", spec.wanted(), false),
                            one.has("limits") ? one.interval("limits") : spec.limits(),
                            one.size("u_other", spec.otherUncertainty(), true)));
            one.done();
        }
    }

    private @Nullable Expression weight(Keys keys) {
        String weight = keys.text("weight");
        if (weight == null) {
            return null;
        }
        var parsed = Expression.parse(weight, scope);
        text.problems(keys.place("weight"), weight, parsed.problems());
        return parsed.value();
    }

    private Forgetting forgetting(Keys keys) {
        String kind = keys.word("forgetting", "exponential", List.of("exponential", "directional"));
        return new Forgetting(
                kind.equals("directional") ? Forgetting.Kind.DIRECTIONAL : Forgetting.Kind.EXPONENTIAL, memory(keys));
    }

    private Memory memory(Keys keys) {
        String words = keys.text("memory");
        double factor = keys.number("factor", Double.NaN);
        if (words != null && !Double.isNaN(factor)) {
            keys.mistake(
                    "factor",
                    "both memory and factor are given",
                    "keep one of them: factor = 1 - 1/N is a memory of N readings");
        }
        if (words != null) {
            Memory memory = MemoryText.parse(words);
            if (memory == null) {
                keys.mistake(
                        "memory",
                        "\"" + words + "\" is no memory",
                        "write \"120 s\", \"600 readings\" (more than 1) or \"all\"");
            }
            return memory == null ? DEFAULT_MEMORY : memory;
        }
        if (Double.isNaN(factor)) {
            return DEFAULT_MEMORY;
        }
        Memory memory = MemoryText.ofFactor(factor);
        if (memory == null) {
            keys.mistake(
                    "factor",
                    "factor " + factor + " is not above 0 and at most 1",
                    "write factor = 0.995, or 1 to forget nothing");
        }
        return memory == null ? DEFAULT_MEMORY : memory;
    }

    /** In the order of the file. */
    List<Relation> relations() {
        return relations.stream().map(Read::relation).toList();
    }

    /** Names and units of all unknowns. */
    Map<String, Unit> units() {
        Map<String, Unit> known = new LinkedHashMap<>();
        unknowns.forEach((name, spec) -> known.put(name, spec.unit()));
        return known;
    }

    /** Units of the responses, in order. */
    List<Unit> responseUnits() {
        return relations.stream().map(r -> r.relation().responseUnit()).toList();
    }

    /** Relations that share an unknown, directly or through others, in the order of the file. */
    List<Group> groups() {
        int[] leader = new int[relations.size()];
        for (int i = 0; i < leader.length; i++) {
            leader[i] = i;
            for (int j = 0; j < i; j++) {
                if (share(i, j)) {
                    merge(leader, leader[j], leader[i]);
                }
            }
        }
        List<Group> groups = new ArrayList<>();
        for (int first = 0; first < leader.length; first++) {
            List<Read> members = new ArrayList<>();
            for (int i = 0; i < leader.length; i++) {
                if (leader[i] == first) {
                    members.add(relations.get(i));
                }
            }
            if (!members.isEmpty()) {
                groups.add(group(members));
            }
        }
        return groups;
    }

    private boolean share(int i, int j) {
        return relations.get(i).relation().unknowns().stream()
                .anyMatch(u -> relations.get(j).relation().unknowns().stream()
                        .anyMatch(v -> v.name().equals(u.name())));
    }

    private static void merge(int[] leader, int a, int b) {
        int first = Math.min(a, b);
        int other = Math.max(a, b);
        for (int i = 0; i < leader.length; i++) {
            leader[i] = leader[i] == other ? first : leader[i];
        }
    }

    private Group group(List<Read> members) {
        Forgetting forgetting = members.get(0).forgetting();
        List<String> names = new ArrayList<>();
        for (Read member : members) {
            if (!member.forgetting().equals(forgetting)) {
                member.keys()
                        .mistake(
                                member.keys().has("memory") ? "memory" : "equation",
                                "relations that share an unknown must have the same memory and forgetting",
                                "give both the same");
            }
            member.relation().unknowns().stream()
                    .map(Relation.Unknown::name)
                    .filter(n -> !names.contains(n))
                    .forEach(names::add);
        }
        if (members.size() > 1 && forgetting.kind() == Forgetting.Kind.DIRECTIONAL) {
            members.get(0)
                    .keys()
                    .mistake(
                            "forgetting",
                            "directional forgetting takes relations that share no unknown with others",
                            "use exponential");
        }
        List<RelationSpec> specs = members.stream()
                .map(m -> new RelationSpec(
                        m.relation(),
                        m.label(),
                        m.holdOut(),
                        m.relation().unknowns().stream()
                                .mapToInt(u -> names.indexOf(u.name()))
                                .toArray()))
                .toList();
        List<UnknownSpec> own = new ArrayList<>();
        for (String name : names) {
            UnknownSpec spec = unknowns.get(name);
            if (spec != null) {
                own.add(spec);
            }
        }
        return new Group(specs, own, forgetting);
    }
}
