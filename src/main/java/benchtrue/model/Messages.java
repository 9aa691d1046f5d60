package benchtrue.model;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;

/** Collects the mistakes and notices of one text. */
final class Messages {
    private final List<Problem> problems = new ArrayList<>();
    private final List<Problem> notices = new ArrayList<>();

    void problem(int column, String message, String remedy) {
        problem(new Problem(column, message, remedy));
    }

    void problem(Problem problem) {
        add(problems, problem);
    }

    void notice(int column, String message, String remedy) {
        add(notices, new Problem(column, message, remedy));
    }

    private static void add(List<Problem> list, Problem problem) {
        if (!list.contains(problem)) {
            list.add(problem);
            list.sort(Comparator.comparingInt(Problem::column));
        }
    }

    boolean hasProblems() {
        return !problems.isEmpty();
    }

    <T> Parsed<T> failed() {
        return Parsed.failed(problems, notices);
    }

    <T> Parsed<T> done(T value) {
        return new Parsed<>(value, List.of(), notices);
    }
}
