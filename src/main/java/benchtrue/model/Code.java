package benchtrue.model;

import java.util.function.DoubleBinaryOperator;
import java.util.function.DoubleUnaryOperator;

/** How to compute a value: makes a fresh evaluator for each run. What is constant is computed once, here. */
interface Code {
    Evaluator start();

    record Constant(double value) implements Code {
        @Override
        public Evaluator start() {
            return observation -> value;
        }
    }

    record Channel(int index) implements Code {
        @Override
        public Evaluator start() {
            return observation -> observation.values[index];
        }
    }

    static Code time() {
        return () -> observation -> observation.time;
    }

    static Code apply(DoubleUnaryOperator operator, Code argument) {
        if (argument instanceof Constant constant) {
            return new Constant(operator.applyAsDouble(constant.value));
        }
        return () -> {
            Evaluator inner = argument.start();
            return observation -> operator.applyAsDouble(inner.evaluate(observation));
        };
    }

    static Code scaled(Code code, double factor) {
        return factor == 1 ? code : apply(value -> value * factor, code);
    }

    static Code converted(Code code, Conversion conversion) {
        return conversion.before() == 0 && conversion.after() == 0
                ? scaled(code, conversion.factor())
                : apply(conversion::apply, code);
    }

    private static Code join(DoubleBinaryOperator operator, Code left, Code right, Joined joined) {
        if (left instanceof Constant a && right instanceof Constant b) {
            return new Constant(operator.applyAsDouble(a.value, b.value));
        }
        return () -> joined.start(left.start(), right.start());
    }

    /** Each operation has a closure of its own, so that the compiler can put its operands in line. */
    interface Joined {
        Evaluator start(Evaluator left, Evaluator right);
    }

    static Code sum(Code left, Code right) {
        return join((a, b) -> a + b, left, right, (a, b) -> o -> a.evaluate(o) + b.evaluate(o));
    }

    static Code difference(Code left, Code right) {
        return join((a, b) -> a - b, left, right, (a, b) -> o -> a.evaluate(o) - b.evaluate(o));
    }

    static Code product(Code left, Code right) {
        if (isOne(left)) {
            return right;
        }
        return isOne(right) ? left : join((a, b) -> a * b, left, right, (a, b) -> o -> a.evaluate(o) * b.evaluate(o));
    }

    static Code quotient(Code left, Code right) {
        return isOne(right) ? left : join((a, b) -> a / b, left, right, (a, b) -> o -> a.evaluate(o) / b.evaluate(o));
    }

    static Code power(Code base, Code exponent) {
        if (exponent instanceof Constant constant && constant.value == 2) {
            return apply(x -> x * x, base);
        }
        return join(Code::power, base, exponent, (a, b) -> o -> power(a.evaluate(o), b.evaluate(o)));
    }

    /** Missing to the power 0 is missing, where {@link Math#pow} has 1. */
    private static double power(double base, double exponent) {
        return Double.isNaN(base) ? base : Math.pow(base, exponent);
    }

    private static boolean isOne(Code code) {
        return code instanceof Constant constant && constant.value == 1;
    }
}
