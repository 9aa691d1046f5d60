package benchtrue.estimate;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import benchtrue.model.Forgetting;
import benchtrue.model.Memory;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

final class EstimatorTest {
    /** Relative; the 80-digit truth of well-conditioned data is reached to this in double precision. */
    private static final double DOUBLE = 1e-10;

    private static Forgetting factor(double factor) {
        return factor == 1
                ? Forgetting.NONE
                : new Forgetting(Forgetting.Kind.EXPONENTIAL, Memory.Readings.ofFactor(factor));
    }

    /** By hand: means 2 and 5 at two points, squared deviations 0.02 and 0.02 with 4 − 2 degrees of freedom. */
    @Test
    void readingsAtOnePointTellTheNoiseBeforeTheUnknownsAreDetermined() {
        Estimator estimator = new Estimator(new boolean[] {true, false}, 1, Forgetting.NONE);
        double[][] rows = {{0.3, 1.9}, {0.3, 2.1}, {0.7, 4.9}, {0.7, 5.1}};
        double[] expectedFreedom = {0, 1, 1, 2};
        double[] expectedVariance = {Double.NaN, 0.02, 0.02, 0.02};
        for (int t = 0; t < rows.length; t++) {
            estimator.next(1);
            estimator.predict(0, new double[] {1, rows[t][0]}, rows[t][1], 1);
            estimator.use();
            assertThat(estimator.degreesOfFreedom()).isEqualTo(expectedFreedom[t]);
            assertThat(estimator.residualSd(0) * estimator.residualSd(0))
                    .isEqualTo(expectedVariance[t], within(DOUBLE));
        }
    }

    /** Source: weighted batch solutions of invented data computed with 80 digits, at every row (folder recursive). */
    @ParameterizedTest
    @CsvSource({
        "case_a_motor,i omega one,u,lam1,1",
        "case_a_motor,i omega one,u,lam0.99,0.99",
        "case_a_motor,i omega one,u,lam0.95,0.95",
        "case_c_heat_loss,dT dTdt,P,lam1,1",
        "case_c_heat_loss,dT dTdt,P,lam0.99,0.99",
        "case_c_heat_loss,dT dTdt,P,lam0.95,0.95"
    })
    void equalsTheWeightedBatchSolutionAtEveryReading(
            String data, String names, String response, String suffix, double factor) {
        Table readings = Table.read("recursive/" + data + ".csv");
        Table truth = Table.read("recursive/truth_" + data + "_" + suffix + ".csv");
        String[] columns = names.split(" ", -1);
        int p = columns.length;
        Estimator estimator = new Estimator(new boolean[p], 1, factor(factor));
        double[] theta = new double[p];
        double[] inverse = new double[p * p];
        double[] covariance = new double[p * p];
        for (int t = 0; t < readings.size(); t++) {
            double[] phi = new double[p];
            for (int i = 0; i < p; i++) {
                phi[i] = readings.at(t, columns[i]);
            }
            estimator.next(1);
            estimator.predict(0, phi, readings.at(t, response), 1);
            double innovation = estimator.innovation();
            estimator.use();
            if (t + 1 < p) {
                assertThat(estimator.determined()).isFalse();
                continue;
            }
            int row = t + 1 - p;
            assertThat(truth.at(row, "t")).isEqualTo(t + 1);
            estimator.estimates(theta);
            estimator.unscaledCovariance(inverse);
            estimator.covariance(covariance);
            for (int i = 0; i < p; i++) {
                close(theta[i], truth.at(row, "theta_" + columns[i]));
                for (int j = i; j < p; j++) {
                    close(inverse[i * p + j], truth.at(row, "P_" + i + j));
                }
            }
            if (t + 1 > p) {
                close(innovation, truth.at(row, "innovation"));
                double variance = estimator.residualSd(0) * estimator.residualSd(0);
                for (int i = 0; i < p; i++) {
                    double widening = Math.pow(widening(estimator, i, t + 1 - p, factor), 2);
                    close(covariance[i * p + i] / variance / widening, truth.at(row, "sandwich_" + i + i));
                }
            }
        }
        if (factor == 1) {
            int n = readings.size();
            assertThat(estimator.degreesOfFreedom(0)).isEqualTo(n - p, within(1e-9));
            double rss = estimator.residualSd(0) * estimator.residualSd(0) * (n - p);
            close(rss, truth.at(truth.size() - 1, "rss_w"));
        }
    }

    private static double widening(Estimator estimator, int unknown, int count, double factor) {
        double[] u = new double[3];
        double rho = estimator.autocorrelation(unknown);
        double kept = Math.max(factor, 0.99);
        double sum = kept == 1 ? count : (1 - Math.pow(kept, count)) / (1 - kept);
        double squares = kept == 1 ? count : (1 - Math.pow(kept, 2.0 * count)) / (1 - kept * kept);
        boolean counts = rho > 2 / Math.sqrt(sum * sum / squares);
        return counts ? Math.sqrt((1 + Math.min(rho, 0.999)) / (1 - Math.min(rho, 0.999))) : u[0] + 1;
    }

    private static void close(double computed, double truth) {
        assertThat(computed).isEqualTo(truth, within(DOUBLE * Math.max(Math.abs(truth), 1e-12)));
    }

    /**
     * Source: NIST Statistical Reference Datasets, linear regression: certified values; the digits asked for are those that
     * double precision allows a good QR factorisation.
     */
    @ParameterizedTest
    @CsvSource({"Norris,true,12", "NoInt1,false,14", "Longley,true,10.9", "Wampler1,true,9.4", "Wampler3,true,9.1"})
    void reachesTheDigitsOfAGoodQrOnCertifiedData(String name, boolean intercept, double digits) {
        Strd set = Strd.read(name);
        Estimator estimator = new Estimator(constant(set.size(), intercept), 1, Forgetting.NONE);
        for (int i = 0; i < set.rows().length; i++) {
            estimator.next(1);
            estimator.predict(0, set.rows()[i], set.response()[i], 1);
            estimator.use();
        }
        double[] theta = new double[set.size()];
        estimator.estimates(theta);
        assertThat(set.digits(theta)).as(name).isGreaterThanOrEqualTo(digits);
        if (set.residualSd() > 0) {
            assertThat(estimator.residualSd(0)).isEqualTo(set.residualSd(), within(1e-8 * set.residualSd()));
        } else {
            assertThat(estimator.residualSd(0)).isBetween(0.0, 1e-4);
        }
    }

    static boolean[] constant(int p, boolean intercept) {
        boolean[] constant = new boolean[p];
        constant[0] = intercept;
        return constant;
    }

    @Test
    void dataThatFitExactlyGiveNoLargeInnovation() {
        Strd set = Strd.read("Wampler1");
        Estimator estimator = new Estimator(constant(set.size(), true), 1, Forgetting.NONE);
        for (int i = 0; i < set.rows().length; i++) {
            estimator.next(1);
            estimator.predict(0, set.rows()[i], set.response()[i], 1);
            if (estimator.degreesOfFreedom(0) >= 1) {
                assertThat(Math.abs(estimator.standardized())).isLessThan(10);
            }
            estimator.use();
        }
    }
}
