package benchtrue.estimate;

import java.util.Arrays;

/**
 * How the score of each unknown is autocorrelated at lag 1, and by how much that widens its uncertainty: √((1+ρ)/(1−ρ)). The
 * score is w·(Pφ)ⱼ·e·√(Σf/Pⱼⱼ)/(1 + wφᵀPφ): of about the same size throughout, whereas (Pφ)ⱼ·e alone is so large while P is
 * that the start would dominate for good. ρ has a memory of at least 100 readings, and counts only where it is positive and
 * more than two of its own standard deviations from 0: a chance ρ must not narrow an uncertainty.
 */
final class ScoreMemory {
    private static final double LONGEST_FORGETTING = 1 - 1.0 / 100;
    private static final double SIGNIFICANT = 2;
    /** Beyond this ρ the readings say next to nothing of their own spread. */
    private static final double LARGEST = 0.999;

    private final double[] last;
    private final double[] squares;
    private final double[] products;
    /** 1/√Pⱼⱼ, at most 4p readings old. */
    private final double[] inverseRoots;

    private final double[] work;
    private int refreshed;
    private double count;
    private double squaredCount;

    ScoreMemory(int unknowns) {
        last = new double[unknowns];
        squares = new double[unknowns];
        products = new double[unknowns];
        inverseRoots = new double[unknowns];
        work = new double[unknowns];
    }

    void clear() {
        Arrays.fill(last, 0);
        Arrays.fill(squares, 0);
        Arrays.fill(products, 0);
        count = 0;
        squaredCount = 0;
    }

    /** All unknowns are determined from this reading on. */
    void determined(InformationFactor joint) {
        for (int j = 0; j < work.length; j++) {
            refresh(joint, j);
        }
    }

    /** Keeps up with P: one unknown every fourth reading is often enough for what it serves. */
    void follow(InformationFactor joint, long rows) {
        if ((rows & 3) == 0) {
            refresh(joint, refreshed);
            refreshed = refreshed + 1 == work.length ? 0 : refreshed + 1;
        }
    }

    private void refresh(InformationFactor joint, int j) {
        Arrays.fill(work, 0);
        work[j] = 1;
        joint.eliminate(work, 0, work);
        inverseRoots[j] = 1 / Math.sqrt(joint.leverage(work));
    }

    /**
     * @param gain Pφ, one for each unknown
     * @param scale what else the score is made of
     * @param factor of the estimator's forgetting at this reading
     */
    void add(double[] gain, double scale, double factor) {
        double kept = Math.max(factor, LONGEST_FORGETTING);
        count = kept * count + 1;
        squaredCount = kept * kept * squaredCount + 1;
        for (int j = 0; j < last.length; j++) {
            double score = gain[j] * scale * inverseRoots[j];
            squares[j] = kept * squares[j] + score * score;
            products[j] = kept * products[j] + score * last[j];
            last[j] = score;
        }
    }

    /** ρ of an unknown's score; NaN before anything is known. */
    double autocorrelation(int unknown) {
        return squares[unknown] > 0 ? products[unknown] / squares[unknown] : Double.NaN;
    }

    /** What the standard uncertainty is multiplied by, at least 1. */
    double widening(int unknown) {
        double rho = autocorrelation(unknown);
        double readings = count * count / squaredCount;
        if (!(rho > SIGNIFICANT / Math.sqrt(readings))) {
            return 1;
        }
        double bounded = Math.min(rho, LARGEST);
        return Math.sqrt((1 + bounded) / (1 - bounded));
    }
}
