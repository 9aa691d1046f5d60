package benchtrue.estimate;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

final class ResidualTestsTest {
    /** Source: recomputed by hand from the definitions of Ljung and Box 1978 and Durbin and Watson 1950; from memory. */
    @Test
    void agreesWithAWorkedExample() {
        ResidualTests tests = new ResidualTests();
        for (double e : new double[] {1, -1, 2, 0, -2, 1, 1, -1, 0, -1}) {
            tests.add(e);
        }
        assertThat(tests.ljungBox(3)).isEqualTo(5.11176, within(5e-6));
        assertThat(tests.durbinWatson()).isEqualTo(2.5714, within(5e-5));
    }

    /** For AR(1) noise the variance of a mean is (1+ρ)/(1−ρ) times that of white noise (textbook result). */
    @Test
    void widensTheVarianceOfAMeanForAutocorrelatedNoise() {
        SplittableRandom random = new SplittableRandom(3);
        double rho = 0.6;
        ResidualTests tests = new ResidualTests();
        double[] noise = new double[200_000];
        double state = 0;
        for (int i = 0; i < noise.length; i++) {
            state = rho * state + random.nextGaussian();
            noise[i] = state;
            tests.add(state);
        }
        assertThat(tests.autocorrelated()).isTrue();
        assertThat(tests.autocorrelation(1)).isEqualTo(rho, within(0.01));
        NeweyWest wide = new NeweyWest(1, 4 * tests.correlationLength());
        NeweyWest none = new NeweyWest(1, 1);
        for (double e : noise) {
            wide.add(new double[] {1}, e, 1);
            none.add(new double[] {1}, e, 1);
        }
        double[] inverse = {1.0 / noise.length};
        double white = 1 / (1 - rho * rho) / noise.length;
        assertThat(wide.covariance(inverse)[0] / white).isEqualTo((1 + rho) / (1 - rho), within(0.5));
        assertThat(none.covariance(inverse)[0] / white).isLessThan(2);
    }
}
