package benchtrue.run;

import static org.assertj.core.api.Assertions.assertThat;

import benchtrue.alarm.Alarm;
import benchtrue.alarm.Alarm.Kind;
import benchtrue.alarm.ReferenceModel;
import benchtrue.reading.Reading;
import benchtrue.sheet.BenchSheet;
import benchtrue.sheet.SheetReader;
import benchtrue.source.Opened;
import benchtrue.source.Rehearsing;
import benchtrue.source.ReplaySource;
import benchtrue.source.Source;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Objects;
import java.util.stream.IntStream;
import org.jspecify.annotations.Nullable;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * What the alarms say of the shipped rigs, rehearsed from several seeds: faults and times are those that the sheets declare.
 * {@code -Dseeds=20} tries more of them.
 */
final class RigAlarmsTest {
    @TempDir
    private Path folder;

    static IntStream seeds() {
        return IntStream.rangeClosed(1, Integer.getInteger("seeds", 2));
    }

    private List<Alarm> alarms(String rig, long seed) throws Exception {
        Path shipped = Path.of("replays", rig, "sheet.toml");
        BenchSheet sheet = Objects.requireNonNull(SheetReader.read(shipped).sheet());
        Path run = folder.resolve(rig);
        Rehearsing.write(shipped, sheet, Objects.requireNonNull(sheet.rehearsal()), run, seed);
        List<@Nullable ReferenceModel> none = new ArrayList<>();
        sheet.groups().forEach(g -> none.add(null));
        Engine engine = new Engine(new Setup(sheet, false, "replay", rig, null, none), new Deaf());
        Opened opened = ReplaySource.open(run.resolve("readings.csv"), sheet);
        assertThat(opened).isInstanceOf(Opened.Ready.class);
        try (Source source = ((Opened.Ready) opened).source()) {
            Reading reading = engine.newReading();
            for (Source.Outcome outcome = source.next(reading);
                    outcome == Source.Outcome.READING || outcome == Source.Outcome.RESTART;
                    outcome = source.next(reading)) {
                if (outcome == Source.Outcome.READING) {
                    engine.step(reading);
                } else {
                    engine.restarted(source.problem());
                }
            }
        }
        return engine.monitor().book().alarms();
    }

    private static Alarm drift(List<Alarm> alarms, double from) {
        return alarms.stream()
                .filter(a -> a.kind().isDrift() && a.raised() >= from)
                .findFirst()
                .orElseThrow(() -> new AssertionError(alarms.toString()));
    }

    @ParameterizedTest
    @MethodSource("seeds")
    void theGearPumpsSlipIsFoundWithinASecondAndNamedOnceThePointHasChanged(long seed) throws Exception {
        Alarm alarm = drift(alarms("gear-pump", seed), 380);
        assertThat(alarm.raised()).isBetween(380.0, 381.0);
        assertThat(alarm.kind()).isEqualTo(Kind.STEP);
        assertThat(alarm.unknown()).isEqualTo("c");
        assertThat(alarm.provisional()).isFalse();
        assertThat(alarm.onsetFrom()).isLessThanOrEqualTo(380.0);
        assertThat(alarm.onsetTo()).isGreaterThanOrEqualTo(380.0);
        assertThat(Math.abs(alarm.size() + 0.005)).isLessThan(2 * alarm.sizeU());
    }

    @ParameterizedTest
    @MethodSource("seeds")
    void theValvesFrictionStepsWhileItsSpringStays(long seed) throws Exception {
        List<Alarm> alarms = alarms("valve-stem", seed);
        assertThat(alarms).extracting(Alarm::kind).contains(Kind.RESTART);
        Alarm alarm = drift(alarms, 480);
        // 620 s of the rig's own time, of which 15 s passed unseen at the restart
        assertThat(alarm.raised()).isBetween(605.0, 607.0);
        assertThat(alarm.unknown()).isEqualTo("F_c");
        assertThat(Math.abs(alarm.size() - 85)).isLessThan(2 * alarm.sizeU());
    }

    @ParameterizedTest
    @MethodSource("seeds")
    void aLooseLeadAStuckChannelAndADropoutAreNeverCalledADrift(long seed) throws Exception {
        List<Alarm> alarms = alarms("electrolyser-cell", seed);
        assertThat(alarms).extracting(Alarm::kind).containsExactlyInAnyOrder(Kind.INTERMITTENT, Kind.STUCK, Kind.GAP);
    }

    @ParameterizedTest
    @MethodSource("seeds")
    void aThermocoupleThatLosesGainShowsAsTheSeebeckCoefficient(long seed) throws Exception {
        List<Alarm> alarms = alarms("thermoelectric-stage", seed);
        Alarm alarm = drift(alarms, 0);
        assertThat(alarm.unknown()).isEqualTo("S");
        assertThat(alarm.kind()).isEqualTo(Kind.DRIFT);
        assertThat(alarm.text()).contains("or dT reads low by", "second instrument");
        assertThat(alarm.raised()).isLessThan(980.0);
    }

    @ParameterizedTest
    @MethodSource("seeds")
    void aQuietBridgeRaisesNoAlarm(long seed) throws Exception {
        assertThat(alarms("prt-self-heating", seed)).isEmpty();
    }

    @ParameterizedTest
    @MethodSource("seeds")
    void aHumShowsAsAPeriodThatMayBeAnAlias(long seed) throws Exception {
        Alarm alarm = alarms("cyclone", seed).stream()
                .filter(a -> a.kind() == Kind.ALIAS)
                .findFirst()
                .orElseThrow();
        assertThat(alarm.size()).isBetween(45.0, 56.0);
        assertThat(alarm.text()).contains("11.3 Hz");
    }

    private static final class Deaf implements RunListener {
        @Override
        public void reading(EstimateRow row) {}

        @Override
        public void event(Event event) {}

        @Override
        public void closed(Closing closing) {}
    }
}
