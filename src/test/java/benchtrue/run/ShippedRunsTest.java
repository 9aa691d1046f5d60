package benchtrue.run;

import static org.assertj.core.api.Assertions.assertThat;

import benchtrue.alarm.ReferenceModel;
import benchtrue.reading.Reading;
import benchtrue.sheet.BenchSheet;
import benchtrue.sheet.SheetReader;
import benchtrue.source.Opened;
import benchtrue.source.ReplaySource;
import benchtrue.source.Source;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Objects;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.jspecify.annotations.Nullable;
import org.junit.jupiter.api.Test;

/** On shipped runs as they stand after some time. */
final class ShippedRunsTest {

    private static final Pattern HOLD =
            Pattern.compile("(?:hold|then) \\d+ readings \\(\\d+ s\\) at n = (\\d+) rev/min, dp = (\\d+) bar");

    private static Engine after(String rig, double seconds) throws Exception {
        Path folder = Path.of("replays", rig);
        BenchSheet sheet = Objects.requireNonNull(
                SheetReader.read(folder.resolve("sheet.toml")).sheet());
        List<@Nullable ReferenceModel> none = new ArrayList<>();
        sheet.groups().forEach(g -> none.add(null));
        RunListener deaf = new RunListener() {
            @Override
            public void reading(EstimateRow row) {}

            @Override
            public void event(Event event) {}

            @Override
            public void closed(Closing closing) {}
        };
        Engine engine = new Engine(new Setup(sheet, false, "replay", rig, null, none), deaf);
        Opened opened = ReplaySource.open(folder.resolve("readings.csv"), sheet);
        assertThat(opened).isInstanceOf(Opened.Ready.class);
        try (Source source = ((Opened.Ready) opened).source()) {
            Reading reading = engine.newReading();
            while (source.next(reading) == Source.Outcome.READING && reading.time <= seconds) {
                engine.step(reading);
            }
        }
        return engine;
    }

    @Test
    void namesPointsInsideTheDeclaredLimits() throws Exception {
        Engine engine = after("gear-pump", 30);
        Snapshot.AdviceView advice = new Advising(engine).advice();
        assertThat(advice).isNotNull();
        assertThat(advice.refusal()).isEmpty();
        assertThat(advice.unknown()).isEqualTo("D");
        assertThat(advice.expectedU()).isBetween(0.0185, 0.0206);
        assertThat(advice.words()).hasSizeBetween(1, 5);
        for (String words : advice.words()) {
            Matcher matcher = HOLD.matcher(words);
            assertThat(matcher.matches()).as(words).isTrue();
            double n = Double.parseDouble(matcher.group(1));
            double dp = Double.parseDouble(matcher.group(2));
            assertThat(n).isBetween(900.0, 2400.0);
            assertThat(dp).isBetween(30.0, 175.0);
            assertThat(n * dp).isLessThan(3.5e5);
        }
        assertThat(new Stopping(engine).whyNotYet())
                .anyMatch(r -> r.matches("U of D is 0\\.0\\d+, wanted 0\\.020"))
                .contains("no reference model adopted yet");
    }

    @Test
    void foretellsWhenTheWantedUncertaintyComesOrWhyNever() throws Exception {
        Engine engine = after("gear-pump", 30);
        GroupRun run = engine.groups().get(0);
        Outlook outlook = new Outlook(run, run.now(), engine.monitor().interval());
        assertThat(outlook.forecast(0, 1).seconds()).isZero();
        assertThat(outlook.forecast(0, Double.NaN).seconds()).isNaN();
        assertThat(outlook.forecast(0, 0.005).neverWhy()).startsWith("the declared other uncertainty alone makes U");
    }

    @Test
    void givesNoneWhileAnAlarmIsUnacknowledged() throws Exception {
        Snapshot.AdviceView advice = new Advising(after("gear-pump", 450)).advice();
        assertThat(advice).isNotNull();
        assertThat(advice.refusal()).isEqualTo("an alarm is unacknowledged");
        assertThat(advice.words()).isEmpty();
    }

    /** While the load stays centred, what is left to tell the legs apart is the noise of their channels. */
    @Test
    void legsUnderACentredLoadAreNotDeterminedUntilEachIsLoadedAlone() throws Exception {
        Engine centred = after("dosing-vessel", 299);
        assertThat(centred.groups().get(0).estimator().determined()).isTrue();
        for (int leg = 0; leg < 3; leg++) {
            assertThat(centred.settling(0).of(leg)).isEqualTo(Standing.NOT_DETERMINED);
        }
        assertThat(centred.settling(0).of(3)).isNotEqualTo(Standing.NOT_DETERMINED);
        assertThat(centred.settling(0).diagnosis().conditionIndex()).isGreaterThan(1e3);
        assertThat(centred.settling(0).diagnosis().inseparable()).containsExactly(List.of(0, 1, 2));
        Engine each = after("dosing-vessel", 599);
        for (int unknown = 0; unknown < 4; unknown++) {
            assertThat(each.settling(0).of(unknown)).isEqualTo(Standing.SETTLED);
        }
    }
}
