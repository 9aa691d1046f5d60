package benchtrue.sheet;

import benchtrue.model.Combination;
import benchtrue.model.DecisionRule;
import benchtrue.model.Expression;
import benchtrue.model.Scope;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.jspecify.annotations.Nullable;

/** What a sheet says beyond its channels and relations: results, limits of operation, points, exclusions, reference, alarms, verdict. */
final class RestReader {
    private static final double HOURS_OF_A_SHIFT = 8;
    private static final Pattern RATE = Pattern.compile("\\s*([0-9]*\\.?[0-9]+)\\s+per\\s+(.+)");

    private final Keys sheet;
    private final SheetText text;
    private final Scope scope;

    RestReader(Keys sheet, Scope scope) {
        this.sheet = sheet;
        text = sheet.sheet();
        this.scope = scope;
    }

    List<Result> results(RelationsReader relations, List<Group> groups) {
        List<Result> results = new ArrayList<>();
        for (Keys keys : sheet.tables("results")) {
            String name = keys.needed("name", "\"flow at the rated point\"");
            String expression = keys.needed("expression", "\"2*R + V0/I0\"");
            var unit = keys.optionalUnit("unit");
            var limits = keys.interval("limits");
            keys.done();
            if (expression.isEmpty()) {
                continue;
            }
            var parsed = Combination.parse(expression, scope, relations.units(), unit, relations.responseUnits());
            text.problems(keys.place("expression"), expression, parsed.problems());
            text.notices(keys.place("expression"), expression, parsed.notices());
            Combination combination = parsed.value();
            int group = combination == null ? -1 : groupOf(combination, groups);
            if (combination == null) {
                continue;
            }
            if (group < 0) {
                keys.mistake(
                        "expression",
                        "the unknowns of a result must be estimated together",
                        "combine unknowns of one relation, or of relations that share an unknown");
                continue;
            }
            results.add(new Result(
                    name,
                    expression,
                    combination.unit(),
                    group,
                    combination.constant(),
                    coefficients(combination, groups.get(group)),
                    limits));
        }
        return results;
    }

    private static int groupOf(Combination combination, List<Group> groups) {
        for (int g = 0; g < groups.size(); g++) {
            List<String> names =
                    groups.get(g).unknowns().stream().map(UnknownSpec::name).toList();
            if (names.containsAll(combination.coefficients().keySet())) {
                return g;
            }
        }
        return -1;
    }

    private static double[] coefficients(Combination combination, Group group) {
        return group.unknowns().stream()
                .mapToDouble(u -> combination.coefficients().getOrDefault(u.name(), 0.0))
                .toArray();
    }

    List<Joint> joint() {
        List<Joint> joint = new ArrayList<>();
        Keys operate = sheet.table("operate", "[operate]");
        if (operate != null) {
            for (String limit : operate.texts("joint")) {
                var parsed = Expression.parseLimit(limit, scope);
                text.problems(operate.place("joint"), limit, parsed.problems());
                Expression excess = parsed.value();
                if (excess != null) {
                    joint.add(new Joint(limit, excess));
                }
            }
            operate.done();
        }
        return joint;
    }

    List<Point> points(List<Channel> channels) {
        List<Point> points = new ArrayList<>();
        for (Keys keys : sheet.tables("points")) {
            Keys set = keys.table("set", "set");
            double[] values = new double[channels.size()];
            Arrays.fill(values, Double.NaN);
            if (set == null) {
                keys.mistake("dwell", "a planned point sets no channel", "add set = { p = 4 } with your own channels");
            } else {
                for (int i = 0; i < values.length; i++) {
                    values[i] = set.number(channels.get(i).name(), Double.NaN);
                }
                set.done();
            }
            points.add(new Point(values, keys.seconds("dwell", 0)));
            keys.done();
        }
        return points;
    }

    List<Exclusion> exclusions() {
        List<Exclusion> exclusions = new ArrayList<>();
        for (Keys keys : sheet.tables("exclude")) {
            boolean dated = keys.has("from") && keys.instant("from") != null;
            double from = dated ? epoch(keys.instant("from")) : keys.seconds("from", Double.NaN);
            double to = dated ? epoch(keys.instant("to")) : keys.seconds("to", Double.NaN);
            String reason = keys.needed("reason", "\"coupling reseated\"");
            keys.done();
            if (!keys.has("from") || !keys.has("to")) {
                keys.mistake(
                        "reason",
                        "an exclusion needs from and to",
                        "add from = 712.0 and to = 730.0 in seconds, or two dates with times");
            } else if (from < to) {
                exclusions.add(new Exclusion(from, to, dated, reason));
            } else {
                keys.mistake(
                        "to",
                        "the exclusion ends before it begins",
                        "give from and to in the same form, from before to");
            }
        }
        return exclusions;
    }

