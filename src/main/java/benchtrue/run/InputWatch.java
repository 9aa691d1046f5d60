package benchtrue.run;

import benchtrue.estimate.Estimator;
import benchtrue.estimate.InputNoise;
import benchtrue.model.Forgetting;
import benchtrue.model.Memory;

/** Whether what tells one group's unknowns from each other is more than the declared noise of the channels; kept reading by reading. */
final class InputWatch {
    private final Systematic noise;
    private final int group;
    private final int unknowns;
    private InputNoise inputs;
    private double pendingAge = 1;

    /** @param noise rows with each channel moved by its noise, filled for each reading before its rows */
    InputWatch(Systematic noise, int group, int unknowns) {
        this.noise = noise;
        this.group = group;
        this.unknowns = unknowns;
        inputs = new InputNoise(unknowns);
    }

    void restart() {
        inputs = new InputNoise(unknowns);
    }

    void next(Forgetting forgetting, double elapsed) {
        pendingAge = forgetting.memory().factor(elapsed, true);
        if (forgetting.memory() instanceof Memory.Seconds) {
            age();
        }
    }

    private void age() {
        if (pendingAge < 1) {
            inputs.age(pendingAge);
            pendingAge = 1;
        }
    }

    /** Takes in the row of the present reading, which is used. */
    void use(int relation, Row row, double weight) {
        age();
        for (int c = 0; c < noise.size(); c++) {
            Row moved = noise.row(c, group, relation);
            if (moved.present && inputs.add(row.phi, row.response, moved.phi, moved.response, weight)) {
                noise.felt(c);
            }
        }
    }

    boolean onlyNoise(int unknown, Estimator estimator, double[] estimates) {
        if (noise.size() == 0 || !estimator.determined()) {
            return false;
        }
        double[] inverse = new double[unknowns * unknowns];
        estimator.unscaledCovariance(inverse);
        return inputs.on(unknown, inverse, estimates, Double.NaN).onlyNoise();
    }
}
