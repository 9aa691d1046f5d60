package benchtrue.run;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.SplittableRandom;
import java.util.TreeSet;
import org.junit.jupiter.api.Test;

final class SpansTest {
    @Test
    void agreesWithAPlainSetThroughAddingAndTakingBack() {
        SplittableRandom random = new SplittableRandom(7);
        for (int round = 0; round < 200; round++) {
            Spans spans = new Spans();
            TreeSet<Long> plain = new TreeSet<>();
            for (long reading = 1; reading <= 300; reading++) {
                if (random.nextInt(100) < 40) {
                    spans.add(reading);
                    plain.add(reading);
                }
                if (random.nextInt(100) < 3) {
                    long from = Math.max(1, reading - random.nextInt(12));
                    assertThat(spans.removeFrom(from))
                            .isEqualTo(plain.tailSet(from).size());
                    plain.tailSet(from).clear();
                }
            }
            Spans.Cursor cursor = spans.cursor();
            for (long reading = 1; reading <= 301; reading++) {
                assertThat(cursor.contains(reading)).isEqualTo(plain.contains(reading));
            }
        }
    }
}
