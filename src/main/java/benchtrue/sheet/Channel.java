package benchtrue.sheet;

import benchtrue.model.Expression;
import benchtrue.model.Interval;
import benchtrue.model.Unit;
import java.time.LocalDate;
import org.jspecify.annotations.Nullable;

/**
 * One channel of the line. Absent numbers are NaN, absent intervals infinite.
 *
 * @param interval measuring interval: a value outside it is a fault of the channel
 * @param resolution smallest step of the indication, a difference in {@code unit}
 * @param noise declared standard deviation of one reading, a difference in {@code unit}
 * @param otherUncertainty standard uncertainty that does not average away (type B), a difference in {@code unit}
 * @param currentLoop whether it is a 4–20 mA loop whose failure currents (NAMUR NE 43) are to be seen
 * @param adjustable whether the operator can set it
 * @param operate within which advice may move it; null: not declared, so no advice moves it
 * @param correction from the indication {@code x} to the corrected value, both in {@code unit}; null: none
 * @param due when the instrument is due for calibration
 */
public record Channel(
        String name,
        Unit unit,
        Interval interval,
        double resolution,
        double noise,
        double otherUncertainty,
        boolean currentLoop,
        boolean adjustable,
        @Nullable Interval operate,
        @Nullable Expression correction,
        @Nullable LocalDate due) {}
