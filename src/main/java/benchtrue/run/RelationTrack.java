package benchtrue.run;

import benchtrue.estimate.Estimator;
import benchtrue.estimate.SteadyState;

/** What the last readings of one relation looked like: for the strip of innovations and for the word "settled". */
final class RelationTrack {
    private static final int STRIP = 240;

    private final Recent strip = new Recent(STRIP);
    private final Recent out = new Recent(STRIP);
    private final SteadyState steady = new SteadyState();
    private double innovation = Double.NaN;
    private double bound = Double.NaN;
    private double standardized = Double.NaN;

    /** The reading brought no row. */
    void nothing() {
        innovation = Double.NaN;
        bound = Double.NaN;
        standardized = Double.NaN;
    }

    /** @param testBound of |t|; NaN where it was not tested */
    void predicted(Estimator estimator, double testBound, boolean heldOut) {
        innovation = estimator.innovation();
        standardized = estimator.standardized();
        bound = testBound * estimator.predictionSd();
        strip.add(standardized);
        out.add(heldOut ? 1 : 0);
        if (!heldOut && Math.abs(standardized) <= Double.MAX_VALUE) {
            steady.add(standardized);
        }
    }

    void restart() {
        steady.restart();
    }

    boolean isSteady() {
        return steady.isSteady();
    }

    double innovation() {
        return innovation;
    }

    double bound() {
        return bound;
    }

    double standardized() {
        return standardized;
    }

    double[] strip() {
        return strip.copy();
    }

    boolean[] heldOut() {
        double[] values = out.copy();
        boolean[] held = new boolean[values.length];
        for (int i = 0; i < held.length; i++) {
            held[i] = values[i] > 0;
        }
        return held;
    }
}
