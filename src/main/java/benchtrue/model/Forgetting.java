package benchtrue.model;

/** Along which directions the estimator forgets, and how fast. */
public record Forgetting(Kind kind, Memory memory) {
    public static final Forgetting NONE = new Forgetting(Kind.EXPONENTIAL, new Memory.All());

    public enum Kind {
        /** All directions alike. */
        EXPONENTIAL,
        /** Only the direction of the present regressor. */
        DIRECTIONAL
    }

    /** Whether anything is forgotten at all. */
    public boolean forgets() {
        return !(memory instanceof Memory.All);
    }
}
