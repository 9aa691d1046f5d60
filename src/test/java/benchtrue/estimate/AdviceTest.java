package benchtrue.estimate;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import benchtrue.model.Forgetting;
import benchtrue.model.Interval;
import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

final class AdviceTest {
    private static final double SIGMA = 0.06;
    private static final List<Interval> BOX = List.of(new Interval(900, 2400), new Interval(30, 175));

    private static CandidatePoint point(double[] setting) {
        return new CandidatePoint(
                "n = " + setting[0] + ", dp = " + setting[1],
                List.of(new double[] {setting[0] / 1000, setting[1], 1}),
                new double[] {1});
    }

    private static List<CandidatePoint> candidates() {
        return CandidatePoint.settings(BOX, x -> x[0] * x[1] < 3.5e5, new double[] {1500, 100}, List.of()).stream()
                .map(AdviceTest::point)
                .toList();
    }

    private static Estimator estimator(SplittableRandom random, int readings) {
        Estimator estimator = new Estimator(new boolean[] {false, false, true}, 1, Forgetting.NONE);
        for (int i = 0; i < readings; i++) {
            read(estimator, new double[] {1400 + 200 * random.nextDouble(), 90 + 20 * random.nextDouble()}, random);
        }
        return estimator;
    }

    private static void read(Estimator estimator, double[] setting, SplittableRandom random) {
        double[] phi = {setting[0] / 1000, setting[1], 1};
        estimator.next(1);
        estimator.predict(0, phi, 11.3 * phi[0] - 0.021 * phi[1] + 0.05 + SIGMA * random.nextGaussian(), 1);
        estimator.use();
    }

    private static Prospect prospect(Estimator estimator, double[] c, double other) {
        double[] inverse = new double[9];
        estimator.unscaledCovariance(inverse);
        double known = 0;
        for (int i = 0; i < 3; i++) {
            for (int j = 0; j < 3; j++) {
                known += c[i] * inverse[3 * i + j] * c[j];
            }
        }
        double s = estimator.residualSd(0);
        return Prospect.of(inverse, s * Math.sqrt(known), s * s, 1, estimator.degreesOfFreedom(), other, c);
    }

    private static double expanded(Estimator estimator, int unknown) {
        double[] u = new double[3];
        estimator.uncertainties(u);
        return u[unknown] * Quantiles.coverageFactor(estimator.degreesOfFreedom());
    }

    /** Following the advice must give the U that it promised, and with fewer readings than wandering about the box. */
    @Test
    void leadsToTheWantedUncertaintyAsPromisedAndSoonerThanChance() {
        SplittableRandom random = new SplittableRandom(31);
        Estimator estimator = estimator(random, 200);
        double wanted = 0.02;
        Advice advice = Advice.plan(prospect(estimator, new double[] {1, 0, 0}, 0), wanted, candidates());
        assertThat(advice.reaches()).isTrue();
        assertThat(advice.steps()).hasSizeBetween(2, 6);
        assertThat(advice.expectedU()).isLessThanOrEqualTo(wanted * 1.03);
        for (Advice.Step step : advice.steps()) {
            double[] row = step.at().rows().get(0);
            assertThat(1000 * row[0] * row[1]).isLessThan(3.5e5 * (1 + 1e-9));
            for (long i = 0; i < step.readings(); i++) {
                read(estimator, new double[] {1000 * row[0], row[1]}, random);
            }
        }
        assertThat(expanded(estimator, 0)).isEqualTo(advice.expectedU(), within(0.2 * advice.expectedU()));
        Estimator wandering = estimator(new SplittableRandom(31), 200);
        long readings = 0;
        while (expanded(wandering, 0) > advice.expectedU()) {
            read(wandering, new double[] {900 + 1500 * random.nextDouble(), 30 + 115 * random.nextDouble()}, random);
            readings++;
        }
        assertThat(readings).isGreaterThan(2 * advice.readings());
        assertThat(advice.words(0.2).get(0)).matches("hold \\d+ readings \\(\\d+ s\\) at n = .*");
    }

