package benchtrue.estimate;

import java.util.Arrays;

/**
 * The information matrix A = R̄ᵀDR̄ and its right-hand side without square roots: R̄ is unit upper triangular with the response
 * as one more column z, D diagonal, and θ solves R̄θ = z (Gentleman 1973, Applied Statistics algorithm AS 274; from memory).
 * It starts with D = 0, so no prior biases the result. No method allocates.
 */
final class InformationFactor {
    /** dⱼ/‖column j‖² below this: unknown j is not determined; the square of one over the largest condition, 1e12. */
    private static final double NOT_DETERMINED = 1e-24;

    private final int p;
    private final int stride;
    /** Row i holds R̄ᵢⱼ at i·stride + j for j &gt; i, and zᵢ at i·stride + p. */
    private final double[] r;

    private final double[] d;
    private final double[] x;

    InformationFactor(int unknowns) {
        p = unknowns;
        stride = p + 1;
        r = new double[p * stride];
        d = new double[p];
        x = new double[stride];
    }

    void clear() {
        Arrays.fill(r, 0);
        Arrays.fill(d, 0);
    }

    void copy(InformationFactor other) {
        System.arraycopy(other.r, 0, r, 0, r.length);
        System.arraycopy(other.d, 0, d, 0, p);
    }

    /** A ← factor·A; θ stays. */
    void age(double factor) {
        for (int i = 0; i < p; i++) {
            d[i] *= factor;
        }
    }

    /**
     * A ← A + w·φφᵀ, with the response y. φ is read.
     *
     * @return the squared recursive residual, what the row adds to the residual sum of squares; NaN where it adds none, because
     *     it was the first to tell something of one of the unknowns
     */
    double add(double[] phi, double y, double w) {
        System.arraycopy(phi, 0, x, 0, p);
        x[p] = y;
        double left = rotateIn(w);
        return left > 0 ? left * x[p] * x[p] : Double.NaN;
    }

    /** Adds all of another one, each row weighted by {@code weight}. */
    void add(InformationFactor other, double weight) {
        for (int i = 0; i < p; i++) {
            if (other.d[i] > 0) {
                other.row(i, x);
                rotateIn(weight * other.d[i]);
            }
        }
    }

    /** Row i of R̄ with its right-hand side; into has p + 1 entries. */
    private void row(int i, double[] into) {
        Arrays.fill(into, 0, i, 0);
        into[i] = 1;
        System.arraycopy(r, i * stride + i + 1, into, i + 1, p - i);
    }

    /** Rotates the row in {@code x} in, unknown by unknown, and gives the weight with which its rest is left over. */
    private double rotateIn(double weight) {
        double w = weight;
        for (int i = 0; i < p && w > 0; i++) {
            double xi = x[i];
            if (xi == 0) {
                continue;
            }
            double before = d[i];
            double after = before + w * xi * xi;
            if (!(after > 0)) {
                continue;
            }
            double c = before / after;
            double s = w * xi / after;
            d[i] = after;
            w *= c;
            if (c < 0.5) {
                turnFar(i, xi, c, s);
            } else {
                turn(i, xi, s);
            }
        }
        return w;
    }

    /** r ← c·r + s·x, x ← x − xᵢ·r: where the factor turns far, the old x says more exactly what is new. */
    private void turnFar(int i, double xi, double c, double s) {
        int row = i * stride;
        for (int j = i + 1; j <= p; j++) {
            double old = x[j];
            double entry = r[row + j];
            x[j] = Math.fma(-xi, entry, old);
            r[row + j] = Math.fma(s, old, c * entry);
        }
    }

    /** The same as r ← r + s·(x − xᵢ·r), because c = 1 − s·xᵢ. */
    private void turn(int i, double xi, double s) {
        int row = i * stride;
        for (int j = i + 1; j <= p; j++) {
            double entry = r[row + j];
            double left = Math.fma(-xi, entry, x[j]);
            x[j] = left;
            r[row + j] = Math.fma(s, left, entry);
        }
    }

    /** Σ_{j&gt;i} R̄ᵢⱼ·aⱼ in four sums side by side: a single one would wait for each of its additions. */
    private double beyond(int i, double[] a) {
        int row = i * stride;
        double s0 = 0;
        double s1 = 0;
        double s2 = 0;
        double s3 = 0;
        int j = i + 1;
        for (; j + 3 < p; j += 4) {
            s0 = Math.fma(r[row + j], a[j], s0);
            s1 = Math.fma(r[row + j + 1], a[j + 1], s1);
            s2 = Math.fma(r[row + j + 2], a[j + 2], s2);
            s3 = Math.fma(r[row + j + 3], a[j + 3], s3);
        }
        for (; j < p; j++) {
            s0 = Math.fma(r[row + j], a[j], s0);
        }
        return (s0 + s1) + (s2 + s3);
    }

