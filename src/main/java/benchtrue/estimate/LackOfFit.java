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
 * the settings; while there are few different settings a cell is a single one, and each time the room is full the grid is
 * made twice as coarse. Memory is bounded.
 */
public final class LackOfFit {
    private static final int MOST_GROUPS = 64;
    private static final int FINEST = 20;
    private static final double ALARMING = 0.05;

    private final int settings;
    private final double[] lowest;
    private final double[] highest;
    private final double[] width;
    private Map<List<Long>, Group> groups = new HashMap<>();
    private int fineness = FINEST;
    private @Nullable Group last;
    private long n;

    /** What was seen at one setting. */
    private static final class Group {
        final double[] sums;
        long count;
        double residuals;
        double squares;
        long visits;

        Group(int settings) {
            sums = new double[settings];
        }

        void add(Group other) {
            for (int j = 0; j < sums.length; j++) {
                sums[j] += other.sums[j];
            }
            count += other.count;
            residuals += other.residuals;
            squares += other.squares;
            visits += other.visits;
        }
    }

    /** @param settings how many numbers make a setting */
    public LackOfFit(int settings) {
        this.settings = settings;
        lowest = new double[settings];
        highest = new double[settings];
        width = new double[settings];
        Arrays.fill(lowest, Double.POSITIVE_INFINITY);
        Arrays.fill(highest, Double.NEGATIVE_INFINITY);
    }

    /**
     * @param setting what the response depends on: values or regressors, with the direction where it matters; read
     * @param residual multiplied by √w
     */
    public void add(double[] setting, double residual) {
        for (int j = 0; j < settings; j++) {
            lowest[j] = Math.min(lowest[j], setting[j]);
            highest[j] = Math.max(highest[j], setting[j]);
        }
        Group group = groups.computeIfAbsent(key(setting), k -> new Group(settings));
        for (int j = 0; j < settings; j++) {
            group.sums[j] += setting[j];
        }
        group.count++;
        group.residuals += residual;
        group.squares += residual * residual;
        if (group != last) {
            group.visits++;
            last = group;
        }
        n++;
        while (groups.size() > MOST_GROUPS) {
            coarsen();
        }
    }

    private List<Long> key(double[] setting) {
        List<Long> key = new ArrayList<>(settings);
        for (int j = 0; j < settings; j++) {
            // While every setting may have a group of its own, equal means equal.
            key.add(width[j] > 0 ? Math.round(setting[j] / width[j]) : Double.doubleToLongBits(setting[j] + 0.0));
        }
        return key;
    }

    private void coarsen() {
        fineness--;
        for (int j = 0; j < settings; j++) {
            width[j] = (highest[j] - lowest[j]) * Math.scalb(1.0, -fineness);
        }
        Map<List<Long>, Group> coarser = new HashMap<>();
        for (Group group : groups.values()) {
            double[] mean = group.sums.clone();
            for (int j = 0; j < settings; j++) {
                mean[j] /= group.count;
            }
            coarser.computeIfAbsent(key(mean), k -> new Group(settings)).add(group);
        }
        groups = coarser;
        last = null;
    }

    /**
     * @param f mean square of the lack of fit over that of the pure error
     * @param levels groups of equal settings
     * @param revisited how many of them were left and come back to
     */
    public record Outcome(double f, double above, double below, double pValue, int levels, int revisited) {
        public boolean lacks() {
            return pValue < ALARMING;
        }

        public String sentence() {
            return String.format(
                    Locale.ROOT,
                    "Lack of fit over %d levels, %d of them revisited: F = %.4g (5 %% limit %.3g)%s",
                    levels,
                    revisited,
                    f,
                    Quantiles.fisher(ALARMING, above, below),
                    lacks() ? ": the equation does not describe these readings to within their scatter." : ".");
        }
    }

    /**
     * @param inflation variance of a mean of residuals over that of independent ones, at least 1: F is divided by it
     * @return null where no level was revisited or no degree of freedom is left
     */
    public @Nullable Outcome judge(int unknowns, double inflation) {
        double between = 0;
        double within = 0;
        int revisited = 0;
        for (Group group : groups.values()) {
            double mean = group.residuals / group.count;
            between += group.count * mean * mean;
            within += group.squares - group.residuals * mean;
            revisited += group.visits > 1 ? 1 : 0;
        }
        double above = groups.size() - (double) unknowns;
        double below = n - (double) groups.size();
        if (revisited == 0 || !(above > 0) || !(below > 0) || !(within > 0)) {
            return null;
        }
        double f = between / above / (within / below) / inflation;
        double effective = Math.max(1, below / inflation);
        return new Outcome(f, above, effective, Quantiles.fisherTail(f, above, effective), groups.size(), revisited);
    }
}
