package benchtrue.alarm;

/**
 * Rows far from the reference wait here until the next ones tell what they are: one beyond 5 σ with none like it beside it is
 * an isolated outlier and is dropped; a few in a row are clipped at 4 σ, so that a loose lead does not carry the sums away;
 * five or more on one side are no outliers and go on as they are. (Clipped, a large change of one unknown would look like an
 * offset.)
 */
final class Suspense {
    static final double CLIP = 4;

    private static final double ISOLATED = 5;
    private static final int ESTABLISHED = 5;

    private final Bank bank;
    private final double[][] phi;
    private final double[] roots = new double[ESTABLISHED];
    private final double[] errors = new double[ESTABLISHED];
    private final double[] standardised = new double[ESTABLISHED];
    private final double[] times = new double[ESTABLISHED];
    private final long[] numbers = new long[ESTABLISHED];
    private int waiting;
    private boolean established;
    private boolean up;

    Suspense(Bank bank) {
        this.bank = bank;
        phi = new double[ESTABLISHED][bank.regressors()];
    }

    /** @param row read and copied */
    void add(double[] row, double root, double error, double z, double time, long number) {
        boolean far = Math.abs(z) > CLIP;
        if (!far || up != z > 0) {
            release();
            established = false;
        }
        if (!far || established) {
            bank.add(row, root, error, z, time, number);
            return;
        }
        up = z > 0;
        System.arraycopy(row, 0, phi[waiting], 0, row.length);
        roots[waiting] = root;
        errors[waiting] = error;
        standardised[waiting] = z;
        times[waiting] = time;
        numbers[waiting] = number;
        if (++waiting == ESTABLISHED) {
            established = true;
            pass(false);
        }
    }

    private void release() {
        if (waiting == 1 && Math.abs(standardised[0]) > ISOLATED) {
            waiting = 0;
        }
        pass(true);
    }

    private void pass(boolean clipped) {
        for (int i = 0; i < waiting; i++) {
            double z = standardised[i];
            double kept = clipped ? Math.max(-CLIP, Math.min(CLIP, z)) : z;
            bank.add(phi[i], roots[i], errors[i] * (kept / z), kept, times[i], numbers[i]);
        }
        waiting = 0;
    }

    /** Passes on what waits as it is: it was no outlier. */
    void flush() {
        pass(false);
    }

    void clear() {
        waiting = 0;
        established = false;
    }
}
