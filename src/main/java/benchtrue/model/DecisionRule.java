package benchtrue.model;

/** The decision rule chosen beforehand: how wide the guard band between tolerance and acceptance limit is, in U. */
public enum DecisionRule {
    SIMPLE("simple", 0),
    GUARD_083U("0.83U", 0.83),
    GUARD_U("U", 1);

    private final String word;
    private final double guardInU;

    DecisionRule(String word, double guardInU) {
        this.word = word;
        this.guardInU = guardInU;
    }

    /** As the sheet writes it. */
    public String word() {
        return word;
    }

    public double guardInU() {
        return guardInU;
    }
}
