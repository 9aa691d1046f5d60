package benchtrue.source;

import benchtrue.model.Conversion;
import benchtrue.sheet.Mistake;
import java.util.List;
import org.jspecify.annotations.Nullable;

/**
 * Which column of readings.csv is what; the first is the time.
 *
 * @param count of all columns
 * @param column for each channel its column
 * @param conversion for each channel from the unit of the column to that of the channel; null where they are the same
 * @param timeDecimals by how many digits the unit of the time is smaller than a second
 */
record Columns(int count, int[] column, @Nullable Conversion[] conversion, int timeDecimals, List<Mistake> notices) {}
