package benchtrue.alarm;

import static org.assertj.core.api.Assertions.assertThat;

import benchtrue.alarm.Alarm.Kind;
import benchtrue.model.Interval;
import benchtrue.model.Unit;
import benchtrue.sheet.Channel;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

class ChannelWatchTest {
    private static final double PER_READING = 1e-6;

    private final AlarmBook book = new AlarmBook();
    private final SplittableRandom random = new SplittableRandom(9);
    private long number;

    private void read(ChannelWatch watch, int readings, double level, double noise) {
        for (int i = 0; i < readings; i++) {
            read(watch, Math.rint(level + noise * random.nextGaussian()));
        }
    }

    private void read(ChannelWatch watch, double value) {
        number++;
        book.at((double) number, number);
        watch.arrive(value, (double) number, number, PER_READING);
    }

    private ChannelWatch plain() {
        return new ChannelWatch(Rig.channel("x", new Interval(0, 1000), 1), book);
    }

    @Test
    void identicalValuesOfANoisyChannelAreStuckAndMovingEndsIt() {
        ChannelWatch watch = plain();
        read(watch, 400, 500, 1);
        assertThat(watch.word()).isNotEqualTo("stuck");
        read(watch, 60, 500, 0);
        assertThat(watch.word()).isEqualTo("stuck");
        assertThat(watch.objection()).contains("x stuck");
        assertThat(book.alarms()).extracting(Alarm::kind).containsExactly(Kind.STUCK);
        read(watch, 20, 500, 1);
        assertThat(watch.objection()).isNull();
        assertThat(book.anyStanding()).isFalse();
    }

    @Test
    void aSetPointWithoutNoiseIsNotStuck() {
        ChannelWatch watch = plain();
        for (int i = 0; i < 40; i++) {
            read(watch, 100, 100 + 10 * i, 0);
        }
        assertThat(book.alarms()).isEmpty();
    }

    @Test
    void aResolutionThatHidesTheNoiseIsWarnedOf() {
        ChannelWatch coarse = plain();
        for (int i = 0; i < 40; i++) {
            read(coarse, 10, 500 + i, 0.1);
        }
        assertThat(coarse.coarse()).contains("averaging helps little", "0.28868");
        ChannelWatch fine = plain();
        read(fine, 400, 500, 1);
        assertThat(fine.coarse()).isNull();
    }

    @Test
    void aValueOutsideTheMeasuringIntervalIsToldAfterThreeReadings() {
        ChannelWatch watch = plain();
        read(watch, 300, 500, 1);
        read(watch, 1200);
        assertThat(book.alarms()).isEmpty();
        assertThat(watch.objection()).isNotNull();
        read(watch, 1200);
        read(watch, 1201);
        assertThat(book.alarms()).extracting(Alarm::kind).containsExactly(Kind.INTERVAL);
    }

    @Test
    void aChannelThatComesNoMoreIsSilent() {
        ChannelWatch watch = plain();
        read(watch, 300, 500, 1);
        for (int i = 0; i < 4; i++) {
            read(watch, Double.NaN);
        }
        assertThat(watch.word()).isEqualTo("silent");
        assertThat(book.alarms()).extracting(Alarm::kind).containsExactly(Kind.SILENT);
        read(watch, 5, 500, 1);
        assertThat(watch.word()).isEqualTo("good");
    }

    @Test
    void aCurrentLoopAtItsEndIsSaturatedAndBeyondItFailed() {
        // NAMUR NE 43: measuring information from 3.8 to 20.5 mA, failure at 3.6 mA and below, 21 mA and above
        Channel loop = new Channel("I", Unit.ONE, Rig.ANY, 0.001, Double.NaN, 0, true, false, null, null, null);
        ChannelWatch watch = new ChannelWatch(loop, book);
        for (int i = 0; i < 300; i++) {
            read(watch, 12 + 0.01 * random.nextGaussian());
        }
        for (int i = 0; i < 3; i++) {
            read(watch, 3.5);
        }
        assertThat(book.alarms()).extracting(Alarm::kind).containsExactly(Kind.SATURATED);
        assertThat(book.alarms().get(0).text()).contains("NE 43: failed");
    }
}
