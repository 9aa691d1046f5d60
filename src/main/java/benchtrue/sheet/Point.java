package benchtrue.sheet;

/**
 * A planned operating point.
 *
 * @param set one value for each channel in its unit, NaN where the point leaves it free
 * @param dwellSeconds how long to stay
 */
public record Point(double[] set, double dwellSeconds) {}
