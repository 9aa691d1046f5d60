package benchtrue.record;

/** A measured value with its expanded uncertainty. */
final class Measured {
    private Measured() {}

    /** Rounded together after GUM 7.2.6; the value alone where U is not known. */
    static String text(double value, double expandedUncertainty) {
        return Figures.figure(value, 6) + " ± " + Figures.figure(expandedUncertainty, 2);
    }
}
