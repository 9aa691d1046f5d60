package benchtrue.source;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import benchtrue.reading.Reading;
import benchtrue.sheet.BenchSheet;
import benchtrue.sheet.SheetReader;
import benchtrue.sheet.SheetReading;
import benchtrue.source.Source.Outcome;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;
import java.util.Objects;
import java.util.function.ToDoubleFunction;
import org.junit.jupiter.api.Test;

/** Courses, noise and faults of a rig whose readings can be worked out by hand: y = 2·x + 3, ten readings in a second. */
class SimulatedRigTest {
    private static final String RIG = """
            title = "rig"
            [channels]
            x = { unit = "V" }
            y = { unit = "V" }
            [[relations]]
            equation = "y = a*x + b"
            [rehearsal]
            rate = 10
            duration = "100 s"
            [rehearsal.truth]
            a = 2
            b = 3
            [rehearsal.channels]
            x = %s
            y = %s
            """;

    private static BenchSheet sheet(String text) {
        SheetReading reading = SheetReader.read("rig.toml", text.getBytes(StandardCharsets.UTF_8));
        assertThat(reading.mistakes()).isEmpty();
        return Objects.requireNonNull(reading.sheet());
    }

    private static List<double[]> readings(String x, String y, String faults) {
        return readings(String.format(RIG, x, y) + faults);
    }

    /** Time of the run and values of each reading. */
    private static List<double[]> readings(String text) {
        BenchSheet sheet = sheet(text);
        List<double[]> readings = new ArrayList<>();
        int channels = sheet.channels().size();
        try (Source source = SimulatedRig.source(sheet, Objects.requireNonNull(sheet.rehearsal()), 7)) {
            Reading reading = new Reading(channels);
            for (Outcome outcome = source.next(reading); outcome != Outcome.END; outcome = source.next(reading)) {
                if (outcome == Outcome.READING) {
                    double[] row = new double[channels + 1];
                    row[0] = reading.time;
                    System.arraycopy(reading.values, 0, row, 1, channels);
                    readings.add(row);
                }
            }
        } catch (IOException e) {
            throw new AssertionError(e);
        }
        return readings;
    }

    private static String fault(String kind, String channel, String rest) {
        return "[[rehearsal.faults]]\nkind = \"" + kind + "\"\nchannel = \"" + channel + "\"\n" + rest + "\n";
    }

    private static double[] at(List<double[]> readings, double seconds) {
        return readings.stream()
                .filter(r -> Math.abs(r[0] - seconds) < 0.01)
                .findFirst()
                .orElseThrow();
    }

    @Test
    void coursesGoAsTheirNamesSay() {
        assertThat(at(readings("{ steps = [[5, 1], [20, 4]] }", "{}", ""), 0)[1])
                .isEqualTo(1);
        List<double[]> steps = readings("{ steps = [[5, 1], [20, 4]] }", "{}", "");
        assertThat(at(steps, 19.9)[1]).isEqualTo(1);
        assertThat(at(steps, 20.0)).containsExactly(20, 4, 11);
        List<double[]> ramps = readings("{ ramps = [[10, 0], [20, 5]] }", "{}", "");
        assertThat(at(ramps, 9)[1]).isZero();
        assertThat(at(ramps, 12)).containsExactly(12, 1, 5);
        assertThat(at(ramps, 99)[1]).isEqualTo(5);
        List<double[]> stairs = readings("{ stairs = [1, 2, 3], dwell = \"2 s\" }", "{}", "");
        assertThat(at(stairs, 3.9)[1]).isEqualTo(2);
        assertThat(at(stairs, 6.0)[1]).isEqualTo(1);
        List<double[]> sine = readings("{ sine = [5, 2], period = \"40 s\" }", "{}", "");
        assertThat(at(sine, 10)[1]).isEqualTo(7);
        assertThat(at(sine, 50)[1]).isEqualTo(7);
        assertThat(at(sine, 70)[1]).isEqualTo(3);
        List<double[]> triangle = readings("{ triangle = [0, 20], period = \"40 s\" }", "{}", "");
        assertThat(at(triangle, 5)[1]).isEqualTo(5);
        assertThat(at(triangle, 20)[1]).isEqualTo(20);
        assertThat(at(triangle, 35)[1]).isEqualTo(5);
    }

