package benchtrue.estimate;

/**
 * The covariance C of the estimates in units of s²: that of the closed forms until floor rows or directional forgetting make
 * them untrue, that of the gains really applied from then on.
 */
final class CovarianceInForce {
    /** A row that tells so many times what the whitening knows makes it useless: rounding would grow by this factor a row. */
    private static final double OUTGROWN = 100;

    private final int p;
    private final Information information;
    private final AppliedCovariance applied;
    private boolean usesApplied;
    private boolean outgrown;

    CovarianceInForce(int unknowns, Information information) {
        p = unknowns;
        this.information = information;
        applied = new AppliedCovariance(p);
    }

    void clear() {
        usesApplied = false;
        outgrown = false;
    }

    /** Whether it follows the gains that are really applied. */
    boolean usesApplied() {
        return usesApplied;
    }

    /** From now on it follows the gains that are really applied, whitened by this. */
    void follow(InformationFactor whitening) {
        if (!usesApplied) {
            double[] covariance = new double[p * p];
            information.covariance(covariance);
            applied.start(whitening, covariance);
            usesApplied = true;
        }
    }

    /** The same covariance whitened by the present information. */
    void rewhiten() {
        if (usesApplied) {
            double[] covariance = new double[p * p];
            applied.covariance(covariance);
            applied.start(information.joint(), covariance);
        }
    }

    /** φᵀCφ; v solves R̄ᵀv = φ, pPhi is Pφ, work has p entries at least. */
    double quadratic(double[] phi, double[] v, double[] pPhi, double[] work) {
        return usesApplied ? applied.quadratic(phi) : information.quadratic(v, pPhi, work);
    }

    /**
     * A row is taken in.
     *
     * @param pPhi Pφ; becomes the gain where gains are followed
     */
    void use(double[] phi, double[] pPhi, double w) {
        if (!usesApplied) {
            return;
        }
        double leverage = 0;
        for (int i = 0; i < p; i++) {
            leverage += phi[i] * pPhi[i];
        }
        double after = w / (1 + w * leverage);
        for (int i = 0; i < p; i++) {
            pPhi[i] *= after;
        }
        applied.apply(phi, pPhi, w);
        outgrown = w * applied.beyondBase() > OUTGROWN;
    }

    /** The row that was used has been added to the information. */
    void settle() {
        if (outgrown) {
            outgrown = false;
            rewhiten();
        }
    }

    /** C, p×p. */
    void covariance(double[] into) {
        if (usesApplied) {
            applied.covariance(into);
        } else {
            information.covariance(into);
        }
    }
}
