package benchtrue.run;

import benchtrue.model.Memory;

/** What the operator did to the run: recorded with its reading and time, and applied again when the folder is replayed. */
public sealed interface Act extends Message {
    record Acknowledge(int alarm, String comment) implements Act {}

    record Shelve(int alarm, double seconds, String reason) implements Act {}

    record Mark(String note) implements Act {}

    record ChangeMemory(Memory memory) implements Act {}

    /** Readings are tested but not used until the release. */
    record Hold() implements Act {}

    record Release() implements Act {}

    record Adopt(String name, String reason) implements Act {}

    record NewSegment(String reason) implements Act {}

    /** A step of the set-up was done or skipped; {@code step} is warm-up, zero, sign, quiet minute. */
    record SetUp(String step, boolean skipped, String text) implements Act {}
}
