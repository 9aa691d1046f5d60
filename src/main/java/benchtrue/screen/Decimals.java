package benchtrue.screen;

import benchtrue.estimate.Rounded;
import java.math.BigDecimal;
import java.math.RoundingMode;
import java.util.HashMap;
import java.util.Map;

/**
 * Values with their U, rounded as GUM 7.2.6 says, but so that the number of digits does not dance while U wavers about a power
 * of ten: a digit that was once shown is kept until U is 130 of it.
 */
final class Decimals {
    private static final double LEAST = 10;
    private static final double MOST = 130;

    private final Map<String, Integer> scales = new HashMap<>();

    String text(String name, double value, double expanded) {
        Rounded rounded = Rounded.of(value, expanded);
        if (rounded.exponent() != 0 || !(expanded > 0) || !Double.isFinite(value)) {
            scales.remove(name);
            return rounded.text();
        }
        int now = scale(rounded.uncertainty());
        Integer before = scales.get(name);
        if (before != null && before != now) {
            double lastDigits = expanded * Math.pow(10, before);
            if (lastDigits >= LEAST && lastDigits <= MOST) {
                return at(value, before) + " ± " + up(expanded, before);
            }
        }
        scales.put(name, now);
        return rounded.text();
    }

    private static int scale(String uncertainty) {
        int point = uncertainty.indexOf('.');
        return point < 0 ? 0 : uncertainty.length() - point - 1;
    }

    private static String at(double value, int scale) {
        return new BigDecimal(value).setScale(scale, RoundingMode.HALF_EVEN).toPlainString();
    }

    private static String up(double expanded, int scale) {
        return BigDecimal.valueOf(expanded)
                .setScale(scale, RoundingMode.CEILING)
                .toPlainString();
    }
}
