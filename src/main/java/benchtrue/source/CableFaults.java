package benchtrue.source;

/**
 * What is wrong with the cable of a rehearsal, on top of the faults of the sheet.
 *
 * @param cutEverySeconds the cable is cut each time so long after the start; infinite: never
 * @param cutForSeconds how long a cut lasts, shorter than from one to the next
 * @param garble probability that one bit of a line or answer is turned over, 0…1
 */
public record CableFaults(double cutEverySeconds, double cutForSeconds, double garble) {
    /** A sound cable. */
    public static final CableFaults NONE = new CableFaults(Double.POSITIVE_INFINITY, 0, 0);

    public CableFaults {
        if (!(cutForSeconds >= 0 && cutForSeconds < cutEverySeconds && garble >= 0 && garble <= 1)) {
            throw new IllegalArgumentException(
                    "cut every " + cutEverySeconds + " s for " + cutForSeconds + " s, garble " + garble);
        }
    }
}
