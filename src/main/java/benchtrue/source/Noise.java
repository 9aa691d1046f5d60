package benchtrue.source;

/**
 * Random numbers that are the same on every machine and Java: SplitMix64 (Steele, Lea and Flood 2014) and, for the normal
 * distribution, the polar method (Marsaglia and Bray 1964) over {@link StrictMath}.
 */
final class Noise {
    private static final long GOLDEN = 0x9E3779B97F4A7C15L;
    private static final double UNIT = 0x1p-53;

    private long state;
    private double spare = Double.NaN;

    /** @param stream numbers of different streams have nothing to do with each other */
    Noise(long seed, int stream) {
        this(mixed(seed) ^ mixed(stream * GOLDEN + 1));
    }

    private Noise(long state) {
        this.state = state;
    }

    static Noise ofState(long state) {
        return new Noise(state);
    }

    private static long mixed(long bits) {
        long z = (bits ^ (bits >>> 30)) * 0xBF58476D1CE4E5B9L;
        z = (z ^ (z >>> 27)) * 0x94D049BB133111EBL;
        return z ^ (z >>> 31);
    }

    /** 0 ≤ u &lt; 1. */
    double uniform() {
        state += GOLDEN;
        return (mixed(state) >>> 11) * UNIT;
    }

    /** Mean 0, standard deviation 1. */
    double normal() {
        if (!Double.isNaN(spare)) {
            double value = spare;
            spare = Double.NaN;
            return value;
        }
        double x;
        double y;
        double square;
        do {
            x = 2 * uniform() - 1;
            y = 2 * uniform() - 1;
            square = x * x + y * y;
        } while (square >= 1 || square == 0);
        double size = Math.sqrt(-2 * StrictMath.log(square) / square);
        spare = y * size;
        return x * size;
    }
}