    /** Source: for a straight line the slope is best known from the two ends alike (Fedorov 1972, ch. 2; from memory). */
    @Test
    void measuresASlopeAtBothEnds() {
        double[] a = {1, 0, 0, 1e-3};
        Prospect now = Prospect.of(new double[] {a[0], 0, 0, 1 / a[3]}, 1e3, 1, 1, 30, 0, new double[] {0, 1});
        List<CandidatePoint> candidates = new ArrayList<>();
        for (int x = -4; x <= 4; x++) {
            candidates.add(new CandidatePoint("x = " + x, List.of(new double[] {1, x}), new double[] {1}));
        }
        Advice advice = Advice.plan(now, 0.02, candidates);
        assertThat(advice.steps()).hasSize(2);
        assertThat(advice.steps()).extracting(s -> s.at().words()).containsExactlyInAnyOrder("x = -4", "x = 4");
        double first = advice.steps().get(0).readings();
        assertThat(first / advice.readings()).isEqualTo(0.5, within(0.04));
        // s = 1, Σx² = 16 n, k = 1.96: n = (1.96/0.02)²/16.
        assertThat((double) advice.readings()).isEqualTo(9604 / 16.0, within(25.0));
    }

    @Test
    void pointsTheWayWhileUnknownsAreNotDetermined() {
        Estimator estimator = new Estimator(new boolean[] {false, false, true}, 1, Forgetting.NONE);
        SplittableRandom random = new SplittableRandom(2);
        for (int i = 0; i < 100; i++) {
            read(estimator, new double[] {1000 + 500 * (i % 3), 100}, random);
        }
        assertThat(estimator.determined()).isFalse();
        Advice advice = Advice.towards(estimator.diagnose().weakestDirection(), candidates(), 10);
        assertThat(advice.steps()).hasSize(1);
        double pressure = advice.steps().get(0).at().rows().get(0)[1];
        assertThat(Math.abs(pressure - 100)).isGreaterThan(60);
    }

    @Test
    void keepsCandidatesInsideTheJointLimits() {
        List<double[]> settings = CandidatePoint.settings(
                BOX, x -> x[0] * x[1] < 3.5e5, new double[] {1500, 100}, List.of(new double[] {2400, 175}));
        assertThat(settings).hasSize(25).allMatch(x -> x[0] * x[1] < 3.5e5);
        assertThat(settings).anyMatch(x -> x[0] * x[1] > 3.49e5);
        assertThat(CandidatePoint.settings(BOX, x -> false, new double[] {1500, 100}, List.of()))
                .isEmpty();
    }

    @Test
    void foretellsWhenTheWantedUncertaintyIsReached() {
        SplittableRandom random = new SplittableRandom(44);
        Estimator estimator = estimator(random, 500);
        double now = expanded(estimator, 1);
        double[] m = new double[9];
        for (int i = 0; i < 2000; i++) {
            double[] phi = {1.4 + 0.2 * random.nextDouble(), 90 + 20 * random.nextDouble(), 1};
            for (int j = 0; j < 9; j++) {
                m[j] += phi[j / 3] * phi[j % 3] / 2000;
            }
        }
        Prospect prospect = prospect(estimator, new double[] {0, 1, 0}, 0);
        Forecast forecast = Forecast.of(prospect, now / 2, m, 0.2);
        // U falls as 1/√n: half of it after four times as many.
        assertThat(forecast.readings()).isEqualTo(1500, within(150.0));
        assertThat(forecast.seconds()).isEqualTo(0.2 * forecast.readings());
        assertThat(Forecast.of(prospect, 2 * now, m, 0.2).readings()).isZero();
    }

    @Test
    void saysWhyItWillNeverBeReached() {
        double[] inverse = {0.01, 0, 0, 0.01};
        double[] c = {0, 1};
        double[] m = {1, 0, 0, 1};
        Forecast other = Forecast.of(Prospect.of(inverse, 0.1, 1, 1, 98, 0.05, c), 0.09, m, 1);
        assertThat(other.readings()).isInfinite();
        assertThat(other.neverWhy()).contains("declared other uncertainty alone makes U 0.0980");
        Forecast forgetting = Forecast.of(Prospect.of(inverse, 0.07, 1, 0.99, 199, 0, c), 0.05, m, 1);
        // U = 1.97·√((1 − λ)/(1 + λ)).
        assertThat(forgetting.neverWhy()).contains("memory of 100 readings holds U at 0.140");
        Forecast still = Forecast.of(Prospect.of(inverse, 0.1, 1, 1, 98, 0, c), 0.09, new double[] {1, 0, 0, 0}, 1);
        assertThat(still.neverWhy()).contains("change it");
    }
}
