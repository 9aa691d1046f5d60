package benchtrue.estimate;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

/** Batch fits against published ones. */
final class ReferenceFitsTest {
    private static Fit line(Table table, int x, int y, double from) {
        BlockQr qr = new BlockQr(2);
        for (double[] row : table.rows()) {
            qr.add(new double[] {1, row[x] - from}, row[y], 1);
        }
        return qr.fit();
    }

    /** Source: JCGM 100:2008 (GUM), Annex H.3, thermometer calibration; digits from a computation with 60 digits. */
    @Test
    void calibratesTheThermometerOfTheGuide() {
        Fit fit = line(Table.read("gum_h3/readings.csv"), 1, 2, 20);
        double s = fit.residualSd();
        double[] c = fit.covariance();
        assertThat(fit.estimates()[0]).isEqualTo(-0.17120379013134998, within(1e-14));
        assertThat(fit.estimates()[1]).isEqualTo(0.002182697739887278, within(1e-15));
        assertThat(s).isEqualTo(0.003497563963505284, within(1e-15));
        assertThat(s * Math.sqrt(c[0])).isEqualTo(0.0028775978351599537, within(1e-14));
        assertThat(s * Math.sqrt(c[3])).isEqualTo(0.0006679387732277832, within(1e-15));
        assertThat(c[1] / Math.sqrt(c[0] * c[3])).isEqualTo(-0.9304296030934459, within(1e-12));
        double u30 = s * Math.sqrt(c[0] + 20 * c[1] + 100 * c[3]);
        assertThat(fit.estimates()[0] + 10 * fit.estimates()[1]).isEqualTo(-0.1493768127324772, within(1e-14));
        assertThat(u30).isEqualTo(0.004138595752854947, within(1e-14));
        assertThat(u30 * Quantiles.coverageFactor(fit.degreesOfFreedom()))
                .isEqualTo(0.009362154026010266, within(1e-11));
        // As printed there: b(30 °C) = -0.1494 °C, u = 0.0041 °C.
        assertThat(Rounded.of(-0.1493768, 2 * u30).text()).isEqualTo("-0.1494 ± 0.0083");
    }

    /** Source: R's data sets; inference computed with a statistics library (folder lines). */
    @Test
    void fitsPublishedLines() {
        Table cars = Table.read("lines/cars.csv");
        Fit fit = line(cars, 0, 1, 0);
        assertThat(fit.estimates()[0]).isEqualTo(-17.57909489051096, within(1e-11));
        assertThat(fit.estimates()[1]).isEqualTo(3.9324087591240877, within(1e-12));
        assertThat(fit.residualSd()).isEqualTo(15.379586748819907, within(1e-11));
        assertThat(fit.residualSd() * Math.sqrt(fit.covariance()[3])).isEqualTo(0.41551277665712233, within(1e-12));
        assertThat(durbinWatson(cars, fit)).isEqualTo(1.6762253234350974, within(1e-11));
        Table formaldehyde = Table.read("lines/formaldehyde.csv");
        Fit second = line(formaldehyde, 0, 1, 0);
        assertThat(second.estimates()[1]).isEqualTo(0.8762857142857141, within(1e-13));
        assertThat(second.residualSd()).isEqualTo(0.008648699324175885, within(1e-14));
        assertThat(durbinWatson(formaldehyde, second)).isEqualTo(1.5142857142857127, within(1e-10));
    }

    private static double durbinWatson(Table table, Fit fit) {
        ResidualTests tests = new ResidualTests();
        for (double[] row : table.rows()) {
            tests.add(row[1] - fit.estimates()[0] - fit.estimates()[1] * row[0]);
        }
        return tests.durbinWatson();
    }

    /** Source: Nile flow (R's data sets), a constant mean; computed with 80 digits (folder charts). */
    @Test
    void testsTheResidualsOfTheNile() {
        ResidualTests tests = new ResidualTests();
        double[][] rows = Table.read("charts/nile.csv").rows();
        double mean = 0;
        for (double[] row : rows) {
            mean += row[1] / rows.length;
        }
        for (double[] row : rows) {
            tests.add(row[1] - mean);
        }
        assertThat(tests.durbinWatson()).isEqualTo(0.9776376561895562, within(1e-12));
        assertThat(tests.ljungBox(1)).isEqualTo(25.593831552626156, within(1e-10));
        assertThat(tests.ljungBox(2)).isEqualTo(40.987442054401534, within(1e-10));
        assertThat(Quantiles.chiSquaredTail(tests.ljungBox(1), 1)).isEqualTo(4.213843058553111e-07, within(1e-16));
    }

    /** A calibration line weighted by 1/σ²: closed form with weighted means, Draper and Smith 1998, 9.2 (from memory). */
    @Test
    void weighsACalibrationLineAsItsClosedFormDoes() {
        SplittableRandom random = new SplittableRandom(71);
        double[] x = new double[40];
        double[] y = new double[40];
        double[] w = new double[40];
        BlockQr qr = new BlockQr(2);
        double sw = 0;
        double sx = 0;
        double sy = 0;
        for (int i = 0; i < x.length; i++) {
            x[i] = 1 + i;
            double sigma = 0.02 * x[i];
            y[i] = 0.4 + 2.5 * x[i] + sigma * random.nextGaussian();
            w[i] = 1 / (sigma * sigma);
            qr.add(new double[] {1, x[i]}, y[i], w[i]);
            sw += w[i];
            sx += w[i] * x[i];
            sy += w[i] * y[i];
        }
        double sxx = 0;
        double sxy = 0;
        for (int i = 0; i < x.length; i++) {
            sxx += w[i] * (x[i] - sx / sw) * (x[i] - sx / sw);
            sxy += w[i] * (x[i] - sx / sw) * (y[i] - sy / sw);
        }
        double slope = sxy / sxx;
        Fit fit = qr.fit();
        assertThat(fit.estimates()[1]).isEqualTo(slope, within(1e-13 * slope));
        assertThat(fit.estimates()[0]).isEqualTo((sy - slope * sx) / sw, within(1e-12));
        assertThat(fit.covariance()[3]).isEqualTo(1 / sxx, within(1e-12 / sxx));
        assertThat(fit.residualSd()).isEqualTo(1, within(0.4));
    }

    /** A polynomial to the tenth power over a range of 1.2, eleven columns, known exactly: what κ·ε lets through. */
    @Test
    void solvesElevenIllConditionedColumnsOverManyBlocks() {
        BlockQr qr = new BlockQr(11);
        for (int i = 0; i < 3000; i++) {
            double x = -1 + 1.2 * i / 2999;
            double[] phi = new double[11];
            double y = 0;
            for (int j = 0; j < 11; j++) {
                phi[j] = j == 0 ? 1 : phi[j - 1] * x;
                y += (j + 1) * phi[j];
            }
            qr.add(phi, y, 1);
        }
        Fit fit = qr.fit();
        assertThat(fit.conditionIndex()).isGreaterThan(8e5);
        for (int j = 0; j < 11; j++) {
            assertThat(fit.estimates()[j])
                    .isEqualTo(j + 1, within(fit.conditionIndex() * 100 * Math.ulp(1.0) * (j + 1)));
        }
    }
}
