package benchtrue.model;

/** A closed interval in the unit of what it bounds. An open side is infinite; never NaN, never empty. */
public record Interval(double lower, double upper) {
    public Interval {
        if (!(lower <= upper)) {
            throw new IllegalArgumentException("interval [" + lower + ", " + upper + "]: lower must not exceed upper");
        }
    }

    /** False for NaN. */
    public boolean contains(double value) {
        return lower <= value && value <= upper;
    }

    /** Infinite where a side is open. */
    public double width() {
        return upper - lower;
    }
}
