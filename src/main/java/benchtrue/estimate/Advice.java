package benchtrue.estimate;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;

/**
 * What to vary next, inside the declared limits of operation.
 *
 * @param steps in their order; empty where no candidate helps
 * @param expectedU U of the chosen unknown afterwards; NaN where only a direction could be given
 * @param readings of all steps
 * @param reaches whether the wanted U is reached by them
 */
public record Advice(List<Step> steps, double expectedU, long readings, boolean reaches) {
    /** Hold so many readings at a point. */
    public record Step(CandidatePoint at, long readings) {}

    private static final double MOST = 1e6;
    /** A round of the plan adds this share of what it has: a long plan costs no more than a short one. */
    private static final double GROWTH = 1.0 / 16;
    /** Points with a smaller share of the plan are left to the others. */
    private static final double SMALL = 0.03;
    /** Further readings past so many memories change nothing. */
    private static final double MEMORIES = 5;

    private static final Advice NONE = new Advice(List.of(), Double.NaN, 0, false);

    /**
     * Plans greedily: always the point that makes cᵀA⁻¹c smallest, which for one row is the one of the largest
     * (cᵀPφ)²/(1/w + φᵀPφ) (c-optimality; Fedorov 1972, Theory of Optimal Experiments; Sherman and Morrison 1950).
     *
     * @param wanted U to be reached
     */
    public static Advice plan(Prospect now, double wanted, List<CandidatePoint> candidates) {
        if (candidates.isEmpty()) {
            return NONE;
        }
        List<double[]> informations =
                candidates.stream().map(CandidatePoint::information).toList();
        Map<Integer, Long> held = new LinkedHashMap<>();
        double most = now.factor() < 1 ? Math.min(MOST, MEMORIES / (1 - now.factor())) : MOST;
        Prospect ahead = now;
        double total = 0;
        while (total < most && !(ahead.expanded() <= wanted)) {
            long readings = Math.max(1, (long) (GROWTH * total));
            int best = best(ahead, informations, readings);
            Prospect next = ahead.after(informations.get(best), (double) readings);
            while (readings > 1 && next.expanded() <= wanted) {
                readings /= 2;
                next = ahead.after(informations.get(best), (double) readings);
            }
            ahead = next;
            held.merge(best, readings, Long::sum);
            total += readings;
        }
        return total == 0 ? NONE : grouped(now, wanted, candidates, informations, held, (long) total);
    }

    private static int best(Prospect ahead, List<double[]> informations, long readings) {
        int best = 0;
        double least = Double.POSITIVE_INFINITY;
        for (int i = 0; i < informations.size(); i++) {
            double value = ahead.after(informations.get(i), (double) readings).quadratic();
            if (value < least * (1 - 1e-9)) {
                least = value;
                best = i;
            }
        }
        return best;
    }

    private static Advice grouped(
            Prospect now,
            double wanted,
            List<CandidatePoint> candidates,
            List<double[]> informations,
            Map<Integer, Long> held,
            long total) {
        held.values().removeIf(readings -> readings < SMALL * total);
        long kept = held.values().stream().mapToLong(Long::longValue).sum();
        List<Step> steps = new ArrayList<>();
        Prospect ahead = now;
        long readings = 0;
        for (Map.Entry<Integer, Long> each : held.entrySet()) {
            long share = (each.getValue() * total + kept - 1) / kept;
            steps.add(new Step(candidates.get(each.getKey()), share));
            ahead = ahead.after(informations.get(each.getKey()), (double) share);
            readings += share;
        }
        double expected = ahead.expanded();
        return new Advice(List.copyOf(steps), expected, readings, expected <= wanted * (1 + SMALL));
    }

    /**
     * While the unknowns are not determined: the point that moves most along the direction of which least is known.
     *
     * @param direction of the regressors, in their units, p
     * @param readings to hold there
     */
    public static Advice towards(double[] direction, List<CandidatePoint> candidates, long readings) {
        int p = direction.length;
        double[] scale = new double[p];
        for (CandidatePoint candidate : candidates) {
            for (double[] phi : candidate.rows()) {
                for (int j = 0; j < p; j++) {
                    scale[j] = Math.max(scale[j], Math.abs(phi[j]));
                }
            }
        }
        Advice advice = NONE;
        double most = 0;
        for (CandidatePoint candidate : candidates) {
            double along = 0;
            for (double[] phi : candidate.rows()) {
                double one = 0;
                for (int j = 0; j < p; j++) {
                    one += scale[j] > 0 ? direction[j] / scale[j] * (phi[j] / scale[j]) : 0;
                }
                along += one * one;
            }
            if (along > most * (1 + 1e-9)) {
                most = along;
                advice = new Advice(List.of(new Step(candidate, readings)), Double.NaN, readings, false);
            }
        }
        return advice;
    }

    /**
     * A line for each step.
     *
     * @param interval seconds between readings; NaN where it is not known
     */
    public List<String> words(double interval) {
        List<String> words = new ArrayList<>();
        for (Step step : steps) {
            String time =
                    Double.isNaN(interval) ? "" : String.format(Locale.ROOT, " (%.0f s)", step.readings * interval);
            words.add((words.isEmpty() ? "hold " : "then ") + step.readings + " readings" + time + " at "
                    + step.at.words());
        }
        return words;
    }
}
