package benchtrue.estimate;

/**
 * Keeps the information from running down where readings stop carrying any while forgetting goes on (after Salgado, Goodwin
 * and Middleton 1988, International Journal of Control 47, 477; from memory; made relative here, because an absolute floor
 * depends on units). The base R̄ᵦ, Dᵦ is the information once the unknowns are determined, refreshed each time it has doubled
 * through the first effective memory. At each reading one row j of the base is looked at in turn: only where its direction has
 * run down, dᵦⱼ·R̄ᵦⱼ·P·R̄ᵦⱼᵀ &gt; 1/(2ρ), a row is added with weight (1−λ)·p·ρ·dᵦⱼ and the response R̄ᵦⱼθ, which leaves θ
 * where it is.
 */
final class InformationFloor {
    static final double SHARE = 0.01;

    private final int p;
    private final InformationFactor base;
    private final double[] direction;
    private final double[] work;
    private boolean set;
    private boolean frozen;
    private int next;
    private long rows;

    InformationFloor(int unknowns) {
        p = unknowns;
        base = new InformationFactor(p);
        direction = new double[p];
        work = new double[p];
    }

    void clear() {
        set = false;
        frozen = false;
        next = 0;
        rows = 0;
    }

    /**
     * Takes the present information for the base where it is the first or has doubled.
     *
     * @param settled whether one effective memory has passed since the unknowns were determined: then the base stays
     * @return whether the base is another one now
     */
    boolean refresh(InformationFactor now, boolean settled) {
        if (frozen || (set && !doubled(now))) {
            frozen |= settled && set;
            return false;
        }
        base.copy(now);
        set = true;
        frozen = settled;
        return true;
    }

    private boolean doubled(InformationFactor now) {
        for (int i = 0; i < p; i++) {
            if (now.normSquared(i) < 2 * base.normSquared(i)) {
                return false;
            }
        }
        return true;
    }

    /** Looks at one direction, or at all after a gap longer than the memory. */
    boolean hold(InformationFactor factor, InformationFactor into, double[] theta, double lost, boolean all) {
        if (!set || lost <= 0) {
            return false;
        }
        boolean held = false;
        for (int count = all ? p : 1; count > 0; count--) {
            held |= holdOne(factor, into, theta, all ? lost : lost * p);
            next = next + 1 == p ? 0 : next + 1;
        }
        return held;
    }

    private boolean holdOne(InformationFactor factor, InformationFactor into, double[] theta, double lost) {
        double response = 0;
        for (int j = 0; j < p; j++) {
            direction[j] = j < next ? 0 : base.r(next, j);
            response += direction[j] * theta[j];
        }
        factor.eliminate(direction, 0, work);
        double known = base.d(next);
        if (!(known * factor.leverage(work) > 1 / (2 * SHARE))) {
            return false;
        }
        into.add(direction, response, lost * SHARE * known);
        rows++;
        return true;
    }

    InformationFactor base() {
        return base;
    }

    boolean isSet() {
        return set;
    }

    /** Rows added since the start of the segment. */
    long rows() {
        return rows;
    }
}
