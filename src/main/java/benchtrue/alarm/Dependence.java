package benchtrue.alarm;

import benchtrue.sheet.BenchSheet;
import benchtrue.sheet.Channel;
import benchtrue.sheet.Derived;
import benchtrue.sheet.Group;
import benchtrue.sheet.RelationSpec;
import benchtrue.sheet.UnknownSpec;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Set;
import java.util.regex.Pattern;

/** Which channels a relation depends on, and which of them each unknown multiplies: read off the names in the equation. */
final class Dependence {
    private static final Pattern NOT_A_NAME = Pattern.compile("[^\\p{L}\\p{N}_]+");

    private final List<Channel> channels;
    private final List<Derived> derived;

    Dependence(BenchSheet sheet) {
        channels = sheet.channels();
        derived = sheet.derived();
    }

    List<Watched> watched(Group group) {
        return group.relations().stream().map(r -> watched(group, r)).toList();
    }

    private Watched watched(Group group, RelationSpec spec) {
        List<UnknownSpec> unknowns = Arrays.stream(spec.unknownIndex())
                .mapToObj(group.unknowns()::get)
                .toList();
        String text = spec.relation().text();
        return new Watched(
                spec.label(),
                spec.relation().responseUnit().symbol(),
                unknowns,
                spec.unknownIndex(),
                indices(channelsIn(text)),
                unknowns.stream().map(u -> factors(text, u.name())).toList(),
                spec.holdOutOutliers());
    }

    /** The channels in the terms that name the unknown. */
    private List<String> factors(String text, String unknown) {
        Set<String> found = new LinkedHashSet<>();
        for (String term : terms(text.substring(text.indexOf('=') + 1))) {
            if (names(term).contains(unknown)) {
                found.addAll(channelsIn(term));
            }
        }
        return List.copyOf(found);
    }

    /** The parts of a sum at the outermost level of its brackets. */
    private static List<String> terms(String sum) {
        List<String> terms = new ArrayList<>();
        int depth = 0;
        int from = 0;
        for (int i = 0; i < sum.length(); i++) {
            char c = sum.charAt(i);
            depth += c == '(' ? 1 : c == ')' ? -1 : 0;
            if (depth == 0 && (c == '+' || c == '-')) {
                terms.add(sum.substring(from, i));
                from = i + 1;
            }
        }
        terms.add(sum.substring(from));
        return terms;
    }

    /** The channels that a text names, with those behind a derived one, in the order of the text. */
    private Set<String> channelsIn(String text) {
        Set<String> found = new LinkedHashSet<>();
        for (String name : names(text)) {
            channels.stream().filter(c -> c.name().equals(name)).forEach(c -> found.add(name));
            derived.stream()
                    .filter(d -> d.name().equals(name))
                    .forEach(d -> found.addAll(channelsIn(d.expression().text())));
        }
        return found;
    }

    private static List<String> names(String text) {
        return Arrays.asList(NOT_A_NAME.split(text));
    }

    private int[] indices(Set<String> names) {
        return names.stream().mapToInt(this::index).toArray();
    }

    private int index(String name) {
        for (int i = 0; i < channels.size(); i++) {
            if (channels.get(i).name().equals(name)) {
                return i;
            }
        }
        throw new IllegalArgumentException("no channel " + name);
    }
}
