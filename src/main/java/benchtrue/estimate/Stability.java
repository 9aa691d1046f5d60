package benchtrue.estimate;

/**
 * Whether the unknowns stayed the same through the run: cumulated recursive residuals and their squares against the 5 % bounds
 * of Brown, Durbin and Evans (1975, Journal of the Royal Statistical Society B 37, 149). Rows are taken in in their order, in
 * bounded memory: of a long run every 2ᵏ-th point of the two curves is kept and compared.
 */
public final class Stability {
    private static final int MOST_POINTS = 4096;
    /** a of ±a(√N + 2t/√N) at 5 %: P(Z &gt; 3a) + exp(−4a²)·P(Z &lt; a) = 0.025. */
    private static final double A = 0.9478989165152762;

    private final int p;
    private final InformationFactor factor;
    private final double[] v;
    private final double[] sums = new double[MOST_POINTS];
    private final double[] squares = new double[MOST_POINTS];
    private final double[] times = new double[MOST_POINTS];
    private long stride = 1;
    private int points;
    private long seen;
    private double sum;
    private double square;

    public Stability(int unknowns) {
        p = unknowns;
        factor = new InformationFactor(p);
        v = new double[p];
    }

    /**
     * Takes a row in.
     *
     * @return its recursive residual, in the response's unit for a weight of 1; NaN while the unknowns are not determined
     */
    public double add(double time, double[] phi, double y, double w) {
        double e = factor.eliminate(phi, y, v);
        double leverage = w * factor.leverage(v);
        factor.add(phi, y, w);
        // Infinite while φ has a part of which nothing is known; past 1e24 that part is rounding.
        if (!(leverage < 1e24)) {
            return Double.NaN;
        }
        double residual = e / Math.sqrt((1 + leverage) / w);
        sum += residual;
        square += residual * residual;
        if (seen++ % stride == 0) {
            keep(time);
        }
        return residual;
    }

    private void keep(double time) {
        if (points == MOST_POINTS) {
            points = 0;
            for (int i = 0; i < MOST_POINTS; i += 2) {
                sums[points] = sums[i];
                squares[points] = squares[i];
                times[points++] = times[i];
            }
            stride *= 2;
        }
        sums[points] = sum;
        squares[points] = square;
        times[points++] = time;
    }

    /**
     * @param largest of |curve|/bound; above 1: crossed; NaN with fewer than 8 residuals
     * @param largestAt its time: about where the noise changed, of the squares
     * @param crossedAt time of the first crossing; NaN: none
     */
    public record Curve(double largest, double largestAt, double crossedAt) {
        public boolean crossed() {
            return largest > 1;
        }
    }

    /** The cumulated residuals: they leave their bounds when unknowns move. */
    public Curve cusum() {
        double n = seen;
        double s = Math.sqrt(square / n);
        double root = Math.sqrt(n);
        return curve(i -> Math.abs(sums[i]) / s / (A * (root + 2 * number(i) / root)));
    }

    /** The cumulated squares as a share of all: they leave their bounds when the noise changes. */
    public Curve cusumOfSquares() {
        double half = seen / 2.0 - 1;
        // 5 % point of Durbin (1969); formula of Edgerton and Wells (1994, Oxford Bulletin 56, 355), from memory.
        double bound = 1.3581015 / Math.sqrt(half) - 0.6701218 / half - 0.8858694 / (half * Math.sqrt(half));
        return curve(i -> Math.abs(squares[i] / square - number(i) / seen) / bound);
    }

    private double number(int i) {
        return i * (double) stride + 1;
    }

    private interface Relative {
        double at(int i);
    }

    private Curve curve(Relative relative) {
        if (seen < 8 || !(square > 0)) {
            return new Curve(Double.NaN, Double.NaN, Double.NaN);
        }
        double largest = 0;
        double largestAt = Double.NaN;
        double crossedAt = Double.NaN;
        for (int i = 0; i < points; i++) {
            double value = relative.at(i);
            if (value > 1 && Double.isNaN(crossedAt)) {
                crossedAt = times[i];
            }
            if (value > largest) {
                largest = value;
                largestAt = times[i];
            }
        }
        return new Curve(largest, largestAt, crossedAt);
    }

    public long count() {
        return seen;
    }
}
