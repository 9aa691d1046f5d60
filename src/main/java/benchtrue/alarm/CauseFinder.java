package benchtrue.alarm;

import benchtrue.estimate.Quantiles;
import java.util.ArrayList;
import java.util.List;

/**
 * Which cause the evidence is for, and whether it may be named. It is provisional until it leads the next by more than 10
 * (then it was right in all but one or two of two hundred), and while a change of several unknowns at once explains much more
 * than it does.
 */
final class CauseFinder {
    static final double LEAD = 10;
    /** Beyond the 99.9 % point of χ² with three degrees of freedom, for the search over onsets: by so much several unknowns together must explain more than one. */
    private static final double TOGETHER = 20;
    /**
     * Of ℓ, for an interval of the onset at 95 %: where the time of a change is sought, 2·ln of the likelihood at the best time
     * exceeds that at the true one by more than x with a chance of 1 − (1 − e^(−x/2))² (Siegmund 1988).
     */
    private static final double INTERVAL = 7.35;

    /** What the leader leaves unexplained may favour the wrong one by as much: this share of it is asked for as well. */
    private static final double MISFIT = 0.25;

    private static final double SAME = 0.95;

    private final Bank bank;
    private final Review review;
    private final ReferenceWatch.Frozen frozen;
    private final double coverage;
    private final int q;
    private final double[] m;
    private final double[] g;

    CauseFinder(Bank bank, Review review, ReferenceWatch.Frozen frozen) {
        this.bank = bank;
        this.review = review;
        this.frozen = frozen;
        coverage = Quantiles.coverageFactor(frozen.nu());
        q = bank.regressors();
        m = new double[q * q];
        g = new double[q];
    }

    /** Largest ℓ of all causes. */
    double most() {
        double most = 0;
        for (int i = 0; i <= q; i++) {
            most = Math.max(most, bank.evidence(i).ratio);
        }
        return most;
    }

    int leader() {
        int leader = 0;
        for (int i = 1; i <= q; i++) {
            if (bank.evidence(i).ratio > bank.evidence(leader).ratio) {
                leader = i;
            }
        }
        return leader;
    }

    /** By how much the leader leads. */
    double ahead() {
        return lead(leader());
    }

    /** @param now in s */
    Cause find(double now) {
        int leader = leader();
        Evidence evidence = bank.evidence(leader);
        List<Integer> rivals = rivals(leader);
        double lead = lead(leader);
        boolean noise = leader == q;
        boolean together = !noise && review.together() - evidence.ratio > TOGETHER;
        double margin = noise ? 0 : MISFIT * Math.max(0, review.misfit() - evidence.ratio);
        review.date(leader, INTERVAL);
        Sums since = review.jointSince(evidence.onset, m, g);
        double count = since.count;
        double shift = frozen.sd() * since.errors / since.roots;
        double shiftU = coverage * frozen.sd() * Math.sqrt(count) / since.roots;
        if (evidence.ramp) {
            // over its last third a ramp is much like a step
            review.jointSince(now - (now - evidence.onset) / 3, m, g);
        }
        boolean gain = !noise && gain(leader);
        return new Cause(
                leader,
                evidence.ramp,
                evidence.ratio,
                lead,
                lead > LEAD + margin && !together,
                rivals,
                tellable(leader, rivals),
                together,
                gain,
                new Finding.Onset(evidence.onset, review.from(), review.to(), evidence.onsetReading),
                noise ? Math.sqrt(evidence.score) : delta(evidence, now),
                noise ? Math.sqrt(evidence.score) : frozen.sd() * delta(evidence, now),
                noise ? coverage * Math.sqrt(evidence.score / (2 * count)) : frozen.sd() * spread(evidence, now),
                shift,
                shiftU);
    }

    /** Change now in units of s: of a ramp as far as it has come. */
    private static double delta(Evidence evidence, double now) {
        return evidence.score / evidence.information * (evidence.ramp ? now - evidence.onset : 1);
    }

    private double spread(Evidence evidence, double now) {
        return coverage / Math.sqrt(evidence.information) * (evidence.ramp ? now - evidence.onset : 1);
    }

    private List<Integer> rivals(int leader) {
        List<Integer> rivals = new ArrayList<>(List.of(leader));
        for (int i = 0; i <= q; i++) {
            if (i != leader && bank.evidence(i).ratio >= bank.evidence(leader).ratio - LEAD) {
                rivals.add(i);
            }
        }
        return List.copyOf(rivals);
    }

    /** Whether the regressors of the rivals are no more than 95 % the same; on M and g as they stand. */
    private boolean tellable(int leader, List<Integer> rivals) {
        if (leader == q) {
            return true;
        }
        for (int i : rivals) {
            boolean unknown = i != leader && i < q;
            double common = unknown ? m[leader * q + i] : 0;
            if (unknown && common * common > SAME * m[leader * q + leader] * m[i * q + i]) {
                return false;
            }
        }
        return true;
    }

    private double lead(int leader) {
        double next = 0;
        for (int i = 0; i <= q; i++) {
            next = i == leader ? next : Math.max(next, bank.evidence(i).ratio);
        }
        return bank.evidence(leader).ratio - next;
    }

    /** Whether δ = ε·θₐ, the same factor for all, does better than the leader; on M and g as they stand. */
    private boolean gain(int leader) {
        double score = 0;
        double information = 0;
        int p = frozen.values().length;
        for (int i = 0; i < p; i++) {
            score += frozen.values()[i] * g[i];
            for (int j = 0; j < p; j++) {
                information += frozen.values()[i] * m[i * q + j] * frozen.values()[j];
            }
        }
        double one = g[leader] * g[leader] / m[leader * q + leader];
        return p > 1 && score * score / information > one + LEAD;
    }
}
