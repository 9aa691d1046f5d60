package benchtrue.run;

import benchtrue.estimate.Component;
import benchtrue.estimate.Uncertainty;
import java.util.ArrayList;
import java.util.List;

/**
 * Unknowns of a group with all that is known of their uncertainty. Arrays are kept and must not be written any more; p is the
 * number of unknowns.
 *
 * @param values p, each in its unit; NaN where not determined
 * @param covariance type A, p×p row by row
 * @param degreesOfFreedom of the type A part
 * @param systematic for each channel with other uncertainty what one standard uncertainty of it does to the values: c×p
 * @param channels names of these
 * @param other declared other uncertainty of the unknowns themselves, p
 */
record Estimates(
        double[] values,
        double[] covariance,
        double degreesOfFreedom,
        double[][] systematic,
        List<String> channels,
        double[] other) {
    private static final double ROUNDING = 1e-9;

    int size() {
        return values.length;
    }

    Uncertainty of(int unknown) {
        return of(unit(unknown));
    }

    List<Component> components(int unknown) {
        return components(unit(unknown));
    }

    private double[] unit(int unknown) {
        double[] coefficients = new double[values.length];
        coefficients[unknown] = 1;
        return coefficients;
    }

    /** Of Σ coefficient·unknown. */
    Uncertainty of(double[] coefficients) {
        return Uncertainty.combine(components(coefficients));
    }

    /** The budget of Σ coefficient·unknown: readings first, then each declared uncertainty that has an effect. */
    List<Component> components(double[] coefficients) {
        List<Component> components = new ArrayList<>();
        components.add(new Component("readings", Math.sqrt(variance(coefficients)), degreesOfFreedom));
        for (int c = 0; c < systematic.length; c++) {
            add(components, "channel " + channels.get(c), Math.abs(sum(coefficients, systematic[c])));
        }
        for (int i = 0; i < other.length; i++) {
            add(components, "other, declared", Math.abs(coefficients[i] * other[i]));
        }
        double largest = components.stream()
                .mapToDouble(Component::standardUncertainty)
                .max()
                .orElse(0);
        // What rounding leaves of an effect that cancels.
        components.removeIf(c -> c.standardUncertainty() < ROUNDING * largest);
        return components;
    }

    private static void add(List<Component> components, String name, double uncertainty) {
        if (uncertainty > 0) {
            components.add(new Component(name, uncertainty, Double.POSITIVE_INFINITY));
        }
    }

    /** Σ coefficient·unknown; an unknown with coefficient 0 need not be determined. */
    double value(double[] coefficients) {
        return sum(coefficients, values);
    }

    private static double sum(double[] coefficients, double[] values) {
        double sum = 0;
        for (int i = 0; i < coefficients.length; i++) {
            if (coefficients[i] != 0) {
                sum += coefficients[i] * values[i];
            }
        }
        return sum;
    }

    private double variance(double[] coefficients) {
        int p = values.length;
        double variance = 0;
        for (int i = 0; i < p; i++) {
            for (int j = 0; j < p; j++) {
                if (coefficients[i] != 0 && coefficients[j] != 0) {
                    variance += coefficients[i] * covariance[i * p + j] * coefficients[j];
                }
            }
        }
        return Math.max(0, variance);
    }
}
