package benchtrue.sheet;

import benchtrue.model.Problem;
import java.util.ArrayList;
import java.util.List;
import org.jspecify.annotations.Nullable;
import org.tomlj.TomlPosition;

/** The text of a sheet's file, and what was found in it: knows at which line and column a value begins. */
final class SheetText {
    private final String file;
    private final List<String> lines;
    private final List<Mistake> mistakes = new ArrayList<>();
    private final List<Mistake> notices = new ArrayList<>();

    SheetText(String file, String text) {
        this.file = file;
        lines = text.lines().toList();
    }

    void mistake(@Nullable TomlPosition place, String message, String remedy) {
        mistakes.add(at(place, 0, message, remedy));
    }

    void mistake(int line, int column, String message, String remedy) {
        mistakes.add(new Mistake(file, line, column, message, remedy));
    }

    void notice(@Nullable TomlPosition place, String message, String remedy) {
        notices.add(at(place, 0, message, remedy));
    }

    /** Of problems in the text that stands behind the key at this place. */
    void problems(@Nullable TomlPosition key, String value, List<Problem> problems) {
        problems.forEach(p -> mistakes.add(within(key, value, p)));
    }

    void notices(@Nullable TomlPosition key, String value, List<Problem> problems) {
        problems.forEach(p -> notices.add(within(key, value, p)));
    }

    private Mistake within(@Nullable TomlPosition key, String value, Problem problem) {
        return at(key, offsetOf(key, value) + problem.column(), problem.message(), problem.remedy());
    }

    /** From the beginning of the key to the beginning of its text; 0 where it does not stand on the same line as it is. */
    private int offsetOf(@Nullable TomlPosition key, String value) {
        if (key == null || key.line() > lines.size() || value.isEmpty()) {
            return 0;
        }
        String line = lines.get(key.line() - 1);
        int from = line.indexOf('=', Math.min(line.length(), key.column() - 1));
        int found = from < 0 ? -1 : line.indexOf(value, from);
        return found < 0 ? 0 : found - (key.column() - 1);
    }

    private Mistake at(@Nullable TomlPosition place, int offset, String message, String remedy) {
        return place == null
                ? new Mistake(file, 0, 0, message, remedy)
                : new Mistake(file, place.line(), place.column() + offset, message, remedy);
    }

    boolean isSound() {
        return mistakes.isEmpty();
    }

    SheetReading with(@Nullable BenchSheet sheet) {
        return new SheetReading(mistakes.isEmpty() ? sheet : null, mistakes, notices);
    }
}
