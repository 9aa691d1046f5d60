package benchtrue.alarm;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

class OutlierGateTest {
    private static final double BOUND = 4.8;

    private final OutlierGate gate = new OutlierGate(true);

    @Test
    void anOutlierIsHeldOutAndTheNextReadingIsUsed() {
        assertThat(gate.judge(6, BOUND)).isEqualTo(new Decision.HoldOut("outlier"));
        assertThat(gate.judge(0.3, BOUND)).isInstanceOf(Decision.Use.class);
        assertThat(gate.outliers()).isEqualTo(1);
    }

    @Test
    void eightOnOneSideAreAStepAndLetInAgain() {
        for (int i = 0; i < OutlierGate.ROW - 1; i++) {
            assertThat(gate.judge(9 + i % 2, BOUND)).isInstanceOf(Decision.HoldOut.class);
            assertThat(gate.intermittent()).isFalse();
        }
        assertThat(gate.judge(9, BOUND)).isEqualTo(new Decision.Readmit(8));
    }

    @Test
    void eightOnAlternatingSidesAreNoStep() {
        for (int i = 0; i < 40; i++) {
            assertThat(gate.judge(i % 2 == 0 ? 9 : -9, BOUND)).isInstanceOf(Decision.HoldOut.class);
        }
    }

    @Test
    void threeOutliersWithGoodReadingsBetweenAreIntermittentUntilTwentyAreGood() {
        for (double t : new double[] {100, 0.2, -0.4, 300, 0.1, 200}) {
            gate.judge(t, BOUND);
        }
        assertThat(gate.intermittent()).isTrue();
        assertThat(gate.judge(0.1, BOUND)).isEqualTo(new Decision.HoldOut("intermittent"));
        for (int i = 0; i < OutlierGate.WINDOW; i++) {
            gate.judge(0.1, BOUND);
        }
        assertThat(gate.intermittent()).isFalse();
    }

    @Test
    void noiseThatHasTripledIsUsedAndNotCalledIntermittent() {
        SplittableRandom random = new SplittableRandom(1);
        int used = 0;
        for (int i = 0; i < 400; i++) {
            used += gate.judge(3 * random.nextGaussian(), BOUND) instanceof Decision.Use ? 1 : 0;
        }
        assertThat(used).isGreaterThan(340);
    }

    @Test
    void whatIsNotTestedIsUsed() {
        assertThat(gate.judge(50, Double.NaN)).isInstanceOf(Decision.Use.class);
        assertThat(gate.judge(Double.NaN, BOUND)).isInstanceOf(Decision.Use.class);
    }

    @Test
    void aSheetThatUsesOutliersOnlyHasThemCounted() {
        OutlierGate counting = new OutlierGate(false);
        assertThat(counting.judge(50, BOUND)).isInstanceOf(Decision.Use.class);
        assertThat(counting.outliers()).isEqualTo(1);
    }
}
