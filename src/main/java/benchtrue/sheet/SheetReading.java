package benchtrue.sheet;

import java.util.List;
import org.jspecify.annotations.Nullable;

/**
 * What became of a sheet's file.
 *
 * @param sheet null exactly where there are mistakes
 * @param mistakes in the order of their lines
 * @param notices what is allowed but worth saying
 */
public record SheetReading(@Nullable BenchSheet sheet, List<Mistake> mistakes, List<Mistake> notices) {
    public SheetReading {
        mistakes = mistakes.stream().sorted().toList();
        notices = notices.stream().sorted().toList();
    }
}
