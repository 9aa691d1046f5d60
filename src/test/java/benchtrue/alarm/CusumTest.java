package benchtrue.alarm;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.Objects;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

class CusumTest {
    /** The handbook prints two decimals, some of them from single precision: a unit in the last place. */
    private static final double PRINTED = 0.0101;

    @Test
    void everyRowOfTheHandbookIsReached() throws IOException {
        // NIST/SEMATECH e-Handbook of Statistical Methods, 6.3.2.3: target 325, k = 0.3175, h = 4.1959
        Cusum cusum = new Cusum();
        int firstAlarm = 0;
        for (String[] row : rows("cusum_6323.csv")) {
            int group = Integer.parseInt(row[0]);
            cusum.step(Double.parseDouble(row[1]) - 325, 0.3175, group);
            assertThat(cusum.up()).isCloseTo(Double.parseDouble(row[8]), within(PRINTED));
            assertThat(cusum.down()).isCloseTo(Double.parseDouble(row[9]), within(PRINTED));
            if (firstAlarm == 0 && cusum.beyond(4.1959)) {
                firstAlarm = group;
            }
        }
        assertThat(firstAlarm).isEqualTo(14);
    }

    @Test
    void simulatedRunLengthsAgreeWithTheTables() throws IOException {
        // Lucas and Crosier 1982: two-sided, k = 0.5
        SplittableRandom random = new SplittableRandom(20261201);
        for (String[] row : rows("cusum_arl.csv")) {
            double limit = Double.parseDouble(row[1]);
            double shift = Double.parseDouble(row[2]);
            double expected = Double.parseDouble(row[4]);
            RunLengths seen = new RunLengths();
            int runs = (int) Math.min(4000, 400_000 / expected);
            for (int i = 0; i < runs; i++) {
                seen.add(runLength(random, limit, shift));
            }
            assertThat(seen.mean()).isCloseTo(expected, within(4 * seen.standardError()));
        }
    }

    private static double runLength(SplittableRandom random, double limit, double shift) {
        Cusum cusum = new Cusum();
        int n = 0;
        while (!cusum.beyond(limit)) {
            cusum.step(random.nextGaussian() + shift, 0.5, ++n);
        }
        return n;
    }

    @Test
    void theLimitForACertainReferenceIsSiegmundsForHalfASlack() {
        // Siegmund 1985: h = ln ARL₀ − 1.166 for two sides and k = 0.5
        CusumDesign design = CusumDesign.of(1e-5, 0, Double.POSITIVE_INFINITY);
        assertThat(design.slack()).isEqualTo(0.5);
        assertThat(design.limit()).isCloseTo(Math.log(1e5) - 1.166, within(1e-9));
    }

    @Test
    void anUncertainReferenceWidensTheLimitAndAVeryShortOneTheSlack() {
        double certain = CusumDesign.of(1e-5, 0, Double.POSITIVE_INFINITY).limit();
        CusumDesign thousand = CusumDesign.of(1e-5, 0.003, 1000);
        CusumDesign hundred = CusumDesign.of(1e-5, 0.03, 100);
        assertThat(thousand.slack()).isEqualTo(0.5);
        assertThat(thousand.limit()).isBetween(certain + 0.5, certain + 3);
        assertThat(hundred.slack()).isGreaterThan(0.6);
    }

    static List<String[]> rows(String name) throws IOException {
        try (InputStream in = Objects.requireNonNull(CusumTest.class.getResourceAsStream(name))) {
            return new String(in.readAllBytes(), StandardCharsets.UTF_8)
                    .lines()
                    .skip(1)
                    .map(line -> line.split(",", -1))
                    .toList();
        }
    }

    /** Mean of run lengths with its standard error. */
    private static final class RunLengths {
        private long count;
        private double sum;
        private double squares;

        void add(double length) {
            count++;
            sum += length;
            squares += length * length;
        }

        double mean() {
            return sum / count;
        }

        double standardError() {
            return Math.sqrt((squares / count - mean() * mean()) / count);
        }
    }
}
