package benchtrue.estimate;

import java.util.List;

/** Which planned operating points the run has been at, and whether it came back to one. */
public final class PointVisits {
    private final double[][] points;
    private final double[] tolerance;
    private final int[] visits;
    private int last = -1;

    /**
     * @param points settings of each; NaN where a point leaves a channel free
     * @param tolerance within which a channel is at its setting
     */
    public PointVisits(List<double[]> points, double[] tolerance) {
        this.points = points.stream().map(double[]::clone).toArray(double[][]::new);
        this.tolerance = tolerance.clone();
        visits = new int[this.points.length];
    }

    /** A point is visited anew only after another one: noise about a setting is no return to it. */
    public void at(double[] values) {
        int now = -1;
        for (int i = 0; i < points.length && now < 0; i++) {
            now = isAt(points[i], values) ? i : -1;
        }
        if (now >= 0 && now != last) {
            visits[now]++;
            last = now;
        }
    }

    private boolean isAt(double[] point, double[] values) {
        for (int j = 0; j < point.length; j++) {
            if (!Double.isNaN(point[j]) && !(Math.abs(values[j] - point[j]) <= tolerance[j])) {
                return false;
            }
        }
        return true;
    }

    public int planned() {
        return points.length;
    }

    /** Whether the run has been at a point, by its place in the list. */
    public boolean isVisited(int point) {
        return visits[point] > 0;
    }

    public int visited() {
        int visited = 0;
        for (int each : visits) {
            visited += each > 0 ? 1 : 0;
        }
        return visited;
    }

    /** With a single planned point there is nothing to come back from. */
    public boolean revisited() {
        if (points.length == 1) {
            return visits[0] > 0;
        }
        for (int each : visits) {
            if (each > 1) {
                return true;
            }
        }
        return false;
    }
}
