package benchtrue.run;

import benchtrue.estimate.RunComparison;
import benchtrue.model.Interval;
import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.jspecify.annotations.Nullable;

/**
 * One unknown over several runs.
 *
 * @param values oldest first
 * @param dated whether all runs have a recorded start: then time counts in days from the first, else in runs from 0
 * @param limits of the last run that has some; null: none
 */
public record ComparedUnknown(
        String name,
        String unit,
        List<Value> values,
        boolean dated,
        @Nullable Interval limits,
        RunComparison comparison) {
    private static final double SECONDS_PER_DAY = 86_400;
    private static final String OWN = "readings";

    /**
     * What one run says.
     *
     * @param ownU standard uncertainty from its readings alone: what else is declared, the runs share
     */
    public record Value(String run, double time, Closing.Unknown unknown, double ownU, double ownDegreesOfFreedom) {}

    /** The unknowns that at least two of the runs determined, in the same unit; runs in the order of their start, else as given. */
    public static List<ComparedUnknown> of(List<Closing> closings) {
        boolean dated = closings.stream().allMatch(c -> c.startedUtc() != null);
        List<Closing> ordered = new ArrayList<>(closings);
        if (dated) {
            ordered.sort(Comparator.comparing(Closing::startedUtc, Comparator.nullsLast(Comparator.naturalOrder())));
        }
        Map<String, List<Value>> values = new LinkedHashMap<>();
        for (int i = 0; i < ordered.size(); i++) {
            Closing closing = ordered.get(i);
            double time = dated ? days(ordered.get(0).startedUtc(), closing.startedUtc()) : i;
            for (Closing.Relation relation : closing.relations()) {
                for (Closing.Unknown unknown : relation.unknowns()) {
                    add(values, closing.sourceName(), time, unknown);
                }
            }
        }
        return values.values().stream()
                .filter(v -> v.size() > 1)
                .map(v -> of(v, dated))
                .toList();
    }

    private static double days(@Nullable Instant first, @Nullable Instant start) {
        return first == null || start == null
                ? Double.NaN
                : Duration.between(first, start).toMillis() / 1000.0 / SECONDS_PER_DAY;
    }

    /** An unknown that stands in two relations of a run counts once. */
    private static void add(Map<String, List<Value>> values, String run, double time, Closing.Unknown unknown) {
        if (!unknown.determined()) {
            return;
        }
        List<Value> same = values.computeIfAbsent(unknown.name() + '\n' + unknown.unit(), k -> new ArrayList<>());
        if (same.stream().anyMatch(v -> v.run().equals(run) && v.time() == time)) {
            return;
        }
        Closing.Contribution own = unknown.budget().stream()
                .filter(c -> c.name().equals(OWN))
                .findFirst()
                .orElse(new Closing.Contribution(OWN, unknown.standardUncertainty(), unknown.degreesOfFreedom()));
        same.add(new Value(run, time, unknown, own.standardUncertainty(), own.degreesOfFreedom()));
    }

    private static ComparedUnknown of(List<Value> values, boolean dated) {
        Interval limits = null;
        for (Value value : values) {
            limits = value.unknown().limits() == null ? limits : value.unknown().limits();
        }
        List<RunComparison.RunValue> runs = values.stream()
                .map(v ->
                        new RunComparison.RunValue(v.time(), v.unknown().estimate(), v.ownU(), v.ownDegreesOfFreedom()))
                .toList();
        Closing.Unknown first = values.get(0).unknown();
        return new ComparedUnknown(
                first.name(), first.unit(), List.copyOf(values), dated, limits, RunComparison.of(runs, limits));
    }

    /** Whether a neighbour disagrees, a run stands apart, or a value lies outside its limits. */
    public boolean isFinding() {
        for (int i = 0; i < values.size(); i++) {
            double estimate = values.get(i).unknown().estimate();
            boolean outside = limits != null && !limits.contains(estimate);
            if (outside || comparison.outlier()[i] || Math.abs(comparison.agreement()[i]) > 1) {
                return true;
            }
        }
        return false;
    }
}
