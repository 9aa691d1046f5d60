package benchtrue.run;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import benchtrue.model.Forgetting;
import benchtrue.model.Memory;
import benchtrue.sheet.BenchSheet;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.junit.jupiter.api.Test;

final class RunnerTest {
    /** Keeps what a run tells. */
    private static final class Kept implements RunListener {
        final List<String> rows = new ArrayList<>();
        final List<Event> events = new ArrayList<>();

        @Override
        public void reading(EstimateRow row) {
            rows.add(row.reading + " " + Arrays.toString(row.estimates) + Arrays.toString(row.uncertainties)
                    + Arrays.toString(row.innovations) + Arrays.toString(row.bounds));
        }

        @Override
        public void event(Event event) {
            events.add(event);
        }

        @Override
        public void closed(Closing closing) {}
    }

    private static Closing run(BenchSheet sheet, SourceMaker maker, Kept kept) throws InterruptedException {
        Options options = new Options(Double.POSITIVE_INFINITY, false, List.of());
        return new Runner(Bench.setup(sheet), maker, maker, options, kept, new Desk()).run();
    }

    @Test
    void aQuietRunEndsWithWhatIsTrueAndNothingFound() throws InterruptedException {
        Kept kept = new Kept();
        Closing closing = run(Bench.sheet(new Memory.All(), 0), new Bench.Made(2000, 5, 9999, 0), kept);
        Closing.Unknown r = closing.relations().get(0).unknowns().get(0);
        assertThat(r.name()).isEqualTo("R");
        assertThat(r.estimate()).isEqualTo(2, within(2 * r.expandedUncertainty()));
        assertThat(r.expandedUncertainty()).isBetween(2e-4, 5e-4);
        assertThat(r.settled()).isTrue();
        assertThat(closing.readings().used()).isEqualTo(2000);
        assertThat(closing.relations().get(0).batch()).isNotNull();
        assertThat(closing.relations().get(0).batch().agrees()).isTrue();
        assertThat(closing.relations().get(0).batch().largestDifferenceInU()).isLessThan(1e-6);
        assertThat(closing.relations().get(0).residualStandardDeviation()).isEqualTo(0.01, within(0.001));
        assertThat(closing.alarms()).isEmpty();
        assertThat(closing.status()).isZero();
        assertThat(kept.rows).hasSize(2000);
        assertThat(kept.events).anyMatch(e -> e.event().equals("adopted"));
    }

    @Test
    void aConfirmedStepBeginsASegmentAndTheBatchFollowsIt() throws InterruptedException {
        Kept kept = new Kept();
        Closing closing = run(Bench.sheet(new Memory.Seconds(60), 0), new Bench.Made(2000, 6, 1200, 0.2), kept);
        Closing.Relation relation = closing.relations().get(0);
        assertThat(relation.segments()).hasSize(2);
        assertThat(relation.segments().get(0).unknowns().get(0).estimate()).isEqualTo(2, within(0.001));
        assertThat(relation.unknowns().get(0).estimate()).isEqualTo(2.2, within(0.002));
        assertThat(relation.segments().get(1).from()).isEqualTo(120.0, within(1e-9));
        assertThat(relation.batch()).isNotNull();
        assertThat(relation.batch().agrees()).isTrue();
        assertThat(closing.readings().used()).isEqualTo(2000);
        assertThat(closing.readings().heldOut()).isZero();
        assertThat(closing.alarms()).isNotEmpty();
        assertThat(closing.status()).isEqualTo(3);
    }

    @Test
    void directionalForgettingAgreesWithItsSecondComputation() throws InterruptedException {
        Forgetting directional = new Forgetting(Forgetting.Kind.DIRECTIONAL, new Memory.Readings(150));
        Closing closing = run(Bench.sheet(directional, 0), new Bench.Made(1500, 9, 9999, 0), new Kept());
        Closing.Relation relation = closing.relations().get(0);
        assertThat(relation.batch()).isNotNull();
        assertThat(relation.batch().largestDifferenceInU()).isLessThan(1e-6);
        assertThat(relation.unknowns().get(0).estimate()).isEqualTo(2, within(0.003));
    }

    @Test
    void aDeclaredOffsetOfTheResponseGoesToTheConstantTermOnly() throws InterruptedException {
        Closing closing = run(Bench.sheet(new Memory.All(), 0.03), new Bench.Made(1000, 7, 9999, 0), new Kept());
        List<Closing.Unknown> unknowns = closing.relations().get(0).unknowns();
        assertThat(unknowns.get(1).standardUncertainty()).isEqualTo(0.03, within(0.0002));
        assertThat(unknowns.get(0).standardUncertainty()).isLessThan(0.0005);
        assertThat(unknowns.get(1).budget()).anyMatch(c -> c.name().equals("channel V"));
    }

    @Test
    void theSameReadingsGiveTheSameResultsToTheBit() throws InterruptedException {
        Kept first = new Kept();
        Kept second = new Kept();
        BenchSheet sheet = Bench.sheet(new Memory.Readings(200), 0.01);
        Closing one = run(sheet, new Bench.Made(1500, 8, 700, -0.3), first);
        Closing two = run(sheet, new Bench.Made(1500, 8, 700, -0.3), second);
        assertThat(first.rows).isEqualTo(second.rows);
        assertThat(first.events).isEqualTo(second.events);
        assertThat(one).hasToString(two.toString());
    }
}
