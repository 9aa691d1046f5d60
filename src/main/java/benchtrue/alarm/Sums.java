package benchtrue.alarm;

import java.util.Arrays;

/**
 * Sums over readings that a change is judged by, for q regressors φ and an error e in standard deviations: n, Σz², Σe, Σ√w, Σφφᵀ,
 * Σvφφᵀ, Σv²φᵢ², Σφe and Σvφe, with v the time in s since {@link #start}. Matrices are q×q, row by row.
 */
final class Sums {
    final int q;
    final double[] products;
    final double[] timed;
    final double[] timedTwice;
    final double[] scores;
    final double[] timedScores;
    long count;
    double squares;
    double errors;
    double roots;
    double start;
    long firstReading;

    Sums(int regressors) {
        q = regressors;
        products = new double[q * q];
        timed = new double[q * q];
        timedTwice = new double[q];
        scores = new double[q];
        timedScores = new double[q];
    }

    /** Empty, with v counted from this time. */
    void clear(double from, long reading) {
        Arrays.fill(products, 0);
        Arrays.fill(timed, 0);
        Arrays.fill(timedTwice, 0);
        Arrays.fill(scores, 0);
        Arrays.fill(timedScores, 0);
        count = 0;
        squares = 0;
        errors = 0;
        roots = 0;
        start = from;
        firstReading = reading;
    }

    void add(double[] phi, double root, double error, double z, double time) {
        double v = time - start;
        for (int i = 0, at = 0; i < q; i++) {
            double f = phi[i];
            for (int j = 0; j < q; j++, at++) {
                double product = f * phi[j];
                products[at] += product;
                timed[at] += v * product;
            }
            timedTwice[i] += v * v * f * f;
            scores[i] += f * error;
            timedScores[i] += v * f * error;
        }
        squares += z * z;
        errors += error;
        roots += root;
        count++;
    }

    /** Takes in what lies before it; time counts from there then. */
    void reach(Sums earlier) {
        double d = start - earlier.start;
        for (int i = 0, at = 0; i < q; i++, at += q + 1) {
            timedTwice[i] += d * (2 * timed[at] + d * products[at]) + earlier.timedTwice[i];
            timedScores[i] += d * scores[i] + earlier.timedScores[i];
            scores[i] += earlier.scores[i];
        }
        for (int at = 0; at < products.length; at++) {
            timed[at] += d * products[at] + earlier.timed[at];
            products[at] += earlier.products[at];
        }
        squares += earlier.squares;
        errors += earlier.errors;
        roots += earlier.roots;
        count += earlier.count;
        start = earlier.start;
        firstReading = earlier.firstReading;
    }

    /** Takes in Σφφᵀ and Σφe alone. */
    void vouch(Sums other) {
        for (int at = 0; at < products.length; at++) {
            products[at] += other.products[at];
        }
        for (int i = 0; i < q; i++) {
            scores[i] += other.scores[i];
        }
    }

    void copy(Sums other) {
        System.arraycopy(other.products, 0, products, 0, products.length);
        System.arraycopy(other.timed, 0, timed, 0, timed.length);
        System.arraycopy(other.timedTwice, 0, timedTwice, 0, q);
        System.arraycopy(other.scores, 0, scores, 0, q);
        System.arraycopy(other.timedScores, 0, timedScores, 0, q);
        count = other.count;
        squares = other.squares;
        errors = other.errors;
        roots = other.roots;
        start = other.start;
        firstReading = other.firstReading;
    }
}
