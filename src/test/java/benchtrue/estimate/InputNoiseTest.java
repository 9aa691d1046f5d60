package benchtrue.estimate;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

final class InputNoiseTest {
    /** Source: attenuation of a slope by noise of x, Fuller 1987, Measurement Error Models, 1.1 (from memory). */
    @Test
    void foretellsHowMuchOfASlopeIsLost() {
        SplittableRandom random = new SplittableRandom(9);
        double noise = 0.5;
        BlockQr qr = new BlockQr(3);
        InputNoise errors = new InputNoise(3);
        for (int i = 0; i < 200_000; i++) {
            double other = random.nextGaussian();
            double x = 0.8 * other + random.nextGaussian();
            double[] phi = {1, x + noise * random.nextGaussian(), other};
            double y = 2 + 4 * x + other;
            qr.add(phi, y, 1);
            errors.add(phi, y, new double[] {1, phi[1] + noise, other}, y, 1);
        }
        Fit fit = qr.fit();
        InputNoise.Effect effect = errors.on(1, fit.covariance(), fit.estimates(), 0.02);
        // What the other regressor leaves of x has variance 1, so 0.25/1.25 of the slope is lost, to first order of 4.
        assertThat(effect.share()).isEqualTo(0.2, within(0.005));
        assertThat(fit.estimates()[1]).isEqualTo(4 * 0.8, within(0.02));
        assertThat(effect.bias()).isEqualTo(-0.2 * fit.estimates()[1], within(0.02));
        assertThat(effect.flagged()).isTrue();
        assertThat(effect.onlyNoise()).isFalse();
    }

    @Test
    void knowsRegressorsOfWhichOnlyNoiseIsLeft() {
        SplittableRandom random = new SplittableRandom(10);
        double noise = 5e-5;
        for (boolean centred : new boolean[] {true, false}) {
            BlockQr qr = new BlockQr(2);
            InputNoise errors = new InputNoise(2);
            for (int i = 0; i < 2000; i++) {
                double load = random.nextDouble();
                double second = centred ? load : random.nextDouble();
                double[] phi = {load + noise * random.nextGaussian(), second + noise * random.nextGaussian()};
                double y = 250 * load + 249 * second + 0.01 * random.nextGaussian();
                qr.add(phi, y, 1);
                errors.add(phi, y, new double[] {phi[0] + noise, phi[1]}, y, 1);
                errors.add(phi, y, new double[] {phi[0], phi[1] + noise}, y, 1);
            }
            Fit fit = qr.fit();
            InputNoise.Effect effect = errors.on(0, fit.covariance(), fit.estimates(), 0.01);
            assertThat(effect.onlyNoise()).isEqualTo(centred);
            assertThat(effect.flagged()).isEqualTo(centred);
        }
    }

    @Test
    void addsTheRoundingOfAStep() {
        assertThat(InputNoise.standard(0, 1)).isEqualTo(Math.sqrt(1 / 12.0), within(1e-15));
        assertThat(InputNoise.quantised(0.29, 1)).isTrue();
        assertThat(InputNoise.quantised(0.31, 1)).isFalse();
    }
}