    private static double epoch(@Nullable Instant instant) {
        return instant == null ? Double.NaN : instant.getEpochSecond() + instant.getNano() * 1e-9;
    }

    ReferenceSpec reference(List<Group> groups) {
        Keys keys = sheet.table("reference", "[reference]");
        if (keys == null) {
            return new ReferenceSpec(0, null, List.of());
        }
        boolean given = keys.has("from") || keys.has("values");
        double after = keys.seconds("after", given ? Double.POSITIVE_INFINITY : 0);
        String from = keys.text("from");
        Keys values = keys.table("values", "values");
        double[] covariance = keys.numbers("covariance");
        double sd = keys.size("residual", Double.NaN, false);
        double nu = keys.size("degrees_of_freedom", Double.POSITIVE_INFINITY, false);
        keys.done();
        List<ReferenceSpec.Typed> typed = new ArrayList<>();
        if (values != null) {
            ReferenceSpec.Typed one = typed(keys, values, covariance, sd, nu, groups);
            if (one != null) {
                typed.add(one);
            }
        }
        return new ReferenceSpec(after, from, typed);
    }

    private ReferenceSpec.@Nullable Typed typed(
            Keys keys, Keys values, double @Nullable [] covariance, double sd, double nu, List<Group> groups) {
        List<String> names = List.copyOf(values.all());
        for (int g = 0; g < groups.size(); g++) {
            List<String> own =
                    groups.get(g).unknowns().stream().map(UnknownSpec::name).toList();
            if (own.containsAll(names) && names.containsAll(own)) {
                int p = own.size();
                if (covariance == null || covariance.length != p * p) {
                    keys.mistake(
                            "covariance",
                            "the covariance must have " + p + " rows of " + p + " numbers",
                            "in the order of values");
                    return null;
                }
                if (Double.isNaN(sd)) {
                    keys.mistake(
                            "values", "a typed reference needs its residual standard deviation", "add residual = 0.06");
                    return null;
                }
                return reordered(g, own, names, values, covariance, sd, nu);
            }
        }
        keys.mistake(
                "values",
                "the values name other unknowns than the relations",
                "give one for each unknown of a relation");
        return null;
    }

    private static ReferenceSpec.Typed reordered(
            int group, List<String> own, List<String> names, Keys values, double[] covariance, double sd, double nu) {
        int p = own.size();
        double[] ordered = new double[p];
        double[] matrix = new double[p * p];
        for (int i = 0; i < p; i++) {
            int from = names.indexOf(own.get(i));
            ordered[i] = values.number(own.get(i), Double.NaN);
            for (int j = 0; j < p; j++) {
                matrix[i * p + j] = covariance[from * p + names.indexOf(own.get(j))];
            }
        }
        return new ReferenceSpec.Typed(group, ordered, matrix, sd, nu);
    }

    Alarms alarms() {
        double usual = 1 / Durations.seconds(HOURS_OF_A_SHIFT + " h");
        Keys keys = sheet.table("alarms", "[alarms]");
        if (keys == null) {
            return new Alarms(usual);
        }
        String rate = keys.text("false_alarms");
        keys.done();
        if (rate == null) {
            return new Alarms(usual);
        }
        Matcher matcher = RATE.matcher(rate);
        double per = matcher.matches() ? Durations.seconds(matcher.group(2)) : Double.NaN;
        double perSecond = matcher.matches() ? Double.parseDouble(matcher.group(1)) / per : Double.NaN;
        if (!(perSecond > 0) || Double.isInfinite(perSecond)) {
            keys.mistake("false_alarms", "\"" + rate + "\" is no rate of false alarms", "write it as \"1 per 8 h\"");
            return new Alarms(usual);
        }
        return new Alarms(perSecond);
    }

    @Nullable
    DecisionRule rule() {
        Keys keys = sheet.table("verdict", "[verdict]");
        if (keys == null) {
            return null;
        }
        List<String> words =
                Arrays.stream(DecisionRule.values()).map(DecisionRule::word).toList();
        String word = keys.word("rule", "", words);
        keys.done();
        return Arrays.stream(DecisionRule.values())
                .filter(r -> r.word().equals(word))
                .findFirst()
                .orElse(null);
    }
}
