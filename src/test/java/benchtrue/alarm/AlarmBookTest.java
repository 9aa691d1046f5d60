package benchtrue.alarm;

import static org.assertj.core.api.Assertions.assertThat;

import benchtrue.alarm.Alarm.Kind;
import benchtrue.alarm.Alarm.Priority;
import benchtrue.alarm.Alarm.State;
import java.util.List;
import org.junit.jupiter.api.Test;

class AlarmBookTest {
    private final AlarmBook book = new AlarmBook();

    @Test
    void oneCauseIsOneAlarmHoweverOftenItIsFound() {
        drift(Kind.STEP, 1, true);
        drift(Kind.DRIFT, 1.2, true);
        drift(Kind.NOISE, 1.3, true);

        assertThat(book.alarms()).hasSize(1);
        assertThat(whats()).containsExactly("raised");
        assertThat(book.alarms().get(0).kind()).isEqualTo(Kind.NOISE);
    }

    @Test
    void aPersistingAlarmSpeaksAgainOnlyWhenDoubled() {
        drift(Kind.DRIFT, 1, false);
        drift(Kind.DRIFT, 1.9, false);
        assertThat(whats()).containsExactly("raised");
        drift(Kind.DRIFT, 2.1, false);
        drift(Kind.DRIFT, 3.9, false);
        assertThat(whats()).containsExactly("again");
        assertThat(book.alarms().get(0).count()).isEqualTo(2);
    }

    @Test
    void aCauseThatIsNoLongerProvisionalIsToldOnce() {
        drift(Kind.STEP, 1, true);
        drift(Kind.STEP, 1, false);
        drift(Kind.STEP, 1, false);
        assertThat(whats()).containsExactly("raised", "cause");
    }

    @Test
    void acknowledgingKeepsTheAlarmAndItsComment() {
        drift(Kind.STEP, 1, true);
        assertThat(book.anyUnacknowledged()).isTrue();
        assertThat(book.acknowledge(1, "seen")).isTrue();
        assertThat(book.acknowledge(1, "again")).isFalse();
        assertThat(book.acknowledge(7, "no such")).isFalse();

        Alarm alarm = book.alarms().get(0);
        assertThat(alarm.state()).isEqualTo(State.ACKNOWLEDGED);
        assertThat(alarm.comment()).isEqualTo("seen");
        assertThat(book.anyUnacknowledged()).isFalse();
        assertThat(book.standingDrift("Q")).isNotNull();
    }

    @Test
    void whatReturnsUnacknowledgedCountsUpAndWhatWasAcknowledgedIsOver() {
        channel();
        book.normal(Kind.STUCK, null, "dp");
        channel();
        assertThat(book.alarms()).hasSize(1);
        assertThat(book.alarms().get(0).count()).isEqualTo(2);

        book.acknowledge(1, "");
        book.normal(Kind.STUCK, null, "dp");
        assertThat(book.alarms().get(0).state()).isEqualTo(State.RETURNED);
        channel();
        assertThat(book.alarms()).hasSize(2);
        assertThat(whats()).containsExactly("raised", "returned", "again", "acknowledged", "returned", "raised");
    }

    @Test
    void aShelvedAlarmIsSilentUntilItsTimeIsOver() {
        book.at(10, 100);
        channel();
        assertThat(book.shelve(1, 60, "lead on order")).isTrue();
        assertThat(book.alarms().get(0).state()).isEqualTo(State.SHELVED);
        book.at(69, 690);
        assertThat(whats()).containsExactly("raised", "shelved");
        book.at(70, 700);
        assertThat(whats()).containsExactly("unshelved");
        assertThat(book.anyUnacknowledged()).isTrue();
    }

    @Test
    void onlyStepDriftAndNoiseOfTheRelationWithholdItsVerdict() {
        channel();
        drift(Kind.NOISE, 2, false);
        assertThat(book.standingDrift("Q")).isNotNull();
        assertThat(book.standingDrift("V")).isNull();
        book.normal(Kind.STEP, "Q", null);
        assertThat(book.standingDrift("Q")).isNull();
    }

    private void drift(Kind kind, double size, boolean provisional) {
        book.report(new Finding(
                kind,
                "Q",
                null,
                null,
                Finding.Onset.at(1, 5),
                size,
                0.1,
                "L/min",
                "c",
                provisional,
                false,
                Priority.ACT_NOW,
                "text"));
    }

    private void channel() {
        book.report(Finding.of(Kind.STUCK, "dp", Finding.Onset.at(1, 5), 3, "bar", Priority.NEXT_STOP, "text"));
    }

    private List<String> whats() {
        return book.drain().stream().map(Change::what).toList();
    }
}
