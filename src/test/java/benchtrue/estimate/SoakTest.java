package benchtrue.estimate;

import static org.assertj.core.api.Assertions.assertThat;

import benchtrue.model.Forgetting;
import benchtrue.model.Memory;
import java.util.SplittableRandom;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** What would wind up a recursion that forgets: each regime in turn, again and again, with an hour's gap between two readings. */
final class SoakTest {
    private static final double[] TRUTH = {2, -3, 0.5};
    private static final double NOISE = 0.01;
    private static final int REGIME = 4000;

    private enum Regime {
        GOOD,
        CONSTANT,
        COLLINEAR,
        BURST,
        ZERO,
        HUGE,
        TINY,
        GAP
    }

    @ParameterizedTest
    @ValueSource(strings = {"readings", "seconds", "directional"})
    void staysFiniteAndNearTheTruthThroughEveryRegime(String kind) {
        Memory memory = kind.equals("seconds") ? new Memory.Seconds(10) : new Memory.Readings(100);
        Forgetting.Kind how = kind.equals("directional") ? Forgetting.Kind.DIRECTIONAL : Forgetting.Kind.EXPONENTIAL;
        Estimator estimator = new Estimator(new boolean[] {false, false, true}, 1, new Forgetting(how, memory));
        SplittableRandom random = new SplittableRandom(50);
        double[] theta = new double[3];
        double[] u = new double[3];
        for (int round = 0; round < 3; round++) {
            for (Regime regime : Regime.values()) {
                for (int i = 0; i < REGIME; i++) {
                    boolean gap = regime == Regime.GAP && i == REGIME / 2;
                    estimator.next(gap ? 3600 : 0.1);
                    double[] phi = phi(regime, i, random);
                    double y = NOISE * random.nextGaussian();
                    for (int j = 0; j < 3; j++) {
                        y += TRUTH[j] * phi[j];
                    }
                    estimator.predict(0, phi, y, 1);
                    estimator.use();
                    estimator.estimates(theta);
                    for (int j = 0; j < 3; j++) {
                        double size = estimator.determined() ? Math.abs(theta[j] - TRUTH[j]) : 0;
                        assertThat(size)
                                .as("%s, round %d, reading %d", regime, round, i)
                                .isLessThan(0.5);
                    }
                }
                estimator.uncertainties(u);
                for (int j = 0; j < 3; j++) {
                    assertThat(u[j])
                            .as("%s, round %d", regime, round)
                            .isGreaterThan(0)
                            .isLessThan(1);
                }
            }
            for (int i = 0; i < REGIME; i++) {
                estimator.next(0.1);
                double[] phi = phi(Regime.GOOD, i, random);
                estimator.predict(
                        0, phi, TRUTH[0] * phi[0] + TRUTH[1] * phi[1] + TRUTH[2] + NOISE * random.nextGaussian(), 1);
                estimator.use();
            }
            estimator.estimates(theta);
            for (int j = 0; j < 3; j++) {
                assertThat(Math.abs(theta[j] - TRUTH[j]))
                        .as("after round %d", round)
                        .isLessThan(0.01);
            }
        }
        if (!kind.equals("directional")) {
            assertThat(estimator.floorRows()).isPositive();
        }
    }

    private static double[] phi(Regime regime, int i, SplittableRandom random) {
        double a = random.nextDouble(-1, 1);
        double b = random.nextDouble(-1, 1);
        return switch (regime) {
            case GOOD, GAP -> new double[] {a, b, 1};
            case CONSTANT -> new double[] {0.7, -0.2, 1};
            case COLLINEAR -> new double[] {a, 2 * a, 1};
            case BURST -> i % 500 < 5 ? new double[] {a, b, 1} : new double[] {0, 0, 1};
            case ZERO -> new double[] {0, 0, 0};
            case HUGE -> new double[] {1e9 * a, 1e9 * b, 1};
            case TINY -> new double[] {1e-9 * a, 1e-9 * b, 1};
        };
    }
}
