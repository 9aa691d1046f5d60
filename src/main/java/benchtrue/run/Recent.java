package benchtrue.run;

/** The last values of one quantity. */
final class Recent {
    private final double[] values;
    private int next;
    private int size;

    Recent(int capacity) {
        values = new double[capacity];
    }

    void add(double value) {
        values[next] = value;
        next = next + 1 == values.length ? 0 : next + 1;
        size = Math.min(size + 1, values.length);
    }

    /** A copy, oldest first. */
    double[] copy() {
        double[] copy = new double[size];
        for (int i = 0; i < size; i++) {
            copy[i] = values[(next - size + i + values.length) % values.length];
        }
        return copy;
    }
}
