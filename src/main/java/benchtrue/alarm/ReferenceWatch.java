package benchtrue.alarm;

/**
 * One relation against the adopted reference: z = (y − φᵀθₐ)/(s·√(1/w + φᵀCₐφ)), thinned until its neighbours are
 * independent, and its two-sided CUSUM. Unlike the innovations of the live model, z does not follow a drift.
 */
final class ReferenceWatch {
    private static final double CLIP = 4;
    private static final double LEVERAGE_MEMORY = 1.0 / 256;
    private static final double TESTABLE_LEVERAGE = 1;
    private static final int REDESIGN = 64;
    private static final int QUIET = 256;

    private final Watched watched;
    private final AlarmBook book;
    private final Frozen frozen;
    private final int thinning;
    private final Cusum cusum = new Cusum();
    private CusumDesign design = new CusumDesign(0.5, Double.NaN);
    private double meanLeverage;
    private double z = Double.NaN;
    private double leverage = Double.NaN;
    private int untilDesign;
    private int untilNext;
    private int quiet;

    /**
     * @param meanLeverage φᵀCₐφ to be expected at first
     * @param thinning each how many-eth reading is tested, at least 1
     */
    ReferenceWatch(Watched watched, AlarmBook book, Frozen frozen, double meanLeverage, int thinning) {
        this.watched = watched;
        this.book = book;
        this.frozen = frozen;
        this.meanLeverage = meanLeverage;
        this.thinning = thinning;
    }

    /**
     * The reference of one relation.
     *
     * @param values of the relation's own unknowns; kept
     * @param covariance of these in units of s², p×p; kept
     * @param sd s of a reading of weight 1, above 0
     * @param nu degrees of freedom of s
     */
    record Frozen(double[] values, double[] covariance, double sd, double nu) {}

    static double clip(double z) {
        return Math.max(-CLIP, Math.min(CLIP, z));
    }

    /** Computes z for a row without testing it. */
    void predict(double[] phi, double response, double weight) {
        int p = frozen.values.length;
        double error = response;
        double quadratic = 0;
        for (int i = 0; i < p; i++) {
            error -= phi[i] * frozen.values[i];
            double row = 0;
            for (int j = 0; j < p; j++) {
                row += frozen.covariance[i * p + j] * phi[j];
            }
            quadratic += phi[i] * row;
        }
        leverage = quadratic * weight;
        z = error / (frozen.sd * Math.sqrt(1 / weight + quadratic));
    }

    /** Tests the row last predicted, if its turn has come. */
    void test(long number, double time, double perReading) {
        if (!testable() || --untilNext > 0) {
            return;
        }
        untilNext = thinning;
        meanLeverage += LEVERAGE_MEMORY * (leverage - meanLeverage);
        if (--untilDesign <= 0) {
            untilDesign = REDESIGN;
            design = CusumDesign.of(perReading * thinning, meanLeverage, frozen.nu);
        }
        cusum.step(clip(z), design.slack(), number);
        judge(time);
    }

    private void judge(double time) {
        quiet += thinning;
        if (!cusum.beyond(design.limit())) {
            if (quiet >= QUIET) {
                book.normal(Alarm.Kind.STEP, watched.label(), null);
            }
            return;
        }
        quiet = 0;
        String text = watched.label() + ": has left the reference model since reading " + cusum.since();
        Finding.Onset onset = new Finding.Onset(Double.NaN, Double.NaN, time, cusum.since());
        book.report(new Finding(
                Alarm.Kind.STEP,
                watched.label(),
                null,
                null,
                onset,
                Double.NaN,
                Double.NaN,
                watched.unit(),
                "not separable",
                true,
                false,
                Alarm.Priority.ACT_NOW,
                text));
        cusum.clear();
    }

    /** False where the reference would have to be extrapolated. */
    boolean testable() {
        return leverage <= TESTABLE_LEVERAGE && Math.abs(z) <= Double.MAX_VALUE;
    }

    double up() {
        return cusum.up() / design.limit();
    }

    double down() {
        return cusum.down() / design.limit();
    }

    /** Starts afresh, as after an intermittent connection. */
    void clear() {
        cusum.clear();
    }
}
