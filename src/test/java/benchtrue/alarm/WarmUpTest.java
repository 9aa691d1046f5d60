package benchtrue.alarm;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.SplittableRandom;
import java.util.function.DoubleUnaryOperator;
import org.junit.jupiter.api.Test;

class WarmUpTest {
    private static boolean told(long seed, double correlation, DoubleUnaryOperator lean) {
        SplittableRandom random = new SplittableRandom(seed);
        WarmUp warmUp = new WarmUp();
        double noise = 0;
        boolean told = false;
        for (int k = 0; k < 3000; k++) {
            noise = correlation * noise + Math.sqrt(1 - correlation * correlation) * random.nextGaussian();
            told |= warmUp.add(noise + lean.applyAsDouble(k));
        }
        return told;
    }

    @Test
    void aLeanThatDecaysIsAWarmUp() {
        assertThat(told(1, 0, k -> 2 * Math.exp(-k / 240.0))).isTrue();
    }

    @Test
    void aLeanThatStaysIsNone() {
        assertThat(told(1, 0, k -> 2)).isFalse();
    }

    @Test
    void aLeanThatComesLaterIsNone() {
        assertThat(told(1, 0, k -> k < 600 ? 0 : 2 * Math.exp(-(k - 600) / 240.0)))
                .isFalse();
    }

    @Test
    void noiseIsHardlyEverTakenForOneEvenIfItIsSlow() {
        int white = 0;
        int slow = 0;
        for (int seed = 0; seed < 300; seed++) {
            white += told(seed, 0, k -> 0) ? 1 : 0;
            slow += told(seed, 0.8, k -> 0) ? 1 : 0;
        }
        assertThat(white).isZero();
        assertThat(slow).isLessThanOrEqualTo(3);
    }
}
