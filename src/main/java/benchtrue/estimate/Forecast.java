package benchtrue.estimate;

import java.util.Locale;

/**
 * When the wanted U will be reached if the rig stays where it is.
 *
 * @param readings still to come; 0: it is reached; infinite: never
 * @param seconds the same as time
 * @param neverWhy why never; empty otherwise
 */
public record Forecast(double readings, double seconds, String neverWhy) {
    private static final double MOST = 0x1p40;

    /**
     * @param perReading M = Σwφφᵀ of one reading, the mean over the last ones, p×p
     * @param interval seconds between readings
     */
    public static Forecast of(Prospect now, double wanted, double[] perReading, double interval) {
        if (now.expanded() <= wanted) {
            return new Forecast(0, 0, "");
        }
        if (now.otherExpanded() >= wanted) {
            return never("the declared other uncertainty alone makes U " + figure(now.otherExpanded())
                    + "; more readings do not help");
        }
        double few = 0;
        double many = 1;
        while (many < MOST && !(now.after(perReading, many).expanded() <= wanted)) {
            few = many;
            many *= 2;
        }
        if (many >= MOST) {
            return never(why(now, wanted, perReading));
        }
        while (many - few > Math.max(1, 1e-3 * many)) {
            double middle = Math.floor((few + many) / 2);
            if (now.after(perReading, middle).expanded() <= wanted) {
                many = middle;
            } else {
                few = middle;
            }
        }
        return new Forecast(many, many * interval, "");
    }

    private static Forecast never(String why) {
        return new Forecast(Double.POSITIVE_INFINITY, Double.POSITIVE_INFINITY, why);
    }

    private static String why(Prospect now, double wanted, double[] perReading) {
        if (now.factor() < 1 && now.withoutForgetting().after(perReading, MOST).expanded() <= wanted) {
            double held = now.after(perReading, 50 / (1 - now.factor())).expanded();
            return "a memory of " + figure(1 / (1 - now.factor())) + " readings holds U at " + figure(held)
                    + "; a longer memory would reach it";
        }
        return "the present operating point does not tell this unknown apart: change it";
    }

    private static String figure(double value) {
        return String.format(Locale.ROOT, value >= 100 && value < 1e6 ? "%.0f" : "%.3g", value);
    }
}
