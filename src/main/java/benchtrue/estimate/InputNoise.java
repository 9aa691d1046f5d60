package benchtrue.estimate;

/**
 * What noise of the channels in the regressors does to the estimates: least squares shrinks a coefficient by
 * σx²/(σx² + ux²), σx² what is left of the true x after the other regressors, and the result looks perfectly settled. In
 * general, with δφ and δy what the noise adds to a row, the estimates are moved by −P·(N·θ − m), N = Σw·δφδφᵀ and m = Σw·δφδy
 * (Fuller 1987, Measurement Error Models, 1.1 and 2.2; from memory).
 */
public final class InputNoise {
    private static final double OF_U = 0.1;
    private static final double HALF = 0.5;

    private final int p;
    private final double[] n;
    private final double[] m;
    private final double[] delta;

    public InputNoise(int unknowns) {
        p = unknowns;
        n = new double[p * p];
        m = new double[p];
        delta = new double[p];
    }

    /**
     * Takes in what one standard deviation of one channel does to a row; noises of channels do not depend on each other.
     *
     * @param moved regressors of the row with the channel moved; read
     * @param movedY its response
     * @return whether any regressor moved
     */
    public boolean add(double[] phi, double y, double[] moved, double movedY, double w) {
        for (int j = 0; j < p; j++) {
            delta[j] = moved[j] - phi[j];
        }
        boolean any = false;
        for (int i = 0; i < p; i++) {
            if (delta[i] != 0) {
                any = true;
                m[i] += w * delta[i] * (movedY - y);
                for (int j = 0; j < p; j++) {
                    n[i * p + j] += w * delta[i] * delta[j];
                }
            }
        }
        return any;
    }

    /** All rows so far weigh {@code factor} times as much. */
    public void age(double factor) {
        for (int i = 0; i < n.length; i++) {
            n[i] *= factor;
        }
        for (int i = 0; i < p; i++) {
            m[i] *= factor;
        }
    }

    /**
     * @param bias by which the estimate is off, in its unit
     * @param share of what the other regressors leave of this one that is noise, 0…1
     * @param flagged whether |bias| exceeds a tenth of U
     * @param onlyNoise whether at least half of what is left is noise: then the unknown is not determined by these readings
     */
    public record Effect(double bias, double share, boolean flagged, boolean onlyNoise) {}

    /**
     * @param inverse P = (Σwφφᵀ)⁻¹ over the same rows, p×p; read
     * @param expanded U of this unknown
     */
    public Effect on(int unknown, double[] inverse, double[] estimates, double expanded) {
        double bias = 0;
        double left = 0;
        for (int k = 0; k < p; k++) {
            double pull = -m[k];
            double across = 0;
            for (int l = 0; l < p; l++) {
                pull += n[k * p + l] * estimates[l];
                across += n[k * p + l] * inverse[unknown * p + l];
            }
            bias -= inverse[unknown * p + k] * pull;
            left += inverse[unknown * p + k] * across;
        }
        // 1/P is the sum of squares of what is left of x, noise and all; PₖNPₖᵀ/P² that of its noise.
        double share = Math.min(1, left / inverse[unknown * p + unknown]);
        return new Effect(bias, share, Math.abs(bias) > OF_U * expanded, share >= HALF);
    }

    /** Noise and rounding to a step together: √(σ² + step²/12). */
    public static double standard(double sd, double step) {
        return Math.sqrt(sd * sd + step * step / 12);
    }

    /** Whether readings of so little noise for their step average out poorly: σ &lt; 0.3 step. */
    public static boolean quantised(double sd, double step) {
        return sd < 0.3 * step;
    }
}
