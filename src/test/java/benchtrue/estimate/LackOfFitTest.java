package benchtrue.estimate;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.SplittableRandom;
import org.jspecify.annotations.Nullable;
import org.junit.jupiter.api.Test;

final class LackOfFitTest {
    /** A textbook example with replicates (Montgomery, Peck and Vining, Introduction to Linear Regression Analysis; from memory). */
    private static final double[] X = {1, 1, 2, 3.3, 3.3, 4, 4, 4, 4.7, 5, 5.6, 5.6, 5.6, 6, 6, 6.5, 6.9};

    private static final double[] Y = {
        10.84, 9.30, 16.35, 22.88, 24.35, 24.56, 25.86, 29.16, 24.59, 22.25, 25.90, 27.20, 25.61, 25.45, 26.56, 21.03,
        21.46
    };

    @Test
    void agreesWithATextbookExample() {
        BlockQr qr = new BlockQr(2);
        for (int i = 0; i < X.length; i++) {
            qr.add(new double[] {1, X[i]}, Y[i], 1);
        }
        double[] theta = qr.fit().estimates();
        LackOfFit test = new LackOfFit(1);
        // In two sweeps upwards, so that levels are left and come back to from the same side.
        for (int i : new int[] {0, 1, 3, 5, 8, 10, 13, 15, 2, 4, 6, 7, 9, 11, 12, 14, 16}) {
            test.add(new double[] {X[i]}, Y[i] - theta[0] - theta[1] * X[i]);
        }
        LackOfFit.Outcome outcome = test.judge(2);
        assertThat(outcome).isNotNull();
        assertThat(outcome.levels()).isEqualTo(10);
        assertThat(outcome.above()).isEqualTo(8);
        assertThat(outcome.below()).isEqualTo(7);
        assertThat(outcome.f()).isEqualTo(13.19, within(0.005));
        assertThat(outcome.lacks()).isTrue();
    }

    /** Rates: the test is at 5 %, so of 400 sound runs some 20 lack; a probability below 1e-4 bounds the window. */
    @Test
    void firesAtItsLevelOnASoundModelWithNoisySettings() {
        SplittableRandom random = new SplittableRandom(21);
        int lacking = 0;
        for (int run = 0; run < 400; run++) {
            LackOfFit.Outcome outcome = run(random, 0);
            assertThat(outcome).isNotNull();
            assertThat(outcome.levels()).isBetween(30, 64);
            lacking += outcome.pValue() < 0.05 ? 1 : 0;
        }
        assertThat(lacking).isBetween(5, 38);
    }

    @Test
    void seesATermThatIsMissing() {
        LackOfFit.Outcome outcome = run(new SplittableRandom(4), 0.002);
        assertThat(outcome).isNotNull();
        assertThat(outcome.lacks()).isTrue();
        assertThat(outcome.sentence()).contains("does not describe");
    }

    /** A stair of 17 pressures up and down, each read 20 times with noise on the setting; a line fitted to all. */
    private static LackOfFit.@Nullable Outcome run(SplittableRandom random, double curvature) {
        BlockQr qr = new BlockQr(2);
        double[][] rows = new double[660][];
        for (int i = 0; i < rows.length; i++) {
            int step = i / 20;
            double level = step <= 16 ? step : 32 - step;
            double p = level + 1e-3 * random.nextGaussian();
            rows[i] = new double[] {1, p, 4 + p + curvature * p * p + 0.01 * random.nextGaussian()};
            qr.add(rows[i], rows[i][2], 1);
        }
        double[] theta = qr.fit().estimates();
        LackOfFit test = new LackOfFit(1);
        for (double[] row : rows) {
            test.add(new double[] {row[1]}, row[2] - theta[0] - theta[1] * row[1]);
        }
        return test.judge(2);
    }

    /** A stair up and down read to 1.5 µA, 6 µA apart on the two ways, and the same with a term for it. */
    @Test
    void takesHysteresisForLackOfFitUntilThereIsATermForIt() {
        for (boolean term : new boolean[] {false, true}) {
            SplittableRandom random = new SplittableRandom(17);
            int p = term ? 3 : 2;
            BlockQr qr = new BlockQr(p);
            double[][] rows = new double[1700][];
            for (int i = 0; i < rows.length; i++) {
                int step = i / 50 % 34;
                double pressure = step <= 17 ? step : 34 - step;
                double direction = step >= 1 && step <= 17 ? 1 : -1;
                double y = 4.003 + 1.0006 * pressure - 0.006 * direction + 0.0015 * random.nextGaussian();
                rows[i] = new double[] {1, pressure, term ? direction : y, y};
                qr.add(rows[i], y, 1);
            }
            double[] theta = qr.fit().estimates();
            LackOfFit test = new LackOfFit(1);
            for (double[] row : rows) {
                double fitted = theta[0] + theta[1] * row[1] + (term ? theta[2] * row[2] : 0);
                test.add(new double[] {row[1]}, row[3] - fitted);
            }
            LackOfFit.Outcome outcome = test.judge(p);
            assertThat(outcome).isNotNull();
            if (term) {
                assertThat(outcome.f()).isLessThan(2);
            } else {
                assertThat(outcome.f()).isGreaterThan(500);
            }
        }
    }

    @Test
    void saysNothingWhereNoLevelIsRevisited() {
        LackOfFit test = new LackOfFit(1);
        for (int i = 0; i < 40; i++) {
            test.add(new double[] {Math.floorDiv(i, 10)}, Math.sin(i));
        }
        assertThat(test.judge(2)).isNull();
    }
}
