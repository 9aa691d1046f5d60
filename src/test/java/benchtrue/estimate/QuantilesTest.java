package benchtrue.estimate;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.util.List;
import org.junit.jupiter.api.Test;

final class QuantilesTest {
    /** Source: quantiles computed with 40 digits; any handbook has the first of them (folder tables). */
    @Test
    void agreeWithTheTables() throws IOException {
        List<String> lines;
        try (InputStream in = QuantilesTest.class.getResourceAsStream("/benchtrue/estimate/tables/quantiles.csv")) {
            lines = new String(in.readAllBytes(), StandardCharsets.UTF_8)
                    .lines()
                    .skip(1)
                    .toList();
        }
        assertThat(lines).hasSizeGreaterThan(400);
        for (String line : lines) {
            String[] cells = line.split(",", -1);
            double p = Double.parseDouble(cells[3]);
            double expected = Double.parseDouble(cells[4]);
            double tail = 1 - p;
            double tolerance = 1e-9 * Math.max(1, Math.abs(expected));
            switch (cells[0]) {
                case "t" ->
                    assertThat(Quantiles.student(tail, Double.parseDouble(cells[1])))
                            .as(line)
                            .isEqualTo(expected, within(tolerance));
                case "chi2" ->
                    assertThat(Quantiles.chiSquaredTail(expected, Double.parseDouble(cells[1])))
                            .as(line)
                            .isEqualTo(tail, within(1e-12));
                case "F" ->
                    assertThat(Quantiles.fisher(tail, Double.parseDouble(cells[1]), Double.parseDouble(cells[2])))
                            .as(line)
                            .isEqualTo(expected, within(tolerance));
                default ->
                    assertThat(Quantiles.student(tail, Double.POSITIVE_INFINITY))
                            .as(line)
                            .isEqualTo(expected, within(tolerance));
            }
        }
    }
}
