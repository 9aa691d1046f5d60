package benchtrue.run;

import static org.assertj.core.api.Assertions.assertThat;

import org.junit.jupiter.api.Test;

final class PathHistoryTest {
    @Test
    void keepsTheWholePathEvenlyInAFixedSpace() {
        PathHistory path = new PathHistory(1, 64);
        for (int i = 0; i < 100_000; i++) {
            if (path.wants()) {
                path.set(0, i);
                path.keep();
            }
        }
        double[] kept = path.copy(0);
        assertThat(kept.length).isBetween(32, 64);
        assertThat(kept[0]).isZero();
        assertThat(kept[kept.length - 1]).isGreaterThan(95_000);
        double step = kept[1] - kept[0];
        for (int i = 1; i < kept.length; i++) {
            assertThat(kept[i] - kept[i - 1]).isEqualTo(step);
        }
    }

    @Test
    void recentValuesComeOldestFirst() {
        Recent recent = new Recent(3);
        for (int i = 1; i <= 5; i++) {
            recent.add(i);
        }
        assertThat(recent.copy()).containsExactly(3, 4, 5);
    }
}
