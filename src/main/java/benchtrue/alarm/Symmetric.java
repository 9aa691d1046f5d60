package benchtrue.alarm;

/** Small symmetric positive definite matrices, q×q row by row. */
final class Symmetric {
    /** Information of what is known exactly, relative to that of the readings of any run. */
    private static final double EXACT = 1e30;

    private static final double SINGULAR = 1e-12;

    private static final double RIDGE = 1e-9;

    private Symmetric() {}

    /** a ← a⁻¹ by sweeping each pivot (Goodnight 1979): one division each. */
    static void invert(double[] a, int q) {
        for (int k = 0; k < q; k++) {
            int pivotRow = k * q;
            double d = 1 / a[pivotRow + k];
            for (int i = 0; i < q; i++) {
                if (i != k) {
                    int row = i * q;
                    double f = a[row + k] * d;
                    for (int j = 0; j < q; j++) {
                        a[row + j] -= f * a[pivotRow + j];
                    }
                    a[row + k] = -f;
                }
            }
            for (int j = 0; j < q; j++) {
                a[pivotRow + j] *= d;
            }
            a[pivotRow + k] = d;
        }
    }

    /**
     * gᵀM⁻¹g, in which directions that M knows nothing of count for nothing.
     *
     * @param m positive semidefinite, overwritten
     * @param g read
     */
    static double quadratic(double[] m, double[] g) {
        int q = g.length;
        for (int i = 0; i < q; i++) {
            double own = m[i * q + i];
            m[i * q + i] = own > 0 ? own * (1 + RIDGE) : 1;
        }
        invert(m, q);
        double sum = 0;
        for (int i = 0; i < q; i++) {
            for (int j = 0; j < q; j++) {
                sum += g[i] * m[i * q + j] * g[j];
            }
        }
        return sum;
    }

    /**
     * C⁻¹, in which a quantity without variance has so much information that no reading adds to it.
     *
     * @param c read; may be singular
     */
    static double[] information(double[] c, int q) {
        double[] a = c.clone();
        for (int i = 0; i < q; i++) {
            double variance = c[i * q + i];
            a[i * q + i] = variance > 0 ? variance * (1 + SINGULAR) : 1 / EXACT;
        }
        invert(a, q);
        return a;
    }
}
