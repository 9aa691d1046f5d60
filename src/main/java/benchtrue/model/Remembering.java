package benchtrue.model;

/** The functions that look back over the readings of one run. Each evaluator is to be called once for each reading. */
final class Remembering {
    private Remembering() {}

    static Code of(Function function, Code argument, double resolution) {
        return switch (function) {
            case PREV -> () -> new Previous(argument.start());
            case RATE -> () -> new Rate(argument.start());
            case DIR -> () -> new Direction(argument.start(), resolution);
            default -> throw new IllegalArgumentException(function + " remembers nothing");
        };
    }

    /** The value one reading ago; missing at the first reading and after a missing one. */
    private static final class Previous implements Evaluator {
        private final Evaluator argument;
        private double last = Double.NaN;

        Previous(Evaluator argument) {
            this.argument = argument;
        }

        @Override
        public double evaluate(Observation observation) {
            double previous = last;
            last = argument.evaluate(observation);
            return previous;
        }
    }

    /**
     * The change since the last value that was not missing, for each second that really passed; missing at the first reading,
     * at a missing value and where no time passed.
     */
    private static final class Rate implements Evaluator {
        private final Evaluator argument;
        private double last = Double.NaN;
        private double lastTime = Double.NaN;

        Rate(Evaluator argument) {
            this.argument = argument;
        }

        @Override
        public double evaluate(Observation observation) {
            double value = argument.evaluate(observation);
            if (Double.isNaN(value)) {
                return value;
            }
            double elapsed = observation.time - lastTime;
            double rate = elapsed > 0 ? (value - last) / elapsed : Double.NaN;
            last = value;
            lastTime = observation.time;
            return rate;
        }
    }

    /**
     * +1 rising, −1 falling. The direction stays until the value has come back from its turning point by more than the
     * resolution; missing before the first such move and at a missing value.
     */
    private static final class Direction implements Evaluator {
        /** A step of just the resolution does not become a move by rounding. */
        private static final double ROUNDING = 1 + 1e-6;

        private final Evaluator argument;
        private final double threshold;
        private double turningPoint = Double.NaN;
        private double direction = Double.NaN;

        Direction(Evaluator argument, double resolution) {
            this.argument = argument;
            threshold = resolution * ROUNDING;
        }

        @Override
        public double evaluate(Observation observation) {
            double value = argument.evaluate(observation);
            if (Double.isNaN(value)) {
                return value;
            }
            double change = value - turningPoint;
            if (Math.abs(change) > threshold) {
                direction = Math.signum(change);
            }
            boolean first = Double.isNaN(turningPoint);
            if (first || change * direction > 0) {
                turningPoint = value;
            }
            return direction;
        }
    }
}
