package benchtrue.estimate;

import benchtrue.model.Interval;
import java.util.ArrayList;
import java.util.List;
import java.util.function.Predicate;

/**
 * An operating point that advice may name.
 *
 * @param words how people read it: {@code n = 2400 rev/min, dp = 30 bar}
 * @param rows regressors of each relation there, p each
 * @param weights weight of each relation's reading, its relation's weight included
 */
public record CandidatePoint(String words, List<double[]> rows, double[] weights) {
    /** Grid of the box: a term's optimum lies at an end or, of a curved one, inside. */
    private static final int[] LEVELS_FOR = {1, 9, 5, 5, 3, 3};

    private static final int HALVINGS = 20;

    /** M = Σwφφᵀ of one reading of all relations, p×p. */
    double[] information() {
        int p = rows.get(0).length;
        double[] m = new double[p * p];
        for (int k = 0; k < weights.length; k++) {
            double[] phi = rows.get(k);
            for (int i = 0; i < p; i++) {
                for (int j = 0; j < p; j++) {
                    m[i * p + j] += weights[k] * phi[i] * phi[j];
                }
            }
        }
        return m;
    }

    /**
     * Settings inside the box that obey the joint limits: a grid of it, points on the joint limits where grid points lie
     * beyond, and the planned points.
     *
     * @param box the declared limits of operation of each adjustable channel, finite
     * @param allowed whether settings obey the joint limits
     * @param inside settings that do, towards which others are moved
     * @param planned further points; those outside are left out
     */
    public static List<double[]> settings(
            List<Interval> box, Predicate<double[]> allowed, double[] inside, List<double[]> planned) {
        List<double[]> settings = new ArrayList<>();
        for (double[] point : planned) {
            if (within(box, point) && allowed.test(point)) {
                settings.add(point.clone());
            }
        }
        if (!within(box, inside) || !allowed.test(inside)) {
            return settings;
        }
        for (double[] point : grid(box, inside)) {
            settings.add(allowed.test(point) ? point : towards(point, inside, allowed));
        }
        return settings;
    }

    private static boolean within(List<Interval> box, double[] point) {
        for (int j = 0; j < point.length; j++) {
            if (!box.get(j).contains(point[j])) {
                return false;
            }
        }
        return true;
    }

    private static List<double[]> grid(List<Interval> box, double[] inside) {
        int channels = box.size();
        if (channels >= LEVELS_FOR.length) {
            return ends(box, inside);
        }
        int levels = LEVELS_FOR[channels];
        List<double[]> grid = new ArrayList<>();
        int points = (int) Math.pow(levels, channels);
        for (int code = 0; code < points; code++) {
            double[] point = new double[channels];
            int rest = code;
            for (int j = 0; j < channels; j++) {
                point[j] = box.get(j).lower() + box.get(j).width() * (rest % levels) / (levels - 1);
                rest /= levels;
            }
            grid.add(point);
        }
        return grid;
    }

    /** Of many channels: each alone to its ends, and all together. */
    private static List<double[]> ends(List<Interval> box, double[] inside) {
        List<double[]> ends = new ArrayList<>();
        double[] low = new double[box.size()];
        double[] high = new double[box.size()];
        for (int j = 0; j < box.size(); j++) {
            low[j] = box.get(j).lower();
            high[j] = box.get(j).upper();
            for (double end : new double[] {low[j], high[j]}) {
                double[] point = inside.clone();
                point[j] = end;
                ends.add(point);
            }
        }
        ends.add(low);
        ends.add(high);
        return ends;
    }

    /** The farthest allowed point on the way from one inside to one beyond. */
    private static double[] towards(double[] beyond, double[] inside, Predicate<double[]> allowed) {
        double[] good = inside.clone();
        double share = 0;
        double step = 0.5;
        for (int halving = 0; halving < HALVINGS; halving++, step /= 2) {
            double[] trial = new double[inside.length];
            for (int j = 0; j < trial.length; j++) {
                trial[j] = inside[j] + (share + step) * (beyond[j] - inside[j]);
            }
            if (allowed.test(trial)) {
                good = trial;
                share += step;
            }
        }
        return good;
    }
}
