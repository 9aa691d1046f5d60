package benchtrue.estimate;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

final class RobustFitsTest {
    private static ThinnedRows stackLoss() {
        Table table = Table.read("lines/stackloss.csv");
        ThinnedRows rows = new ThinnedRows(4);
        for (double[] r : table.rows()) {
            rows.next();
            rows.add(new double[] {1, r[0], r[1], r[2]}, r[3], 1);
        }
        return rows;
    }

    private static double[] leastSquares(ThinnedRows rows) {
        BlockQr qr = new BlockQr(rows.unknowns());
        for (int i = 0; i < rows.size(); i++) {
            qr.add(rows.row(i), rows.row(i)[rows.unknowns()], 1);
        }
        return qr.fit().estimates();
    }

    /** Source: stack loss data (Brownlee); least absolute deviations as published many times, from memory. */
    @Test
    void findsTheLeastAbsoluteDeviationsOfTheStackLossData() {
        ThinnedRows rows = stackLoss();
        double[] fit = LeastAbsoluteFit.of(rows, leastSquares(rows));
        assertThat(fit[0]).isEqualTo(-39.68986, within(5e-6));
        assertThat(fit[1]).isEqualTo(0.83188, within(5e-6));
        assertThat(fit[2]).isEqualTo(0.57391, within(5e-6));
        assertThat(fit[3]).isEqualTo(-0.06087, within(5e-6));
    }

    /** Source: stack loss data (Brownlee); Huber's estimate with 1.345 and the median scale as published, from memory. */
    @Test
    void findsHubersEstimateOfTheStackLossData() {
        ThinnedRows rows = stackLoss();
        double[] fit = HuberFit.of(rows, leastSquares(rows));
        assertThat(fit[0]).isEqualTo(-41.0265, within(5e-4));
        assertThat(fit[1]).isEqualTo(0.82938, within(5e-5));
        assertThat(fit[2]).isEqualTo(0.92607, within(1e-4));
        assertThat(fit[3]).isEqualTo(-0.12785, within(5e-5));
    }

    @Test
    void noOtherPointNearTheLeastAbsoluteFitHasASmallerSum() {
        SplittableRandom random = new SplittableRandom(5);
        ThinnedRows rows = new ThinnedRows(3);
        for (int i = 0; i < 3000; i++) {
            double[] phi = {1, random.nextDouble(900, 2400), random.nextDouble(30, 175)};
            rows.next();
            rows.add(phi, 0.05 + 0.0113 * phi[1] - 0.021 * phi[2] + 0.06 * random.nextGaussian(), 1);
        }
        double[] fit = LeastAbsoluteFit.of(rows, leastSquares(rows));
        double least = sum(rows, fit);
        double[] spread = {0.01, 1e-5, 1e-4};
        for (int trial = 0; trial < 300; trial++) {
            double[] near = fit.clone();
            double size = Math.pow(10, -random.nextDouble(5));
            for (int j = 0; j < 3; j++) {
                near[j] += size * spread[j] * random.nextGaussian();
            }
            assertThat(sum(rows, near)).isGreaterThanOrEqualTo(least * (1 - 1e-12));
        }
    }

    private static double sum(ThinnedRows rows, double[] theta) {
        double sum = 0;
        for (int i = 0; i < rows.size(); i++) {
            sum += Math.abs(rows.residual(i, theta));
        }
        return sum;
    }

    @Test
    void aTwelfthOfWildReadingsMovesLeastSquaresButNotTheRobustFitsAndItIsSaid() {
        SplittableRandom random = new SplittableRandom(6);
        ThinnedRows rows = new ThinnedRows(2);
        for (int i = 0; i < 2400; i++) {
            double x = 1 + i % 50;
            double y = 1.43 + 0.0066 * x + 0.0015 * random.nextGaussian();
            rows.next();
            rows.add(new double[] {1, x}, random.nextDouble() < 0.12 ? y - 0.25 - 0.65 * random.nextDouble() : y, 1);
        }
        double[] estimates = leastSquares(rows);
        RobustFits robust = RobustFits.of(rows, estimates);
        double[] u = {0.003, 1e-4};
        assertThat(Math.abs(estimates[0] - 1.43)).isGreaterThan(0.03);
        assertThat(robust.leastAbsolute()[0]).isEqualTo(1.43, within(1e-3));
        assertThat(robust.huber()[0]).isEqualTo(1.43, within(2e-3));
        List<String> sentences = robust.sentences(List.of("E", "r"), List.of("V", "Ω"), 0.19, u);
        assertThat(sentences)
                .anySatisfy(s -> assertThat(s).startsWith("Huber puts E at 1.4").contains(" V"));
        assertThat(robust.scale()).isEqualTo(0.0015, within(0.0003));
        assertThat(sentences).anySatisfy(s -> assertThat(s).endsWith("the few large ones make s = 0.190."));
        assertThat(robust.sentences(List.of("E", "r"), List.of("V", "Ω"), 0.002, new double[] {1, 1}))
                .containsExactly("Huber's fit and least absolute deviations lie within U of least squares.");
    }

    @Test
    void thinsEvenlyByReadingsAndKeepsWithinItsRoom() {
        ThinnedRows rows = new ThinnedRows(1, 100);
        for (int i = 0; i < 12_345; i++) {
            rows.next();
            rows.add(new double[] {i}, 0, 4);
            rows.add(new double[] {i}, 1, 4);
        }
        assertThat(rows.size()).isBetween(50, 100);
        for (int i = 0; i < rows.size(); i++) {
            assertThat(rows.row(i)[0]).isEqualTo(2.0 * Math.floorDiv(i, 2) * rows.stride());
            assertThat(rows.row(i)[1]).isEqualTo(2.0 * (i % 2));
        }
        assertThat(rows.size() / 2 * rows.stride()).isBetween(12_345L, 12_345L + rows.stride());
    }
}
