package benchtrue.sheet;

/**
 * Something that goes wrong in a rehearsal, between two times of the run in seconds; a fault that does not end has an infinite
 * {@code to}. Sizes are in the unit of the channel.
 */
public sealed interface Fault {
    double from();

    double to();

    /** A fault of one channel, by its index. */
    sealed interface OfChannel extends Fault {
        int channel();
    }

    /** The channel reads (1 + size) times what it should; size is reached after {@code overSeconds}. */
    record Gain(int channel, double from, double to, double size, double overSeconds) implements OfChannel {}

    /** The channel reads {@code size} too much; size is reached after {@code overSeconds}. */
    record Offset(int channel, double from, double to, double size, double overSeconds) implements OfChannel {}

    /** An offset that dies away: size·exp(−(t − from)/timeConstant). */
    record WarmUp(int channel, double from, double to, double size, double timeConstantSeconds) implements OfChannel {}

    /** An offset of size·sin(2π·frequency·t), sampled as the readings come. */
    record Hum(int channel, double from, double to, double size, double frequencyHertz) implements OfChannel {}

    /** The channel reads what was true {@code delaySeconds} before. */
    record Late(int channel, double from, double to, double delaySeconds) implements OfChannel {}

    /**
     * A share of the readings is off by something between low and high.
     *
     * @param probability of one reading to be off
     * @param eitherSign whether the sign is drawn too
     */
    record Loose(int channel, double from, double to, double probability, double low, double high, boolean eitherSign)
            implements OfChannel {}

    /** The channel reads nothing below low and above high. */
    record Clip(int channel, double from, double to, double low, double high) implements OfChannel {}

    /** The channel repeats the last reading before. */
    record Stuck(int channel, double from, double to) implements OfChannel {}

    /** A share of the channel's cells is empty. */
    record Missing(int channel, double from, double to, double probability) implements OfChannel {}

    /** No readings come. */
    record Dropout(double from, double to) implements Fault {}

    /** The device starts anew: no readings come from {@code from} to {@code to}, then its clock is off by so much. */
    record Restart(double from, double to, double clockSeconds) implements Fault {}

    /** A share of the raw lines is cut off in the middle; their readings are lost. */
    record Garbled(double from, double to, double probability) implements Fault {}
}