    @Test
    void aLagOfTheFirstOrderIsAtSixtyThreePercentAfterItsTimeConstant() {
        List<double[]> lagged = readings("{ steps = [[0, 0], [10, 1]], lag = \"5 s\" }", "{}", "");
        assertThat(at(lagged, 9.9)[1]).isZero();
        assertThat(at(lagged, 14.9)[1]).isEqualTo(1 - Math.exp(-1), within(1e-6));
        assertThat(at(lagged, 14.9)[2]).isEqualTo(2 * (1 - Math.exp(-1)) + 3, within(2e-6));
    }

    @Test
    void truthMayChange() {
        String text = String.format(RIG, "5", "{}").replace("b = 3", "b = { steps = [[0, 3], [50, 4]] }");
        assertThat(at(readings(text), 49.9)[2]).isEqualTo(13);
        assertThat(at(readings(text), 50)[2]).isEqualTo(14);
    }

    @Test
    void noiseHasItsStandardDeviationAndCorrelation() {
        String y = "{ noise = 0.5, correlation = 0.8, resolution = 0.001 }";
        List<double[]> readings = readings(String.format(RIG, "1", y).replace("100 s", "20000 s"));
        double mean = mean(readings, r -> r[2]);
        double variance = mean(readings, r -> (r[2] - mean) * (r[2] - mean));
        double product = 0;
        for (int i = 1; i < readings.size(); i++) {
            product += (readings.get(i)[2] - mean) * (readings.get(i - 1)[2] - mean) / readings.size();
        }
        // 200 000 readings, of which by ρ = 0.8 about a ninth counts for the mean: three standard deviations of each.
        assertThat(mean).isEqualTo(5, within(0.01));
        assertThat(Math.sqrt(variance)).isEqualTo(0.5, within(0.006));
        assertThat(product / variance).isEqualTo(0.8, within(0.006));
        double tail = mean(readings, r -> Math.abs(r[2] - 5) > 1.959964 * 0.5 ? 1 : 0);
        assertThat(tail).isEqualTo(0.05, within(0.005));
    }

    private static double mean(List<double[]> readings, ToDoubleFunction<double[]> of) {
        return readings.stream().mapToDouble(of).average().orElseThrow();
    }

    @Test
    void indicationsAreWholeSteps() {
        for (double[] reading : readings("1", "{ noise = 0.5, resolution = 0.25 }", "")) {
            assertThat(reading[2] * 4).isEqualTo(Math.rint(reading[2] * 4));
        }
    }

    @Test
    void gainAndOffsetGrowAndEnd() {
        List<double[]> gain =
                readings("10", "{}", fault("gain", "x", "from = 20\nto = 60\nsize = -0.08\nover = \"20 s\""));
        assertThat(at(gain, 19.9)[1]).isEqualTo(10);
        assertThat(at(gain, 30)[1]).isEqualTo(9.6);
        assertThat(at(gain, 50)[1]).isEqualTo(9.2);
        assertThat(at(gain, 60)[1]).isEqualTo(10);
        assertThat(at(gain, 50)[2]).as("the truth behind the faulty channel").isEqualTo(23);
        assertThat(at(readings("10", "{}", fault("offset", "y", "from = 20\nsize = 1.5")), 50)[2])
                .isEqualTo(24.5);
    }

    @Test
    void warmUpDiesAwayAndHumShowsItsAlias() {
        List<double[]> warm = readings("1", "{}", fault("warm-up", "y", "size = 1\ntime_constant = \"20 s\""));
        assertThat(at(warm, 0)[2]).isEqualTo(6);
        assertThat(at(warm, 20)[2]).isEqualTo(5 + Math.exp(-1), within(1e-6));
        // 49.98 Hz at ten readings in a second is 0.02 Hz, turned over: a quarter of its period is 12.5 s.
        List<double[]> hum = readings("1", "{}", fault("hum", "y", "size = 1\nfrequency = 49.98"));
        assertThat(at(hum, 12.5)[2]).isEqualTo(4, within(1e-6));
        assertThat(at(hum, 37.5)[2]).isEqualTo(6, within(1e-6));
    }

    @Test
    void aLateChannelShowsWhatWasTrueBefore() {
        List<double[]> late =
                readings("{ triangle = [0, 20], period = \"40 s\" }", "{}", fault("late", "x", "delay = \"0.55 s\""));
        assertThat(at(late, 10)).containsExactly(10, 9.45, 23);
        assertThat(at(late, 0)[1]).isZero();
    }

