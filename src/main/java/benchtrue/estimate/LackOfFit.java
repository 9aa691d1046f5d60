package benchtrue.estimate;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import org.jspecify.annotations.Nullable;

/**
 * Lack of fit against pure error (Draper and Smith 1998, Applied Regression Analysis, 2.1), over groups of equal settings that
 * were visited more than once. Residuals are grouped, not responses, so that settings which are only nearly equal may share a
 * group (near neighbours: Daniel and Wood 1980, Fitting Equations to Data, ch. 7; from memory). A group is a cell of a grid in
 * the settings, entered from the same side: hysteresis is lack of fit, not error. While there are few different settings a
 * cell is a single one, and each time the room is full the grid is made twice as coarse. Memory is bounded.
 */
public final class LackOfFit {
    private static final int MOST_GROUPS = 64;
    private static final int FINEST = 20;
    private static final double SUSPECT = 0.05;
    /** A sound run in twenty exceeds the 5 % limit: the equation is blamed past the 1 % limit only. */
    private static final double ALARMING = 0.01;

    /** Smaller autocorrelations are left alone (common practice, no source). */
    private static final double MATTERS = 0.1;

    private final int settings;
    private final double[] lowest;
    private final double[] highest;
    private final double[] width;
    private final long[] cell;
    private final long[] direction;
    private Map<List<Long>, Group> groups = new HashMap<>();
    private int fineness = FINEST;
    private boolean begun;
    private @Nullable Group last;
    private double lastResidual;
    private long n;

    /** What was seen at one setting. */
    private static final class Group {
        final double[] sums;
        final long[] entered;
        long count;
        double residuals;
        double squares;
        long visits;
        double steps;
        long stepCount;

        Group(int settings, long[] entered) {
            sums = new double[settings];
            this.entered = entered.clone();
        }

        void add(double[] setting, double residual) {
            for (int j = 0; j < sums.length; j++) {
                sums[j] += setting[j];
            }
            count++;
            residuals += residual;
            squares += residual * residual;
        }

        void add(Group other) {
            for (int j = 0; j < sums.length; j++) {
                sums[j] += other.sums[j];
            }
            count += other.count;
            residuals += other.residuals;
            squares += other.squares;
            visits += other.visits;
            steps += other.steps;
            stepCount += other.stepCount;
        }
    }

    /** @param settings how many numbers make a setting */
    public LackOfFit(int settings) {
        this.settings = settings;
        lowest = new double[settings];
        highest = new double[settings];
        width = new double[settings];
        cell = new long[settings];
        direction = new long[settings];
        Arrays.fill(lowest, Double.POSITIVE_INFINITY);
        Arrays.fill(highest, Double.NEGATIVE_INFINITY);
    }

    /**
     * @param setting what the response depends on: the regressors, or the channels behind them; read
     * @param residual multiplied by √w
     */
    public void add(double[] setting, double residual) {
        for (int j = 0; j < settings; j++) {
            lowest[j] = Math.min(lowest[j], setting[j]);
            highest[j] = Math.max(highest[j], setting[j]);
        }
        boolean moved = enter(setting);
        Group group = moved || last == null
                ? groups.computeIfAbsent(key(cell, direction), k -> new Group(settings, direction))
                : last;
        group.add(setting, residual);
        if (group == last) {
            group.steps += (residual - lastResidual) * (residual - lastResidual);
            group.stepCount++;
        } else {
            group.visits++;
        }
        last = group;
        lastResidual = residual;
        n++;
        while (groups.size() > MOST_GROUPS) {
            coarsen();
        }
    }

    /** Sets the present cell, and for each setting that changed the side from which it came; whether any did. */
    private boolean enter(double[] setting) {
        boolean moved = !begun;
        for (int j = 0; j < settings; j++) {
            long now = place(j, setting[j]);
            if (begun && now != cell[j]) {
                direction[j] = now > cell[j] ? 1 : -1;
            }
            moved |= now != cell[j];
            cell[j] = now;
        }
        begun = true;
        return moved;
    }

