package benchtrue.estimate;

import java.util.Arrays;

/**
 * All that is known: for each relation an information factor and, once anything is forgotten, a second one fed with the
 * squared factors, from which the covariance that is true under forgetting comes:
 * C = P·(Σf²wφφᵀ)·P. Relations are joined with their present weights; of one relation the join is itself.
 */
final class Information {
    private final int p;
    private final InformationFactor[] first;
    private final InformationFactor[] second;
    private final InformationFactor floor;
    private final InformationFactor joint;
    private final InformationFactor jointSecond;
    private final double[] weights;
    private final double[] column;
    private final double[] old;
    private final double[] y;
    private boolean forgets;

    Information(int unknowns, int relations) {
        p = unknowns;
        first = new InformationFactor[relations];
        second = new InformationFactor[relations];
        weights = new double[relations];
        for (int k = 0; k < relations; k++) {
            first[k] = new InformationFactor(p);
            second[k] = new InformationFactor(p);
            weights[k] = 1;
        }
        boolean single = relations == 1;
        floor = single ? first[0] : new InformationFactor(p);
        joint = single ? first[0] : new InformationFactor(p);
        jointSecond = single ? second[0] : new InformationFactor(p);
        column = new double[p];
        old = new double[p + 1];
        y = new double[p * p];
    }

    void clear() {
        for (int k = 0; k < first.length; k++) {
            first[k].clear();
            second[k].clear();
            weights[k] = 1;
        }
        if (first.length > 1) {
            floor.clear();
            joint.clear();
            jointSecond.clear();
        }
    }

    /** From the first forgetting on the second factors are kept; until then they would equal the first. */
    void forgets(boolean anything) {
        if (anything && !forgets) {
            forgets = true;
            for (int k = 0; k < first.length; k++) {
                second[k].copy(first[k]);
            }
            if (first.length > 1) {
                jointSecond.copy(joint);
            }
        }
    }

    void age(double factor) {
        for (int k = 0; k < first.length; k++) {
            first[k].age(factor);
            second[k].age(factor * factor);
        }
        if (first.length > 1) {
            floor.age(factor);
            joint.age(factor);
            jointSecond.age(factor * factor);
        }
    }

    void ageAlong(double[] phi, double mu) {
        first[0].ageAlong(phi, mu, column, old);
    }

    /** @return as {@link InformationFactor#add}, of what this relation alone knows */
    double add(int k, double[] phi, double y, double w) {
        if (forgets) {
            second[k].add(phi, 0, w);
        }
        return first[k].add(phi, y, w);
    }

    void weigh(int k, double weight) {
        weights[k] = weight;
    }

    double weight(int k) {
        return weights[k];
    }

    /** Joins all relations with their present weights. */
    void join() {
        if (first.length == 1) {
            return;
        }
        joint.clear();
        jointSecond.clear();
        for (int k = 0; k < first.length; k++) {
            joint.add(first[k], weights[k]);
            jointSecond.add(second[k], weights[k]);
        }
        joint.add(floor, 1);
    }

    InformationFactor joint() {
        return joint;
    }

    /** Where rows of the information floor go. */
    InformationFactor floor() {
        return floor;
    }

    /** φᵀCφ in units of s². v solves R̄ᵀv = φ, pPhi is Pφ; work has p entries at least. */
    double quadratic(double[] v, double[] pPhi, double[] work) {
        if (!forgets) {
            return joint.leverage(v);
        }
        System.arraycopy(pPhi, 0, work, 0, p);
        jointSecond.multiplyInPlace(work);
        double sum = 0;
        for (int i = 0; i < p; i++) {
            sum += jointSecond.d(i) * work[i] * work[i];
        }
        return sum;
    }

    /** P, p×p. */
    void inverse(double[] into) {
        for (int j = 0; j < p; j++) {
            unitColumn(j);
            joint.eliminate(column, 0, column);
            joint.divideInPlace(column);
            joint.solveInPlace(column);
            System.arraycopy(column, 0, into, j * p, p);
        }
    }

    private void unitColumn(int j) {
        Arrays.fill(column, 0);
        column[j] = 1;
    }

    /** C in units of s², p×p: P without forgetting, else YYᵀ with Y = R̄⁻¹·D⁻¹·(R̄₂R̄⁻¹)ᵀ·D₂^½. */
    void covariance(double[] into) {
        if (!forgets) {
            inverse(into);
            return;
        }
        for (int j = 0; j < p; j++) {
            // Column j of R̄₂R̄⁻¹, scaled by D₂^½ from the left; its transpose has this as row j.
            unitColumn(j);
            joint.solveInPlace(column);
            jointSecond.multiplyInPlace(column);
            double d = joint.d(j);
            for (int i = 0; i < p; i++) {
                y[j * p + i] = column[i] * Math.sqrt(jointSecond.d(i)) / d;
            }
        }
        for (int i = 0; i < p; i++) {
            for (int j = 0; j < p; j++) {
                column[j] = y[j * p + i];
            }
            joint.solveInPlace(column);
            for (int j = 0; j < p; j++) {
                y[j * p + i] = column[j];
            }
        }
        multiply(into);
    }

    private void multiply(double[] into) {
        for (int i = 0; i < p; i++) {
            for (int j = 0; j <= i; j++) {
                double sum = 0;
                for (int l = 0; l < p; l++) {
                    sum += y[i * p + l] * y[j * p + l];
                }
                into[i * p + j] = sum;
                into[j * p + i] = sum;
            }
        }
    }
}
