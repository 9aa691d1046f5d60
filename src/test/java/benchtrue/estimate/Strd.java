package benchtrue.estimate;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * A certified data set of the NIST Statistical Reference Datasets (linear regression).
 *
 * @param rows regressors, the intercept first where there is one
 */
record Strd(String name, double[][] rows, double[] response, double[] estimates, double[] sds, double residualSd) {
    static Strd read(String name) {
        Table table = Table.read("strd/" + name + ".csv");
        String json = section(name);
        double[] estimates = numbers(json, "\"estimates\": \\[([^\\]]*)\\]");
        double[] sds = numbers(json, "\"sd_of_estimates\": \\[([^\\]]*)\\]");
        double residualSd = numbers(json, "\"residual_sd\": (\"[^\"]*\")")[0];
        boolean intercept = json.contains("\"intercept\": true");
        boolean polynomial = table.columns().size() == 2 && estimates.length > 2;
        double[][] rows = new double[table.size()][];
        double[] response = new double[table.size()];
        for (int i = 0; i < rows.length; i++) {
            response[i] = table.rows()[i][0];
            rows[i] = polynomial ? powers(table.rows()[i][1], estimates.length) : row(table.rows()[i], intercept);
        }
        return new Strd(name, rows, response, estimates, sds, residualSd);
    }

    private static String section(String name) {
        try (InputStream in = Strd.class.getResourceAsStream("/benchtrue/estimate/strd/certified.json")) {
            String all = new String(in.readAllBytes(), StandardCharsets.UTF_8);
            String from = all.substring(all.indexOf("\"" + name + "\": {"));
            int next = from.indexOf("\n },");
            return next < 0 ? from : from.substring(0, next);
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    private static double[] numbers(String json, String pattern) {
        Matcher matcher = Pattern.compile(pattern).matcher(json);
        if (!matcher.find()) {
            throw new IllegalArgumentException(pattern);
        }
        return Arrays.stream(matcher.group(1).split(",", -1))
                .mapToDouble(s -> Double.parseDouble(s.replace("\"", "").trim()))
                .toArray();
    }

    private static double[] powers(double x, int count) {
        double[] powers = new double[count];
        powers[0] = 1;
        for (int i = 1; i < count; i++) {
            powers[i] = powers[i - 1] * x;
        }
        return powers;
    }

    private static double[] row(double[] columns, boolean intercept) {
        double[] row = new double[columns.length - (intercept ? 0 : 1)];
        int at = 0;
        if (intercept) {
            row[at++] = 1;
        }
        System.arraycopy(columns, 1, row, at, columns.length - 1);
        return row;
    }

    int size() {
        return estimates.length;
    }

    /** Right digits of the worst coefficient. */
    double digits(double[] computed) {
        double worst = 17;
        for (int i = 0; i < estimates.length; i++) {
            double relative = Math.abs(computed[i] - estimates[i]) / Math.abs(estimates[i]);
            worst = Math.min(worst, relative == 0 ? 17 : -Math.log10(relative));
        }
        return worst;
    }
}
