package benchtrue.cli;

import benchtrue.source.Failure;
import java.io.BufferedReader;
import java.io.IOException;
import java.io.InputStream;
import java.io.InputStreamReader;
import java.nio.charset.StandardCharsets;
import java.util.function.Function;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.jspecify.annotations.Nullable;

/** Asks in plain lines and reads one line for each answer, from a terminal or a pipe alike. */
final class Answers {
    private static final Pattern TWO = Pattern.compile("\\[?\\s*(\\S+?)\\s*(?:,|\\s+to\\s|\\s)\\s*(\\S+?)\\s*]?");

    private final BufferedReader in;
    private final Output output;

    Answers(InputStream in, Output output) {
        this.in = new BufferedReader(new InputStreamReader(in, StandardCharsets.UTF_8));
        this.output = output;
    }

    /** What becomes of an answer. */
    sealed interface Heard<T> {
        record Taken<T>(T value) implements Heard<T> {}

        /** @param why and what to answer instead */
        record Refused<T>(String why) implements Heard<T> {}
    }

    /**
     * The answer without the blanks around it.
     *
     * @throws Refusal where the answers have ended
     */
    String ask(String question) throws Refusal {
        output.line(question);
        try {
            String answer = in.readLine();
            if (answer == null) {
                throw new Refusal("the answers ended before the sheet was whole: nothing was written; answer every"
                        + " question, with an empty line where there is nothing to say");
            }
            return answer.strip();
        } catch (IOException e) {
            throw new Refusal("the answer could not be read (" + Failure.words(e) + "): nothing was written");
        }
    }

    String ask(String question, String otherwise) throws Refusal {
        String answer = ask(question + " [" + otherwise + "]");
        return answer.isEmpty() ? otherwise : answer;
    }

    /** Asks again, with the reason, until an answer is taken. */
    <T> T until(String question, Function<String, Heard<T>> hearing) throws Refusal {
        while (true) {
            Heard<T> heard = hearing.apply(ask(question));
            if (heard instanceof Heard.Taken<T> taken) {
                return taken.value();
            }
            output.line("  " + ((Heard.Refused<T>) heard).why());
        }
    }

    /** A number above 0; NaN where nothing was answered. */
    double size(String question) throws Refusal {
        return until(question, answer -> {
            double number = answer.isEmpty() ? Double.NaN : number(answer);
            return answer.isEmpty() || (number > 0 && number < Double.POSITIVE_INFINITY)
                    ? new Heard.Taken<>(number)
                    : new Heard.Refused<>("\"" + answer + "\" is no number above 0; write it as 0.05, or nothing");
        });
    }

    /** {@code lower, upper}; empty where nothing was answered. */
    double[] interval(String question) throws Refusal {
        return until(question, answer -> {
            double[] two = answer.isEmpty() ? new double[0] : two(answer);
            return two != null
                    ? new Heard.Taken<>(two)
                    : new Heard.Refused<>("\"" + answer
                            + "\" must be two numbers, the smaller one first: 9 13, or 16 inf for no upper one");
        });
    }

    private static double @Nullable [] two(String answer) {
        Matcher matcher = TWO.matcher(answer);
        if (!matcher.matches()) {
            return null;
        }
        double lower = number(matcher.group(1));
        double upper = number(matcher.group(2));
        return lower < upper ? new double[] {lower, upper} : null;
    }

    /** NaN where the text is none. */
    private static double number(String text) {
        return switch (text) {
            case "inf", "+inf" -> Double.POSITIVE_INFINITY;
            case "-inf" -> Double.NEGATIVE_INFINITY;
            default ->
                text.matches("[-+]?(\\d+\\.?\\d*|\\.\\d+)([eE][-+]?\\d{1,3})?") ? Double.parseDouble(text) : Double.NaN;
        };
    }
}
