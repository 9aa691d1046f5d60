package benchtrue.model;

import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.function.DoubleUnaryOperator;
import org.jspecify.annotations.Nullable;

/** The functions of one argument. {@code t}, the time, is a name and no function. */
enum Function {
    SQRT,
    LN,
    LOG10,
    EXP,
    SIN,
    COS,
    TAN,
    ABS,
    SIGN,
    RATE,
    PREV,
    DIR;

    /** The name of the time since the first reading. */
    static final String TIME = "t";

    /** @throws IllegalStateException for the functions that remember earlier readings */
    DoubleUnaryOperator operator() {
        return switch (this) {
            case SQRT -> Math::sqrt;
            case LN -> Math::log;
            case LOG10 -> Math::log10;
            case EXP -> Math::exp;
            case SIN -> Math::sin;
            case COS -> Math::cos;
            case TAN -> Math::tan;
            case ABS -> Math::abs;
            case SIGN -> Math::signum;
            case RATE, PREV, DIR -> throw new IllegalStateException(word() + " needs the run");
        };
    }

    String word() {
        return name().toLowerCase(Locale.ROOT);
    }

    static @Nullable Function named(String word) {
        return Arrays.stream(values())
                .filter(function -> function.word().equals(word))
                .findFirst()
                .orElse(null);
    }

    static List<String> words() {
        return Arrays.stream(values()).map(Function::word).toList();
    }

    /** Whether the argument must be a plain number. */
    boolean wantsPlainNumber() {
        return switch (this) {
            case LN, LOG10, EXP, SIN, COS, TAN -> true;
            default -> false;
        };
    }
}
