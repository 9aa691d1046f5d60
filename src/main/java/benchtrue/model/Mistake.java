package benchtrue.model;

/** Carries the first mistake of a text from deep in its grammar to the place that collects mistakes. Never leaves the package. */
final class Mistake extends RuntimeException {
    final transient Problem problem;

    Mistake(int column, String message, String remedy) {
        super(message, null, false, false);
        problem = new Problem(column, message, remedy);
    }

    /** The same with another remedy. */
    Mistake with(String remedy) {
        return new Mistake(problem.column(), problem.message(), remedy);
    }
}
