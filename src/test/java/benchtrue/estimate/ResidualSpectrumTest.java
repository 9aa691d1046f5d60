package benchtrue.estimate;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.SplittableRandom;
import org.jspecify.annotations.Nullable;
import org.junit.jupiter.api.Test;

final class ResidualSpectrumTest {
    /** Hum at 49.98 Hz sampled at 10 Hz folds to 0.02 Hz, a period of 500 readings; at 11.3 Hz to 4.78 Hz (sampling theorem). */
    @Test
    void seesTheAliasOfHumAndWhereItMovesAtAnotherRate() {
        ResidualSpectrum.Period at10 = hum(10, 9000);
        assertThat(at10).isNotNull();
        assertThat(at10.readings()).isEqualTo(500, within(15.0));
        assertThat(at10.share()).isGreaterThan(0.8);
        ResidualSpectrum.Period other = hum(11.3, 9000);
        assertThat(other).isNotNull();
        assertThat(11.3 / other.readings()).isEqualTo(4.78, within(0.005));
    }

    private static ResidualSpectrum.@Nullable Period hum(double rate, int n) {
        SplittableRandom random = new SplittableRandom(12);
        ResidualSpectrum spectrum = new ResidualSpectrum();
        for (int i = 0; i < n; i++) {
            spectrum.add(6 * Math.sin(2 * Math.PI * 49.98 * i / rate) + 1.2 * random.nextGaussian());
        }
        return spectrum.dominant();
    }

    @Test
    void seesNoneInWhiteOrAutocorrelatedNoise() {
        SplittableRandom random = new SplittableRandom(13);
        for (int run = 0; run < 200; run++) {
            double rho = run % 2 == 0 ? 0 : 0.9;
            ResidualSpectrum spectrum = new ResidualSpectrum();
            double state = 0;
            int n = 64 << (run % 8);
            for (int i = 0; i < n; i++) {
                state = rho * state + random.nextGaussian();
                spectrum.add(state);
            }
            assertThat(spectrum.dominant()).as("run %d", run).isNull();
        }
    }

    @Test
    void transformsAsTheDefinitionSays() {
        SplittableRandom random = new SplittableRandom(14);
        int n = 16;
        double[] re = random.doubles(n).toArray();
        double[] im = random.doubles(n).toArray();
        double[] a = re.clone();
        double[] b = im.clone();
        ResidualSpectrum.transform(a, b);
        for (int k = 0; k < n; k++) {
            double x = 0;
            double y = 0;
            for (int i = 0; i < n; i++) {
                double angle = -2 * Math.PI * i * k / n;
                x += re[i] * Math.cos(angle) - im[i] * Math.sin(angle);
                y += re[i] * Math.sin(angle) + im[i] * Math.cos(angle);
            }
            assertThat(a[k]).isEqualTo(x, within(1e-12));
            assertThat(b[k]).isEqualTo(y, within(1e-12));
        }
    }
}
