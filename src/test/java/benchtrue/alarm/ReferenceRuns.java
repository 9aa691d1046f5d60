package benchtrue.alarm;

import java.util.Arrays;
import java.util.SplittableRandom;

/**
 * Runs of y = a·x + b·z + c against a frozen reference, as a rig is run: x and z stay for a while, then move. The noise has
 * the standard deviation 1; the reference rests on readings of its own with dwells of 50, so that it is wrong by as much as it says.
 */
final class ReferenceRuns {
    static final double[] TRUTH = {2, -1, 5};

    final SplittableRandom random;
    final AlarmBook book = new AlarmBook();
    final ReferenceWatch watch;
    final double[] now = TRUTH.clone();
    double noise = 1;
    double outlier;
    double correlation;
    private final double perReading;
    private final double[] phi = {0, 0, 1};
    private int dwell = 50;
    private double last;
    private long number;

    ReferenceRuns(long seed, int referenceReadings, int dwell, double correlation, double perReading) {
        random = new SplittableRandom(seed);
        this.correlation = correlation;
        this.perReading = perReading;
        int thinning = Autocorrelation.thinning(correlation);
        watch = new ReferenceWatch(Rig.plane(), book, reference(referenceReadings), 3.0 / referenceReadings, thinning);
        this.dwell = dwell;
    }

    /** Ordinary least squares over readings made before the run. */
    private ReferenceWatch.Frozen reference(int n) {
        double[] normal = new double[9];
        double[] right = new double[3];
        double squares = 0;
        for (int k = 0; k < n; k++) {
            double y = next();
            squares += y * y;
            for (int i = 0; i < 3; i++) {
                right[i] += phi[i] * y;
                for (int j = 0; j < 3; j++) {
                    normal[i * 3 + j] += phi[i] * phi[j];
                }
            }
        }
        Symmetric.invert(normal, 3);
        double[] values = new double[3];
        double explained = 0;
        for (int i = 0; i < 3; i++) {
            for (int j = 0; j < 3; j++) {
                values[i] += normal[i * 3 + j] * right[j];
            }
            explained += values[i] * right[i];
        }
        double factor = (1 + correlation) / (1 - correlation);
        double nu = (n - 3) * (1 - correlation * correlation) / (1 + correlation * correlation);
        double[] covariance = Arrays.stream(normal).map(v -> v * factor).toArray();
        return new ReferenceWatch.Frozen(values, covariance, Math.sqrt((squares - explained) / (n - 3)), nu);
    }

    /** Moves the rig and reads it. */
    private double next() {
        if (number++ % dwell == 0) {
            phi[0] = 4 * random.nextDouble() - 2;
            phi[1] = 4 * random.nextDouble() - 2;
        }
        last = correlation * last + Math.sqrt(1 - correlation * correlation) * random.nextGaussian();
        return now[0] * phi[0] + now[1] * phi[1] + now[2] + noise * last + outlier;
    }

    /** One reading, once a second, into the watch. */
    void read() {
        double y = next();
        book.at((double) number, number);
        watch.predict(phi, y, 1);
        watch.test(number, (double) number, perReading, false, null);
    }

    void read(long readings) {
        for (long i = 0; i < readings; i++) {
            read();
        }
    }

    long number() {
        return number;
    }

    /** Reads on until an alarm stands. */
    long untilAlarm(long most) {
        long from = number;
        while (!book.anyStanding() && number < from + most) {
            read();
        }
        return number - from;
    }
}
