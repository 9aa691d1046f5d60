package benchtrue.estimate;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import java.util.List;

/** A table of numbers with a header row, from the test resources. An empty cell is NaN. */
record Table(List<String> columns, double[][] rows) {
    static Table read(String name) {
        try (InputStream in = Table.class.getResourceAsStream("/benchtrue/estimate/" + name)) {
            if (in == null) {
                throw new IllegalArgumentException("no test resource " + name);
            }
            List<String> lines = new String(in.readAllBytes(), StandardCharsets.UTF_8)
                    .lines()
                    .filter(l -> !l.isBlank())
                    .toList();
            double[][] rows = lines.stream()
                    .skip(1)
                    .map(l -> Arrays.stream(l.split(",", -1))
                            .mapToDouble(c -> c.isBlank() ? Double.NaN : Double.parseDouble(c))
                            .toArray())
                    .toArray(double[][]::new);
            return new Table(List.of(lines.get(0).split(",", -1)), rows);
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    int column(String name) {
        int at = columns.indexOf(name);
        if (at < 0) {
            throw new IllegalArgumentException("no column " + name + " in " + columns);
        }
        return at;
    }

    double at(int row, String column) {
        return rows[row][column(column)];
    }

    int size() {
        return rows.length;
    }
}
