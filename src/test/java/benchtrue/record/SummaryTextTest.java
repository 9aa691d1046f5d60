package benchtrue.record;

import static org.assertj.core.api.Assertions.assertThat;

import org.junit.jupiter.api.Test;

final class SummaryTextTest {
    private final String page = SummaryText.of(Closings.pump());

    @Test
    void fitsTheWidthOfAPrintedPage() {
        assertThat(page.lines()).allSatisfy(line -> assertThat(line).hasSizeLessThanOrEqualTo(TextPage.WIDTH));
    }

    @Test
    void namesItemStartReadingsAndReasons() {
        assertThat(page)
                .contains("pump 0417")
                .contains("2026-03-01T08:00:00Z (UTC)")
                .contains("3000 seen from 0.0 s to 599.8 s: 2990 used, 7 held out, 3 excluded.")
                .contains("3 left out: coupling reseated")
                .contains("2027-03-01")
                .contains("dp = 1.002*x - 0.1");
    }

    @Test
    void roundsTheEstimateWithItsUncertainty() {
        assertThat(page).contains("11.3031 ± 0.0069");
    }

    @Test
    void saysOfWhichReadingTheResidualsStandardDeviationIs() {
        // 0.997·0.06 = 0.0598: the weight is 1/0.06²
        assertThat(page.replaceAll("\\s+", " "))
                .contains("s = 0.0598 L/min for a reading (0.997 L/min for one of weight 1)");
    }

    @Test
    void judgesUnderTheRuleOrSaysWhyNot() {
        assertThat(page)
                .contains("conditional pass under a guard band of U")
                .contains("no verdict: a drift alarm stands")
                .contains("flow at 1800 rev/min, at least 16 L/min: pass");
    }

    @Test
    void putsTheBatchFitBesideTheRecursionAndSegmentsSideBySide() {
        assertThat(page).contains("They agree.").contains("0.0 s to 380.2 s").contains("380.2 s to 600.0 s");
    }

    @Test
    void leavesLinesToSign() {
        assertThat(page)
                .contains("As found    ____")
                .contains("As left")
                .contains("Action")
                .contains("Signature");
        assertThat(SummaryText.brief(Closings.pump())).doesNotContain("Signature");
    }
}
