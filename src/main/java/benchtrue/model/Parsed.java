package benchtrue.model;

import java.util.List;
import java.util.stream.Collectors;
import org.jspecify.annotations.Nullable;

/**
 * What became of a text that the user wrote.
 *
 * @param value null exactly where there are problems
 * @param problems mistakes; in the order of their columns
 * @param notices what is allowed but worth saying in {@code check}
 */
public record Parsed<T>(@Nullable T value, List<Problem> problems, List<Problem> notices) {
    public Parsed {
        if ((value == null) == problems.isEmpty()) {
            throw new IllegalArgumentException("a text has either a value or problems");
        }
        problems = List.copyOf(problems);
        notices = List.copyOf(notices);
    }

    static <T> Parsed<T> failed(List<Problem> problems, List<Problem> notices) {
        return new Parsed<>(null, problems, notices);
    }

    /** The value of a text that is known to be right. */
    public T get() {
        if (value == null) {
            throw new IllegalStateException(problems.stream()
                    .map(problem -> problem.column() + ": " + problem.message() + "; " + problem.remedy())
                    .collect(Collectors.joining("\n")));
        }
        return value;
    }
}
