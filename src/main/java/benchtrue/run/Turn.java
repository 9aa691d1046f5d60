package benchtrue.run;

import benchtrue.model.Forgetting;
import org.jspecify.annotations.Nullable;

/**
 * Something that a second pass over the record must repeat before it takes in the reading.
 *
 * @param reading number of the first reading that it holds for
 * @param time of that reading in s; NaN where it has not come yet
 * @param segment why a segment begins; null where none does
 * @param forgetting the new one; null where it stays
 */
record Turn(
        long reading,
        double time,
        @Nullable String segment,
        @Nullable Forgetting forgetting) {

    Turn at(long earlier) {
        return new Turn(earlier, time, segment, forgetting);
    }
}
