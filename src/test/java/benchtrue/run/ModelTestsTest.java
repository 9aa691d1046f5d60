package benchtrue.run;

import static org.assertj.core.api.Assertions.assertThat;

import benchtrue.model.Memory;
import java.util.List;
import org.junit.jupiter.api.Test;

final class ModelTestsTest {
    private static List<String> sentences(Bench.Made made) throws InterruptedException {
        Options options = new Options(Double.POSITIVE_INFINITY, false, List.of());
        RunListener deaf = new RunListener() {
            @Override
            public void reading(EstimateRow row) {}

            @Override
            public void event(Event event) {}

            @Override
            public void closed(Closing closing) {}
        };
        Setup setup = Bench.setup(Bench.sheet(new Memory.All(), 0));
        Closing closing = new Runner(setup, made, made, options, deaf, new Desk()).run();
        return closing.relations().get(0).residualTests();
    }

    @Test
    void aSoundRunPassesEveryTest() throws InterruptedException {
        assertThat(sentences(new Bench.Made(2000, 5, 9999, 0)))
                .anyMatch(s -> s.startsWith("Durbin-Watson"))
                .anyMatch(
                        s -> s.equals("Cumulated recursive residuals and their squares stay within their 5 % bounds."))
                .anyMatch(s -> s.startsWith("Lack of fit over 6 levels, 5 settings revisited: F = ") && s.endsWith("."))
                .anyMatch(s -> s.equals("Huber's fit and least absolute deviations lie within U of least squares."))
                .noneMatch(s -> s.contains("period") || s.contains("does not describe"));
    }

    /** Too slight for a step of the innovations, but not for the whole run. */
    @Test
    void aCoefficientThatMovedALittleIsSeenInTheCumulatedResiduals() throws InterruptedException {
        assertThat(sentences(new Bench.Made(2000, 5, 1000, 0.0015)))
                .anyMatch(s -> s.startsWith("The cumulated recursive residuals cross their 5 % bound at 1"));
    }
}