    @Test
    void aLooseLeadSpoilsItsShareOfReadings() {
        String loose = "from = 20\nto = 80\nprobability = 0.12\nrange = [-0.9, -0.25]";
        List<double[]> readings = readings("1", "{}", fault("loose", "y", loose));
        List<double[]> off = readings.stream().filter(r -> r[2] != 5).toList();
        assertThat(off).allSatisfy(r -> {
            assertThat(r[0]).isBetween(20.0, 79.9);
            assertThat(r[2]).isBetween(4.1, 4.75);
        });
        assertThat(off.size()).isBetween(45, 100); // 72 ± 8 (binomial, 1 sd)
        List<double[]> outliers = readings("1", "{}", fault("outliers", "y", loose)).stream()
                .filter(r -> r[2] != 5)
                .toList();
        assertThat(outliers).anyMatch(r -> r[2] > 5).anyMatch(r -> r[2] < 5);
    }

    @Test
    void clipStuckAndMissing() {
        String ramp = "{ ramps = [[0, 0], [100, 10]] }";
        List<double[]> clip = readings(ramp, "{}", fault("clip", "y", "limits = [5, 20]"));
        assertThat(at(clip, 0)[2]).isEqualTo(5);
        assertThat(at(clip, 99)[2]).isEqualTo(20);
        assertThat(at(clip, 50)[2]).isEqualTo(13);
        List<double[]> stuck = readings(ramp, "{}", fault("stuck", "y", "from = 50\nto = 60"));
        assertThat(at(stuck, 59.9)[2]).isEqualTo(at(stuck, 49.9)[2]);
        assertThat(at(stuck, 60)[2]).isEqualTo(15);
        List<double[]> missing = readings(ramp, "{}", fault("missing", "x", "from = 50\nto = 60\nprobability = 1"));
        assertThat(at(missing, 55)[1]).isNaN();
        assertThat(at(missing, 55)[2]).isEqualTo(14);
        assertThat(missing).filteredOn(r -> Double.isNaN(r[1])).hasSize(100);
    }

    @Test
    void dropoutsAndRestartsKeepReadingsBack() {
        String dropout = "[[rehearsal.faults]]\nkind = \"dropout\"\nfrom = 50\nto = 60\n";
        assertThat(readings("1", "{}", dropout)).hasSize(900).noneMatch(r -> r[0] >= 50 && r[0] < 60);
        String restart = "[[rehearsal.faults]]\nkind = \"restart\"\nfrom = 50\nto = 60\nclock = -3600\n";
        List<double[]> restarted = readings("{ ramps = [[0, 0], [100, 10]] }", "{}", restart);
        assertThat(restarted).hasSize(900);
        assertThat(at(restarted, 50)[1])
                .as("10 s that the device's clock cannot know")
                .isEqualTo(6);
    }

    @Test
    void aFaultChangesNothingButWhatItSpoils() {
        String noisy = "{ noise = 0.5, resolution = 0.001 }";
        List<double[]> sound = readings("1", noisy, "");
        List<double[]> spoiled =
                readings("1", noisy, fault("loose", "y", "from = 20\nto = 30\nprobability = 0.5\nrange = [5, 6]"));
        for (int i = 0; i < sound.size(); i++) {
            if (sound.get(i)[0] < 20 || sound.get(i)[0] >= 30) {
                assertThat(spoiled.get(i)).isEqualTo(sound.get(i));
            }
        }
    }

    @Test
    void anIndicationIsWhatTheCorrectionTurnsIntoTheTruth() {
        String text = String.format(RIG, "100", "{}")
                .replace("x = { unit = \"V\" }", "x = { unit = \"V\", correction = \"1.002*x - 0.1\" }");
        assertThat(at(readings(text), 1)).containsExactly(1, 99.9002, 203);
    }

    @Test
    void functionsThatLookBackKnowWhatWasBeforeTheStart() {
        String text = String.format(RIG, "{ triangle = [0, 20], period = \"40 s\" }", "{}")
                .replace("a*x + b", "a*x + b*dir(x)");
        assertThat(at(readings(text), 0)[2]).isEqualTo(3);
        assertThat(at(readings(text), 30)[2]).isEqualTo(17);
    }

    /** First outputs of SplitMix64 from the state 1234567, as published with the generator (from memory). */
    @Test
    void theGeneratorIsTheOneThatIsNamed() {
        Noise noise = Noise.ofState(1234567);
        long[] published = {6457827717110365317L, 3203168211198807973L, -8629252141511181193L};
        for (long bits : published) {
            assertThat(noise.uniform()).isEqualTo((bits >>> 11) * 0x1p-53);
        }
    }
}
