package benchtrue.alarm;

import static org.assertj.core.api.Assertions.assertThat;

import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** The budget is a rate over many references, each wrong by as much as it says. */
class FalseAlarmTest {
    private static final double PER_READING = 2e-4;
    private static final int REFERENCES = 50;
    /** In the test; {@code -Dreadings=200000} makes it the 1e7 of a full trial. */
    private static final int READINGS = Integer.getInteger("readings", 8000);
    /** CUSUM and bank. */
    private static final int DETECTORS = 2;

    private static final double ACCEPTED = 1.5;

    @ParameterizedTest
    @CsvSource({"0, 600", "0, 2000", "0.5, 2000"})
    void theRateOverManyReferencesIsNoMoreThanTheBudgetAllows(double correlation, int referenceReadings) {
        long alarms = 0;
        for (int seed = 0; seed < REFERENCES; seed++) {
            ReferenceRuns run = new ReferenceRuns(500 + seed, referenceReadings, 50, correlation, PER_READING);
            run.read(READINGS);
            alarms += run.book.alarms().stream().mapToInt(Alarm::count).sum();
        }
        double budget = DETECTORS * PER_READING * READINGS * REFERENCES;
        // 160 expected; alarms of one reference come together, so their number scatters by more than its root
        assertThat((double) alarms).isLessThan(ACCEPTED * budget).isGreaterThan(budget / 5);
    }
}
