package benchtrue.run;

import benchtrue.estimate.Estimator;
import benchtrue.model.Forgetting;
import java.util.List;

/** For each channel with other uncertainty an estimator of what that does to the live estimates, fed with the same weights. */
final class Shadows {
    private final Systematic systematic;
    private final int group;
    private final Estimator[] estimators;
    private final double[][] effects;
    private final int unknowns;

    Shadows(Systematic systematic, int group, boolean[] constant, Forgetting forgetting) {
        this.systematic = systematic;
        this.group = group;
        unknowns = constant.length;
        estimators = new Estimator[systematic.size()];
        effects = new double[estimators.length][unknowns];
        for (int c = 0; c < estimators.length; c++) {
            estimators[c] = new Estimator(constant, 1, forgetting);
        }
    }

    void next(double elapsed) {
        for (Estimator estimator : estimators) {
            estimator.next(elapsed);
        }
    }

    /** @param estimates before the row; while one is not known the row is not taken in */
    void use(int relation, Row row, double[] estimates, Estimator main) {
        for (int c = 0; c < estimators.length; c++) {
            double shift = systematic.shift(c, group, relation, row, estimates);
            if (!Double.isNaN(shift)) {
                estimators[c].predict(0, row.phi, shift, row.weight * main.relationWeight(relation));
                estimators[c].use();
                refresh(c);
            }
        }
    }

    void restart() {
        for (Estimator estimator : estimators) {
            estimator.restart();
        }
    }

    void forget(Forgetting forgetting) {
        for (Estimator estimator : estimators) {
            estimator.forget(forgetting);
        }
    }

    /** Adds the declared uncertainties in quadrature to those of the readings. */
    void widen(double[] uncertainties, double[] other) {
        for (int i = 0; i < unknowns; i++) {
            double variance = uncertainties[i] * uncertainties[i] + other[i] * other[i];
            for (double[] effect : effects) {
                variance += effect[i] * effect[i];
            }
            uncertainties[i] = Math.sqrt(variance);
        }
    }

    private void refresh(int c) {
        estimators[c].estimates(effects[c]);
        for (int i = 0; i < unknowns; i++) {
            effects[c][i] = Double.isNaN(effects[c][i]) ? 0 : effects[c][i];
        }
    }

    List<String> names() {
        return systematic.names();
    }

    /** A copy, c×p; 0 where not known yet. */
    double[][] effects() {
        double[][] copy = new double[effects.length][];
        for (int c = 0; c < copy.length; c++) {
            copy[c] = effects[c].clone();
        }
        return copy;
    }
}
