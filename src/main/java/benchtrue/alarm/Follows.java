package benchtrue.alarm;

/** Straight line of a residual over something that it should not follow: slope, share of the variance, t. */
final class Follows {
    private long n;
    private double sumX;
    private double sumY;
    private double sumXx;
    private double sumXy;
    private double sumYy;

    void add(double x, double y) {
        n++;
        sumX += x;
        sumY += y;
        sumXx += x * x;
        sumXy += x * y;
        sumYy += y * y;
    }

    void clear() {
        n = 0;
        sumX = 0;
        sumY = 0;
        sumXx = 0;
        sumXy = 0;
        sumYy = 0;
    }

    long count() {
        return n;
    }

    private double variance() {
        return sumXx - sumX * sumX / n;
    }

    /** NaN where x has not varied. */
    double slope() {
        double variance = variance();
        return variance > 1e-12 * sumXx ? (sumXy - sumX * sumY / n) / variance : Double.NaN;
    }

    /** Share of the variance of y that the line explains, 0 where x has not varied. */
    double share() {
        double slope = slope();
        double all = sumYy - sumY * sumY / n;
        return slope * slope >= 0 && all > 0 ? slope * slope * variance() / all : 0;
    }

    /** |slope| in units of its standard deviation, as if neighbours were independent. */
    double significance() {
        double share = share();
        return share < 1 ? Math.sqrt(share / (1 - share) * (n - 2)) : Double.POSITIVE_INFINITY;
    }
}
