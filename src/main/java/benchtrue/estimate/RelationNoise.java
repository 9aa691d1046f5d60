package benchtrue.estimate;

/** The noise of each relation, and with what weight each counts beside the first. */
final class RelationNoise {
    /** Degrees of freedom that both relations need before one is weighed against the other. */
    private static final double ENOUGH = 10;

    private final Noise[] noise;

    RelationNoise(int relations) {
        noise = new Noise[relations];
        for (int k = 0; k < relations; k++) {
            noise[k] = new Noise();
        }
    }

    void clear() {
        for (Noise each : noise) {
            each.clear();
        }
    }

    void age(double factor) {
        for (Noise each : noise) {
            each.age(factor);
        }
    }

    void add(int k, double squaredResidual) {
        noise[k].add(squaredResidual);
    }

    double variance(int k) {
        return noise[k].variance();
    }

    double degreesOfFreedom(int k) {
        return noise[k].degreesOfFreedom();
    }

    /** Of all relations together. */
    double degreesOfFreedom() {
        double sum = 0;
        for (Noise each : noise) {
            sum += each.degreesOfFreedom();
        }
        return sum;
    }

    /** Relations are weighted against the first by 1/s², once both are known well enough not to do harm. */
    void weigh(Information information) {
        if (noise.length == 1) {
            return;
        }
        for (int k = 1; k < noise.length; k++) {
            double ratio = variance(0) / variance(k);
            boolean known = degreesOfFreedom(0) >= ENOUGH && degreesOfFreedom(k) >= ENOUGH;
            information.weigh(k, known && ratio > 0 && ratio < Double.POSITIVE_INFINITY ? ratio : 1);
        }
        information.join();
    }
}
