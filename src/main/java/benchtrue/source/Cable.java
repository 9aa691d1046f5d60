package benchtrue.source;

import java.util.Arrays;

/** The cable of a rehearsal: what arrives of what is sent. */
final class Cable {
    private static final int STREAM = -1;

    private final CableFaults faults;
    private final Noise chance;
    private boolean wasCut;

    Cable(CableFaults faults, long seed) {
        this.faults = faults;
        chance = new Noise(seed, STREAM);
    }

    /** @param seconds since the start */
    boolean isCut(double seconds) {
        double every = faults.cutEverySeconds();
        return seconds >= every && seconds % every < faults.cutForSeconds();
    }

    /** What arrives of one line or answer: at the beginning of a cut its first half, later in a cut nothing. */
    byte[] carry(byte[] sent, double seconds) {
        boolean first = !wasCut;
        wasCut = isCut(seconds);
        if (wasCut) {
            return Arrays.copyOf(sent, first ? sent.length / 2 : 0);
        }
        byte[] arriving = sent.clone();
        if (faults.garble() > 0 && chance.uniform() < faults.garble()) {
            int bit = (int) (chance.uniform() * arriving.length * Byte.SIZE);
            arriving[bit / Byte.SIZE] ^= (byte) (1 << bit % Byte.SIZE);
        }
        return arriving;
    }
}
