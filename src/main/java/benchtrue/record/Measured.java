package benchtrue.record;

import benchtrue.estimate.Rounded;

/** A measured value with its expanded uncertainty. */
final class Measured {
    private Measured() {}

    /** Rounded together after GUM 7.2.6; the value alone where U is not known. */
    static String text(double value, double expandedUncertainty) {
        return Rounded.of(value, expandedUncertainty).text();
    }
}
