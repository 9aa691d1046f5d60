package benchtrue.estimate;

import benchtrue.model.Interval;
import java.util.Arrays;
import java.util.List;
import org.jspecify.annotations.Nullable;

/**
 * One unknown over several runs, oldest first: how neighbours agree, whether there is a trend and when it would reach a limit,
 * and which runs stand apart from the others.
 *
 * @param agreement E_n of each run with the one before (ISO 13528, ISO/IEC 17043): their difference over √(U² + U²); beyond 1
 *     they do not agree. NaN for the first run and where an uncertainty is not known
 * @param trend null with fewer than three runs, or where all have the same time
 * @param outlier whether a run departs from the line through the others; all false with fewer than four runs
 * @param reaches when the trend would reach a limit; null where there is no limit ahead or the trend may be none
 */
public record RunComparison(
        double[] agreement,
        @Nullable Trend trend,
        boolean[] outlier,
        @Nullable Reach reaches) {

    private static final int FEWEST_FOR_TREND = 3;
    private static final int FEWEST_FOR_OUTLIERS = 4;
    /** Chance that any of the runs is called an outlier though none is. */
    private static final double CHANCE = 0.05;

    /**
     * What a run said of the unknown.
     *
     * @param time of the run, in any unit that is the same for all
     * @param value of the unknown, in its unit
     * @param standardUncertainty without what the runs share: an error common to all neither parts them nor makes a trend
     * @param degreesOfFreedom of that uncertainty, may be infinite
     */
    public record RunValue(double time, double value, double standardUncertainty, double degreesOfFreedom) {
        double expanded() {
            return Quantiles.coverageFactor(degreesOfFreedom) * standardUncertainty;
        }
    }

    /**
     * A straight line through the values, each weighted by 1/u².
     *
     * @param time at which {@code level} is the line's value: the weighted mean of the times
     * @param slope in the unknown's unit for each unit of time
     * @param slopeU expanded uncertainty of the slope; where the values scatter more than their uncertainties say, by their
     *     scatter
     * @param scatter √(χ²/(n − 2)): about 1 where the runs scatter as much as their uncertainties say
     */
    public record Trend(double time, double level, double slope, double slopeU, double scatter) {
        /** Whether the slope is more than its uncertainty. */
        public boolean isClear() {
            return Math.abs(slope) > slopeU;
        }

        public double at(double when) {
            return level + slope * (when - time);
        }
    }

    /**
     * @param limit that is reached first
     * @param time at which the line reaches it; with the steepest and the flattest slope that its uncertainty allows from the
     *     last run on, between {@code earliest} and {@code latest}
     */
    public record Reach(double limit, double time, double earliest, double latest) {}

    /**
     * @param runs oldest first; those without a known uncertainty above 0 take no part in trend and outliers
     * @param limits of the unknown; null: none
     */
    public static RunComparison of(List<RunValue> runs, @Nullable Interval limits) {
        int n = runs.size();
        double[] agreement = new double[n];
        Arrays.fill(agreement, Double.NaN);
        for (int i = 1; i < n; i++) {
            agreement[i] = agreement(runs.get(i - 1), runs.get(i));
        }
        Trend trend = trend(runs, -1);
        double last = n == 0 ? Double.NaN : runs.get(n - 1).time();
        Reach reach = trend == null || limits == null ? null : reach(trend, limits, last);
        return new RunComparison(agreement, trend, outliers(runs), reach);
    }

    /** E_n of two results without shared errors. */
    static double agreement(RunValue earlier, RunValue later) {
        return (later.value() - earlier.value()) / Math.hypot(earlier.expanded(), later.expanded());
    }

    private static boolean usable(RunValue run) {
        return run.standardUncertainty() > 0
                && run.standardUncertainty() < Double.POSITIVE_INFINITY
                && Math.abs(run.value()) < Double.POSITIVE_INFINITY;
    }

    private static @Nullable Trend trend(List<RunValue> runs, int without) {
        Line line = Line.through(runs, without);
        if (line.count < FEWEST_FOR_TREND || !(line.spread() > 0)) {
            return null;
        }
        double scatter = Math.sqrt(line.chiSquared(runs, without) / (line.count - 2));
        double nu = line.count - 2;
        double coverage = scatter > 1
                ? scatter * Quantiles.coverageFactor(nu)
                : Quantiles.coverageFactor(Double.POSITIVE_INFINITY);
        return new Trend(line.meanTime(), line.mean(), line.slope(), coverage / Math.sqrt(line.spread()), scatter);
    }

    private static @Nullable Reach reach(Trend trend, Interval limits, double last) {
        if (!trend.isClear()) {
            return null;
        }
        double limit = trend.slope() > 0 ? limits.upper() : limits.lower();
        double left = (limit - trend.at(last)) / trend.slope();
        if (!(left >= 0) || Double.isInfinite(left)) {
            return null;
        }
        double steep = Math.abs(trend.slope()) + trend.slopeU();
        double flat = Math.abs(trend.slope()) - trend.slopeU();
        double distance = Math.abs(limit - trend.at(last));
        return new Reach(limit, last + left, last + distance / steep, last + distance / flat);
    }

    private static boolean[] outliers(List<RunValue> runs) {
        boolean[] outlier = new boolean[runs.size()];
        long usable = runs.stream().filter(RunComparison::usable).count();
        for (int i = 0; i < outlier.length && usable >= FEWEST_FOR_OUTLIERS; i++) {
            Trend others = trend(runs, i);
            if (usable(runs.get(i)) && others != null) {
                outlier[i] = departs(runs.get(i), others, Line.through(runs, i), usable);
            }
        }
        return outlier;
    }

    /** Whether a run is further from the line through the others than it and the line are uncertain. */
    private static boolean departs(RunValue run, Trend others, Line line, long runs) {
        double away = run.time() - line.meanTime();
        double lineVariance = 1 / line.weights + away * away / line.spread();
        double widening = Math.max(1, others.scatter());
        double u = Math.hypot(run.standardUncertainty(), Math.sqrt(lineVariance)) * widening;
        double nu = others.scatter() > 1 ? runs - 3.0 : Double.POSITIVE_INFINITY;
        return Math.abs(run.value() - others.at(run.time())) > Quantiles.student(CHANCE / (2 * runs), nu) * u;
    }

    /** Weighted sums about a first value, so that large times and values lose no digits. */
    private static final class Line {
        private final double timeOrigin;
        private final double valueOrigin;
        private int count;
        private double weights;
        private double sumT;
        private double sumY;
        private double sumTt;
        private double sumTy;

        private Line(double timeOrigin, double valueOrigin) {
            this.timeOrigin = timeOrigin;
            this.valueOrigin = valueOrigin;
        }

        static Line through(List<RunValue> runs, int without) {
            Line line = runs.isEmpty()
                    ? new Line(0, 0)
                    : new Line(runs.get(0).time(), runs.get(0).value());
            for (int i = 0; i < runs.size(); i++) {
                if (i != without && usable(runs.get(i))) {
                    line.add(runs.get(i));
                }
            }
            return line;
        }

        private void add(RunValue run) {
            double w = 1 / (run.standardUncertainty() * run.standardUncertainty());
            double t = run.time() - timeOrigin;
            double y = run.value() - valueOrigin;
            count++;
            weights += w;
            sumT += w * t;
            sumY += w * y;
            sumTt += w * t * t;
            sumTy += w * t * y;
        }

        double spread() {
            double spread = sumTt - sumT * sumT / weights;
            return spread > 1e-12 * sumTt ? spread : 0;
        }

        double meanTime() {
            return timeOrigin + sumT / weights;
        }

        double mean() {
            return valueOrigin + sumY / weights;
        }

        double slope() {
            return (sumTy - sumT * sumY / weights) / spread();
        }

        double chiSquared(List<RunValue> runs, int without) {
            double sum = 0;
            for (int i = 0; i < runs.size(); i++) {
                RunValue run = runs.get(i);
                if (i != without && usable(run)) {
                    double off =
                            (run.value() - mean() - slope() * (run.time() - meanTime())) / run.standardUncertainty();
                    sum += off * off;
                }
            }
            return sum;
        }
    }
}