    /**
     * Solves R̄ᵀv = φ.
     *
     * @return y − vᵀz, which is y − φᵀθ
     */
    double eliminate(double[] phi, double y, double[] v) {
        System.arraycopy(phi, 0, v, 0, p);
        double e = y;
        for (int i = 0; i < p; i++) {
            double vi = v[i];
            if (vi != 0) {
                int row = i * stride;
                for (int j = i + 1; j < p; j++) {
                    v[j] -= vi * r[row + j];
                }
                e -= vi * r[row + p];
            }
        }
        return e;
    }

    /** φᵀPφ from v of {@link #eliminate}; infinite where φ has a part of which nothing is known. */
    double leverage(double[] v) {
        double sum = 0;
        for (int i = 0; i < p; i++) {
            if (v[i] != 0) {
                sum += v[i] * v[i] / d[i];
            }
        }
        return sum;
    }

    /** Solves R̄θ = z. */
    void solve(double[] theta) {
        for (int i = p - 1; i >= 0; i--) {
            theta[i] = r[i * stride + p] - beyond(i, theta);
        }
    }

    /** Solves R̄x = a in place, a and x with p entries. */
    void solveInPlace(double[] a) {
        for (int i = p - 1; i >= 0; i--) {
            a[i] -= beyond(i, a);
        }
    }

    /** a ← R̄a in place. */
    void multiplyInPlace(double[] a) {
        for (int i = 0; i < p; i++) {
            a[i] += beyond(i, a);
        }
    }

    /** a ← D⁻¹a; 0/0 is 0. */
    void divideInPlace(double[] a) {
        for (int i = 0; i < p; i++) {
            a[i] = a[i] == 0 ? 0 : a[i] / d[i];
        }
    }

    /**
     * A ← A − (1−μ)·Aφφᵀ A/(φᵀAφ): forgets along the direction of φ only, θ stays (Cao and Schwartz 2000, Automatica 36, 1725;
     * from memory). With v = R̄φ, q = Σdᵢvᵢ², c = (1−μ)/q and tᵢ = tᵢ₋₁ − c·dᵢvᵢ² from t₀ = 1: dᵢ ← dᵢtᵢ/tᵢ₋₁ and
     * R̄ᵢ ← R̄ᵢ − (c·vᵢ/tᵢ)·Σ_{j&gt;i} dⱼvⱼR̄ⱼ with the old rows. As t stays in [μ, 1], d stays positive.
     */
    void ageAlong(double[] phi, double mu, double[] v, double[] old) {
        System.arraycopy(phi, 0, v, 0, p);
        multiplyInPlace(v);
        double q = 0;
        for (int i = 0; i < p; i++) {
            q += d[i] * v[i] * v[i];
        }
        if (!(q > Double.MIN_NORMAL)) {
            return;
        }
        double c = (1 - mu) / q;
        // Σ over the rows below, of the old rows: gathered from the last row upwards, so t is needed from its end too.
        double t = mu;
        Arrays.fill(x, 0);
        for (int i = p - 1; i >= 0; i--) {
            double before = t + c * d[i] * v[i] * v[i];
            row(i, old);
            double share = c * v[i] / t;
            for (int j = i + 1; j <= p; j++) {
                r[i * stride + j] -= share * x[j];
            }
            double weight = d[i] * v[i];
            for (int j = i; j <= p; j++) {
                x[j] += weight * old[j];
            }
            d[i] *= t / before;
            t = before;
        }
    }

    /** Whether every unknown has a value: no dⱼ is rounding beside its column. */
    boolean isDetermined() {
        for (int j = 0; j < p; j++) {
            if (!(d[j] > NOT_DETERMINED * normSquared(j))) {
                return false;
            }
        }
        return true;
    }

    /** Diagonal entry: what is known of unknown i when those before it are left free, in units of the weights. */
    double d(int i) {
        return d[i];
    }

    /** Entry of R̄ for j ≥ i. */
    double r(int i, int j) {
        return i == j ? 1 : r[i * stride + j];
    }

    /** Diagonal of A: Σ f·w·φⱼ². */
    double normSquared(int j) {
        double sum = d[j];
        for (int i = 0; i < j; i++) {
            double entry = r[i * stride + j];
            sum += d[i] * entry * entry;
        }
        return sum;
    }

    int size() {
        return p;
    }
}
