package benchtrue.estimate;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

final class StabilityTest {
    /** Source: Nile flow (R's data sets), a constant mean; recursive residuals and bounds computed with 80 digits (folder charts). */
    @Test
    void followsTheNileAcrossItsBound() {
        Table nile = Table.read("charts/nile.csv");
        Table truth = Table.read("charts/nile_recursive_residuals.csv");
        Stability stability = new Stability(1);
        assertThat(stability.add(1, new double[] {1}, nile.rows()[0][1], 1)).isNaN();
        double largest = 0;
        for (int i = 0; i < truth.size(); i++) {
            double residual = stability.add(i + 2, new double[] {1}, nile.rows()[i + 1][1], 1);
            assertThat(residual).isEqualTo(truth.at(i, "recursive_residual"), within(1e-9));
            largest = Math.max(largest, Math.abs(truth.at(i, "cusum")) / truth.at(i, "bound05"));
        }
        Stability.Curve cusum = stability.cusum();
        assertThat(cusum.crossedAt()).isEqualTo(43);
        assertThat(cusum.largest()).isEqualTo(largest, within(1e-6 * largest));
    }

    /** Levels: both tests are at 5 %, asymptotically and conservative; a probability below 1e-4 bounds the windows. */
    @Test
    void crossesAtItsLevelWhileNothingChanges() {
        SplittableRandom random = new SplittableRandom(8);
        int crossed = 0;
        int crossedSquares = 0;
        for (int run = 0; run < 400; run++) {
            Stability stability = run(random, 0, 1);
            crossed += stability.cusum().crossed() ? 1 : 0;
            crossedSquares += stability.cusumOfSquares().crossed() ? 1 : 0;
        }
        assertThat(crossed).isBetween(4, 38);
        assertThat(crossedSquares).isBetween(4, 38);
    }

    @Test
    void tellsAMovedUnknownFromLouderNoise() {
        Stability moved = run(new SplittableRandom(1), 1, 1);
        assertThat(moved.cusum().crossed()).isTrue();
        Stability louder = run(new SplittableRandom(2), 0, 2);
        assertThat(louder.cusum().crossed()).isFalse();
        assertThat(louder.cusumOfSquares().crossed()).isTrue();
        assertThat(louder.cusumOfSquares().largestAt()).isEqualTo(500, within(25.0));
    }

    private static Stability run(SplittableRandom random, double step, double louder) {
        Stability stability = new Stability(2);
        for (int i = 0; i < 1000; i++) {
            boolean late = i >= 500;
            double[] phi = {1, Math.sin(0.1 * i)};
            double y = 3 + (late ? step : 0) + 2 * phi[1] + (late ? louder : 1) * random.nextGaussian();
            stability.add(i, phi, y, 1);
        }
        return stability;
    }

    @Test
    void keepsBoundedMemoryOverALongRun() {
        SplittableRandom random = new SplittableRandom(3);
        Stability stability = new Stability(1);
        for (int i = 0; i < 100_000; i++) {
            stability.add(i, new double[] {1}, (i < 60_000 ? 0 : 0.1) + random.nextGaussian(), 1);
        }
        assertThat(stability.cusum().crossed()).isTrue();
        assertThat(stability.cusum().crossedAt()).isBetween(60_000.0, 75_000.0);
    }
}
