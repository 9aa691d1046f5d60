package benchtrue.alarm;

/** What is to be done with a row after its innovation was judged. */
public sealed interface Decision {
    /** The row goes into the estimate. */
    record Use() implements Decision {}

    /** The row stays out of the estimate, which forgets by time only. */
    record HoldOut(String reason) implements Decision {
        /** Whether the sample test held it out, so that it may be let in again when a step is confirmed. */
        public boolean bySampleTest() {
            return reason.equals("outlier") || reason.equals("intermittent");
        }
    }

    /**
     * A step is confirmed: the last {@code rows} rows of this relation, this one included, were all beyond the bound on one
     * side. Those held out are let in again, oldest first.
     */
    record Readmit(int rows) implements Decision {}
}