    /** While every setting may have a cell of its own, equal means equal; the place then keeps the order of the numbers. */
    private long place(int j, double setting) {
        if (width[j] > 0) {
            return Math.round(setting / width[j]);
        }
        long bits = Double.doubleToLongBits(setting + 0.0);
        return bits >= 0 ? bits : Long.MIN_VALUE - bits;
    }

    private static List<Long> key(long[] cell, long[] direction) {
        List<Long> key = new ArrayList<>(2 * cell.length);
        for (int j = 0; j < cell.length; j++) {
            key.add(cell[j]);
            key.add(direction[j]);
        }
        return key;
    }

    private void coarsen() {
        fineness--;
        for (int j = 0; j < settings; j++) {
            width[j] = (highest[j] - lowest[j]) * Math.scalb(1.0, -fineness);
        }
        Map<List<Long>, Group> coarser = new HashMap<>();
        long[] at = new long[settings];
        for (Group group : groups.values()) {
            for (int j = 0; j < settings; j++) {
                at[j] = place(j, group.sums[j] / group.count);
            }
            coarser.computeIfAbsent(key(at, group.entered), k -> new Group(settings, group.entered))
                    .add(group);
        }
        groups = coarser;
        last = null;
        begun = false;
    }

    /**
     * @param f mean square of the lack of fit over that of the pure error
     * @param levels groups of equal settings, entered from the same side
     * @param revisited how many settings were left and come back to, from whichever side
     */
    public record Outcome(double f, double above, double below, double pValue, int levels, int revisited) {
        public boolean lacks() {
            return pValue < ALARMING;
        }

        public String sentence() {
            return String.format(
                    Locale.ROOT,
                    "Lack of fit over %d levels, %d settings revisited: F = %.4g (limits: 5 %% %.3g, 1 %% %.3g)%s",
                    levels,
                    revisited,
                    f,
                    Quantiles.fisher(SUSPECT, above, below),
                    Quantiles.fisher(ALARMING, above, below),
                    lacks() ? ": the equation does not describe these readings to within their scatter." : ".");
        }
    }

    /** Null where no level was revisited or no degree of freedom is left. */
    public @Nullable Outcome judge(int unknowns) {
        double between = 0;
        double within = 0;
        double steps = 0;
        double stepCount = 0;
        for (Group group : groups.values()) {
            double mean = group.residuals / group.count;
            between += group.count * mean * mean;
            within += group.squares - group.residuals * mean;
            steps += group.steps;
            stepCount += group.stepCount;
        }
        int revisited = revisited();
        double above = groups.size() - (double) unknowns;
        double below = n - (double) groups.size();
        if (revisited == 0 || !(above > 0) || !(below > 0) || !(within > 0)) {
            return null;
        }
        double inflation = inflation(within / below, steps, stepCount);
        double f = between / above / (within / below) / inflation;
        double effective = Math.max(1, below / inflation);
        return new Outcome(f, above, effective, Quantiles.fisherTail(f, above, effective), groups.size(), revisited);
    }

    /** Cells that were left and come back to, from whichever side. */
    private int revisited() {
        Map<List<Long>, Long> visits = new HashMap<>();
        groups.forEach((key, group) -> {
            List<Long> cells = new ArrayList<>();
            for (int j = 0; j < key.size(); j += 2) {
                cells.add(key.get(j));
            }
            visits.merge(cells, group.visits, Long::sum);
        });
        return (int) visits.values().stream().filter(v -> v > 1).count();
    }

    /**
     * How much more the mean of neighbours scatters than that of independent errors, (1 + ρ)/(1 − ρ), ρ from the mean square
     * of successive differences within groups (von Neumann 1941): what the model lacks does not enter it.
     */
    private static double inflation(double variance, double steps, double stepCount) {
        double rho = Math.min(0.999, 1 - steps / stepCount / (2 * variance));
        return rho > Math.max(MATTERS, 2 / Math.sqrt(stepCount)) ? (1 + rho) / (1 - rho) : 1;
    }
}
