package benchtrue.estimate;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import benchtrue.model.Forgetting;
import benchtrue.model.Memory;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

final class BlockQrTest {
    /** Source: NIST Statistical Reference Datasets; digits that double precision allows a good QR. */
    @ParameterizedTest
    @CsvSource({"Norris,12", "NoInt1,14", "Longley,10.9", "Wampler1,9.4", "Wampler3,9.1"})
    void reachesTheDigitsOfAGoodQrOnCertifiedData(String name, double digits) {
        Strd set = Strd.read(name);
        BlockQr qr = new BlockQr(set.size());
        for (int i = 0; i < set.rows().length; i++) {
            qr.add(set.rows()[i], set.response()[i], 1);
        }
        Fit fit = qr.fit();
        assertThat(set.digits(fit.estimates())).as(name).isGreaterThanOrEqualTo(digits);
        double sd = set.residualSd();
        assertThat(fit.residualSd()).isEqualTo(sd, within(Math.max(1e-7, 1e-8 * sd)));
        for (int i = 0; i < set.size() && sd > 0; i++) {
            double u = fit.residualSd() * Math.sqrt(fit.covariance()[i * set.size() + i]);
            assertThat(u).isEqualTo(set.sds()[i], within(1e-7 * set.sds()[i]));
        }
    }

    @Test
    void agreesWithTheRecursionUnderForgettingOverManyBlocks() {
        SplittableRandom random = new SplittableRandom(11);
        double factor = 0.995;
        Estimator estimator = new Estimator(
                new boolean[] {false, true},
                1,
                new Forgetting(Forgetting.Kind.EXPONENTIAL, Memory.Readings.ofFactor(factor)));
        BlockQr qr = new BlockQr(2);
        for (int i = 0; i < 5000; i++) {
            double[] phi = {100 * random.nextDouble(), 1};
            double y = 3 * phi[0] - 7 + random.nextDouble();
            double w = 0.5 + random.nextDouble();
            estimator.next(1);
            estimator.predict(0, phi, y, w);
            estimator.use();
            qr.age(factor);
            qr.add(phi, y, w);
        }
        double[] theta = new double[2];
        double[] u = new double[2];
        estimator.estimates(theta);
        estimator.uncertainties(u);
        Agreement agreement = ArithmeticCheck.judge(theta, u, qr.fit(), estimator.floorRows() > 0);
        assertThat(estimator.floorRows()).isZero();
        assertThat(agreement.agrees()).isTrue();
        assertThat(agreement.largestDifferenceInU()).isLessThan(1e-8);
        theta[0] += 0.02 * u[0];
        assertThat(ArithmeticCheck.judge(theta, u, qr.fit(), false).agrees()).isFalse();
    }

    @Test
    void saysWhenItIsNotDetermined() {
        BlockQr qr = new BlockQr(2);
        for (int i = 0; i < 10; i++) {
            qr.add(new double[] {2, 1}, 3, 1);
        }
        assertThat(qr.fit().determined()).isFalse();
        assertThat(qr.fit().estimates()).containsOnly(Double.NaN);
    }
}
