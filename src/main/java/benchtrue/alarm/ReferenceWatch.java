package benchtrue.alarm;

import org.jspecify.annotations.Nullable;

/**
 * One relation against the adopted reference: z = (y − φᵀθₐ)/(s·√(1/w + φᵀCₐφ)), thinned until its neighbours are
 * independent, its two-sided CUSUM and the likelihood-ratio bank. Unlike the innovations of the live model, z does not follow
 * a drift. CUSUM and bank speak through one alarm.
 */
final class ReferenceWatch {
    private static final double LEVERAGE_MEMORY = 1.0 / 256;
    private static final double TESTABLE_LEVERAGE = 1;
    private static final int REDESIGN = 64;
    private static final int EVALUATE = 4;
    private static final int ALL = 16;

    private final Watched watched;
    private final Frozen frozen;
    private final int thinning;
    private final Cusum cusum = new Cusum();
    private final Bank bank;
    private final Suspense suspense;
    private final DriftAlarm alarm;
    private final double[] row;
    private CusumDesign design = new CusumDesign(0.5, Double.NaN);
    private double bankLimit = Double.NaN;
    private double meanLeverage;
    private double z = Double.NaN;
    private double error = Double.NaN;
    private double root = 1;
    private double leverage = Double.NaN;
    private int untilDesign;
    private int untilNext;
    private int untilEvaluation = EVALUATE;

    /**
     * @param meanLeverage φᵀCₐφ to be expected at first
     * @param thinning each how many-eth reading is tested, at least 1
     */
    ReferenceWatch(Watched watched, AlarmBook book, Frozen frozen, double meanLeverage, int thinning) {
        this.watched = watched;
        this.frozen = frozen;
        this.meanLeverage = meanLeverage;
        this.thinning = thinning;
        int p = watched.size();
        int q = watched.hasConstantTerm() ? p : p + 1;
        double[] covariance = widened(frozen.covariance, p, q);
        bank = new Bank(covariance, frozen.nu);
        suspense = new Suspense(bank);
        alarm = new DriftAlarm(watched, book, frozen, bank, new Review(bank, covariance));
        row = new double[q];
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

    /** The offset, where it is a hypothesis of its own, is exactly 0 in the reference. */
    private static double[] widened(double[] covariance, int p, int q) {
        double[] wide = new double[q * q];
        for (int i = 0; i < p; i++) {
            System.arraycopy(covariance, i * p, wide, i * q, p);
        }
        return wide;
    }

    static double clip(double z) {
        return Math.max(-Suspense.CLIP, Math.min(Suspense.CLIP, z));
    }

    /** Computes z for a row without testing it. */
    void predict(double[] phi, double response, double weight) {
        int p = frozen.values.length;
        double difference = response;
        double quadratic = 0;
        root = Math.sqrt(weight);
        row[row.length - 1] = root;
        for (int i = 0; i < p; i++) {
            difference -= phi[i] * frozen.values[i];
            double sum = 0;
            for (int j = 0; j < p; j++) {
                sum += frozen.covariance[i * p + j] * phi[j];
            }
            quadratic += phi[i] * sum;
            row[i] = root * phi[i];
        }
        leverage = quadratic * weight;
        error = difference * root / frozen.sd;
        z = error / Math.sqrt(1 + leverage);
    }

    /**
     * Tests the row last predicted, if its turn has come.
     *
     * @param outlier whether the live model holds it out as an isolated outlier
     * @param doubt why nothing is to be told now, or null
     */
    void test(long number, double time, double perReading, boolean outlier, @Nullable String doubt) {
        if (!testable() || --untilNext > 0) {
            return;
        }
        untilNext = thinning;
        meanLeverage += LEVERAGE_MEMORY * (leverage - meanLeverage);
        if (--untilDesign <= 0) {
            design(perReading);
        }
        cusum.step(clip(z), design.slack(), number);
        take(number, time, outlier);
        boolean beyond = cusum.beyond(design.limit());
        if (--untilEvaluation <= 0 || beyond) {
            evaluate();
            alarm.judge(time, cusum, beyond, bankLimit, doubt);
        }
        if (beyond && doubt == null) {
            cusum.clear();
        }
    }

    /** An alarm that stands is brought up to date less often, from evidence of one and the same reading. */
    private void evaluate() {
        if (alarm.stands() && !alarm.provisional()) {
            untilEvaluation = ALL;
            bank.evaluateAll();
        } else if (alarm.stands()) {
            untilEvaluation = EVALUATE;
            bank.evaluateAll();
        } else {
            untilEvaluation = EVALUATE;
            bank.evaluate();
        }
    }

    /** Once an alarm stands the live model, which follows, knows better what an outlier is. */
    private void take(long number, double time, boolean outlier) {
        if (!alarm.stands()) {
            suspense.add(row, root, error, z, time, number);
            return;
        }
        suspense.flush();
        if (!outlier) {
            bank.add(row, root, error, z, time, number);
        }
    }

    private void design(double perReading) {
        untilDesign = REDESIGN;
        double share = perReading * thinning;
        design = CusumDesign.of(share, meanLeverage, frozen.nu);
        bankLimit = BankLimit.of(share, 2 * row.length + 1, frozen.nu);
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

    /** Largest likelihood ratio as a fraction of its limit. */
    double evidence() {
        return alarm.most() / bankLimit;
    }

    /** Forgets the rows since a time in s: they were not what they seemed. */
    void forgetSince(double time) {
        cusum.clear();
        suspense.clear();
        bank.forgetSince(time);
    }

    String label() {
        return watched.label();
    }
}
