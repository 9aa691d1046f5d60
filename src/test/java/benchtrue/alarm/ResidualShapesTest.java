package benchtrue.alarm;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.SplittableRandom;
import java.util.function.DoubleUnaryOperator;
import org.junit.jupiter.api.Test;

/** y = 2·x + c with x going up and down at changing speed; noise 0.1. */
class ResidualShapesTest {
    private static final double INTERVAL = 0.02;

    private final AlarmBook book = new AlarmBook();
    private final Autocorrelation white = new Autocorrelation();
    private final ResidualShapes shapes = new ResidualShapes(Rig.plane(), book, white);
    private final SplittableRandom random = new SplittableRandom(7);

    private static double x(double time) {
        return 10 * Math.sin(time) + 4 * Math.sin(2.7 * time);
    }

    private void run(int rows, DoubleUnaryOperator residual) {
        for (int k = 0; k < rows; k++) {
            white.add(random.nextGaussian());
        }
        double[] phi = {0, 0, 1};
        for (int k = 0; k < rows; k++) {
            double time = k * INTERVAL;
            phi[0] = x(time);
            double noisy = residual.applyAsDouble(time) + 0.1 * random.nextGaussian();
            shapes.add(phi, noisy, new double[] {2, 0, 0}, time, INTERVAL);
        }
    }

    @Test
    void aChannelThatComesLateIsToldWithItsLag() {
        double lag = 0.03;
        run(2048, time -> 2 * (x(time + lag) - x(time)));
        assertThat(book.alarms()).hasSize(1);
        Alarm alarm = book.alarms().get(0);
        assertThat(alarm.kind()).isEqualTo(Alarm.Kind.SKEW);
        assertThat(alarm.channel()).isEqualTo("x");
        assertThat(alarm.size()).isCloseTo(lag, within(0.003));
        assertThat(alarm.text()).contains("x is late by");
    }

    @Test
    void aResidualThatFollowsTheDirectionSuggestsATermForIt() {
        run(2048, time -> 0.3 * Math.signum(x(time + 0.01) - x(time)));
        assertThat(book.alarms()).hasSize(1);
        Alarm alarm = book.alarms().get(0);
        assertThat(alarm.kind()).isEqualTo(Alarm.Kind.HYSTERESIS);
        assertThat(alarm.size()).isCloseTo(0.3, within(0.06));
        assertThat(alarm.text()).contains("h*dir(x)");
    }

    @Test
    void aSlowPeriodIsSuspectedToBeAnAliasAndAnotherRateIsProposed() {
        run(8192, time -> 0.3 * Math.sin(2 * Math.PI * time / 10));
        assertThat(book.alarms()).extracting(Alarm::kind).containsExactly(Alarm.Kind.ALIAS);
        assertThat(book.alarms().get(0).size()).isCloseTo(10, within(0.8));
        assertThat(book.alarms().get(0).text()).contains("56.5 Hz instead of 50.0 Hz");
    }

    @Test
    void noiseAloneIsNotSuspected() {
        run(20_000, time -> 0);
        assertThat(book.alarms()).isEmpty();
    }
}
