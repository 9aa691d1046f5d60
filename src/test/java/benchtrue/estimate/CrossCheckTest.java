package benchtrue.estimate;

import static org.assertj.core.api.Assertions.assertThat;

import benchtrue.model.Forgetting;
import benchtrue.model.Memory;
import java.util.SplittableRandom;
import org.jspecify.annotations.Nullable;
import org.junit.jupiter.api.Test;

/** The two parts of the closing cross-check. */
final class CrossCheckTest {
    @Test
    void agreesByRoundingWhereTheDataFitExactlyAndUIsZero() {
        BlockQr qr = new BlockQr(2);
        for (int i = 0; i < 50; i++) {
            qr.add(new double[] {1, i}, 2 + 3 * i, 1);
        }
        Fit fit = qr.fit();
        double[] rounded = {fit.estimates()[0] + 1e-15, fit.estimates()[1]};
        double[] none = {0, 0};
        assertThat(ArithmeticCheck.judge(rounded, none, fit, false).agrees()).isTrue();
        assertThat(ArithmeticCheck.judge(rounded, none, fit, true).agrees()).isFalse();
        double[] off = {fit.estimates()[0] + 1e-9, fit.estimates()[1]};
        assertThat(ArithmeticCheck.judge(off, none, fit, false).agrees()).isFalse();
    }

    @Test
    void judgesByUOnlyWhereTheFloorActed() {
        BlockQr qr = new BlockQr(1);
        for (int i = 0; i < 50; i++) {
            qr.add(new double[] {1}, i % 2, 1);
        }
        double[] u = {0.1};
        assertThat(ArithmeticCheck.judge(new double[] {0.5009}, u, qr.fit(), true)
                        .agrees())
                .isTrue();
        Agreement far = ArithmeticCheck.judge(new double[] {0.5011}, u, qr.fit(), true);
        assertThat(far.agrees()).isFalse();
        assertThat(far.judgement()).contains("more than 0.01 u");
    }

    /** The test is at 5 %: of 400 quiet runs about 20 exceed it; a probability below 1e-4 bounds the window. */
    @Test
    void constancyExceedsItsLevelAsOftenAsItSays() {
        SplittableRandom random = new SplittableRandom(1978);
        int exceeded = 0;
        for (int run = 0; run < 400; run++) {
            Constancy constancy = constancy(random, 0);
            assertThat(constancy).isNotNull();
            exceeded += constancy.pValue() < 0.05 ? 1 : 0;
        }
        assertThat(exceeded).isBetween(5, 42);
    }

    @Test
    void constancySeesAnUnknownThatMoved() {
        Constancy constancy = constancy(new SplittableRandom(2), 1);
        assertThat(constancy).isNotNull();
        assertThat(constancy.pValue()).isLessThan(1e-6);
        assertThat(constancy.degreesOfFreedom()).isEqualTo(2);
    }

    @Test
    void constancyIsSilentWhereNothingIsForgotten() {
        double[] covariance = {1, 0.2, 0.2, 2};
        assertThat(Constancy.judge(new double[] {1, 2}, covariance, new double[] {1, 2}, covariance))
                .isNull();
    }

    private static @Nullable Constancy constancy(SplittableRandom random, double step) {
        Estimator estimator = new Estimator(
                new boolean[] {true, false}, 1, new Forgetting(Forgetting.Kind.EXPONENTIAL, new Memory.Readings(100)));
        BlockQr all = new BlockQr(2);
        for (int i = 0; i < 1500; i++) {
            double[] phi = {1, 2 * random.nextDouble() - 1};
            double y = (i < 1200 ? 1 : 1 + step) + 3 * phi[1] + random.nextGaussian();
            estimator.next(1);
            estimator.predict(0, phi, y, 1);
            estimator.use();
            all.add(phi, y, 1);
        }
        double[] live = new double[2];
        double[] liveCovariance = new double[4];
        estimator.estimates(live);
        estimator.covariance(liveCovariance);
        Fit fit = all.fit();
        double[] covariance = fit.covariance().clone();
        for (int i = 0; i < 4; i++) {
            covariance[i] *= fit.residualSd() * fit.residualSd();
        }
        return Constancy.judge(live, liveCovariance, fit.estimates(), covariance);
    }
}
