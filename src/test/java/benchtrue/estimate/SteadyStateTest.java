package benchtrue.estimate;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

final class SteadyStateTest {
    /** Source: Cao and Rhinehart 1995 with filters 0.2, 0.1, 0.1; percentage points on white noise recomputed by simulation. */
    @Test
    void hasItsPercentagePointsOnWhiteNoise() {
        SplittableRandom random = new SplittableRandom(1995);
        SteadyState steady = new SteadyState();
        int n = 400_000;
        int above95 = 0;
        int above99 = 0;
        for (int i = 0; i < n; i++) {
            steady.add(random.nextGaussian());
            if (i >= 100) {
                above95 += steady.ratio() > 1.44 ? 1 : 0;
                above99 += steady.ratio() > 1.73 ? 1 : 0;
            }
        }
        assertThat(above95 / (double) n).isEqualTo(0.05, within(0.006));
        assertThat(above99 / (double) n).isEqualTo(0.01, within(0.002));
    }

    @Test
    void isNotSteadyOnARampAndIsAgainAfterIt() {
        SplittableRandom random = new SplittableRandom(3);
        SteadyState steady = new SteadyState();
        for (int i = 0; i < 200; i++) {
            steady.add(2.0 * i + random.nextGaussian());
        }
        assertThat(steady.isSteady()).isFalse();
        int steadyReadings = 0;
        for (int i = 0; i < 200; i++) {
            steady.add(400 + random.nextGaussian());
            steadyReadings += i >= 100 && steady.isSteady() ? 1 : 0;
        }
        assertThat(steadyReadings).isGreaterThan(90);
    }

    @Test
    void takesWhatDoesNotVaryForSteadyOnceThereIsEnoughOfIt() {
        SteadyState steady = new SteadyState();
        for (int i = 0; i < 29; i++) {
            steady.add(7);
        }
        assertThat(steady.isSteady()).isFalse();
        steady.add(7);
        assertThat(steady.isSteady()).isTrue();
    }
}
