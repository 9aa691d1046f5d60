package benchtrue.estimate;

import static org.assertj.core.api.Assertions.assertThat;

import benchtrue.model.Forgetting;
import java.util.List;
import java.util.SplittableRandom;
import java.util.function.UnaryOperator;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** The variance-decomposition proportions of Belsley, Kuh and Welsch 1980, Regression Diagnostics, ch. 3. */
final class ConditioningTest {
    private static Diagnosis diagnose(int p, UnaryOperator<double[]> row) {
        SplittableRandom random = new SplittableRandom(4);
        Estimator estimator = new Estimator(new boolean[p], 1, Forgetting.NONE);
        for (int i = 0; i < 500; i++) {
            double[] free = random.doubles(2L * p, -1, 1).toArray();
            estimator.next(1);
            estimator.predict(0, row.apply(free), 0, 1);
            estimator.use();
        }
        return estimator.diagnose();
    }

    @ParameterizedTest
    @ValueSource(doubles = {1e-2, 1e-4, 1e-6, 0})
    void namesTwoPairsApartFromEachOtherDownToTheExact(double apart) {
        Diagnosis diagnosis =
                diagnose(5, f -> new double[] {f[0], f[0] + apart * f[1], f[2], f[3], f[3] + 2 * apart * f[4]});
        assertThat(diagnosis.inseparable()).containsExactlyInAnyOrder(List.of(0, 1), List.of(3, 4));
        assertThat(diagnosis.weak()).containsExactly(true, true, false, true, true);
    }

    /** Three legs under one centred load: no two of them are the ones that cannot be told apart. */
    @Test
    void namesAllThreeThatShareOneMotion() {
        Diagnosis diagnosis =
                diagnose(4, f -> new double[] {f[0] + 1e-4 * f[1], f[0] + 1e-4 * f[2], f[0] + 1e-4 * f[3], 1});
        assertThat(diagnosis.inseparable()).containsExactly(List.of(0, 1, 2));
    }

    @Test
    void findsNothingAmongRegressorsThatVaryFreely() {
        Diagnosis diagnosis = diagnose(4, f -> new double[] {f[0], 100 * f[1], f[2], 1});
        assertThat(diagnosis.inseparable()).isEmpty();
        assertThat(diagnosis.weak()).containsOnly(false);
        assertThat(diagnosis.conditionIndex()).isLessThan(2);
    }
}
