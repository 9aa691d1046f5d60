package benchtrue.screen;

import static org.assertj.core.api.Assertions.assertThat;

import benchtrue.alarm.Alarm;
import benchtrue.estimate.Rounded;
import benchtrue.run.Act;
import benchtrue.run.Shots;
import benchtrue.run.Snapshot;
import com.googlecode.lanterna.SGR;
import com.googlecode.lanterna.TerminalSize;
import com.googlecode.lanterna.graphics.BasicTextImage;
import java.util.List;
import java.util.Locale;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** What is on the screen is what the run says. */
final class FrameTest {
    private static Snapshot drifted;

    @BeforeAll
    static void replayTheFirstRig() {
        Locale.setDefault(Locale.ROOT);
        drifted = Shots.of("gear-pump", 402);
    }

    @ParameterizedTest
    @CsvSource({"80, 24", "120, 36", "200, 60"})
    void showsTheNumbersOfTheEstimator(int width, int height) {
        String picture = Picture.of(Shots.of("gear-pump", 370), width, height);
        Snapshot snapshot = Shots.of("gear-pump", 370);
        for (Snapshot.UnknownView unknown : snapshot.relations().get(0).unknowns()) {
            Rounded rounded = Rounded.of(unknown.estimate(), unknown.expandedUncertainty());
            assertThat(picture).contains(rounded.value()).contains(unknown.state());
        }
        for (Snapshot.ChannelView channel : snapshot.channels()) {
            assertThat(picture).contains(channel.name()).contains(Texts.value(channel.value(), 6));
        }
        assertThat(picture).contains("R E P L A Y").contains("no alarm").contains("pass");
    }

    @ParameterizedTest
    @CsvSource({"80, 24", "120, 36", "200, 60"})
    void saysWhatMovedAndThatNobodyHasLooked(int width, int height) {
        String picture = Picture.of(drifted, width, height);
        assertThat(picture)
                .contains("1 ALARM")
                .contains("cause c")
                .contains("withheld")
                .contains("PAUSED 6:42.0");
    }

    @Test
    void anAlarmIsInReverseVideoUntilItIsAcknowledged() {
        assertThat(reversed(drifted, " step ")).isTrue();
        Snapshot after = Shots.of("gear-pump", 402, new Act.Acknowledge(1, "seen"));
        assertThat(reversed(after, " step ")).isFalse();
        assertThat(Picture.of(after, 120, 36)).contains("[step]").contains("[1 alarm]");
    }

    private static boolean reversed(Snapshot snapshot, String word) {
        BasicTextImage image = new BasicTextImage(new TerminalSize(120, 36));
        Frame.draw(new Canvas(image.newTextGraphics(), false, new Cells()), Picture.shown(snapshot));
        for (int y = 20; y < 36; y++) {
            StringBuilder marked = new StringBuilder();
            for (int x = 0; x < 120; x++) {
                boolean reverse = image.getCharacterAt(x, y).getModifiers().contains(SGR.REVERSE);
                marked.append(reverse ? image.getCharacterAt(x, y).getCharacterString() : "");
            }
            if (marked.indexOf(word) >= 0) {
                return true;
            }
        }
        return false;
    }

    @Test
    void saysThatItIsTooSmallAndThatTheRunGoesOn() {
        assertThat(Picture.of(drifted, 60, 15))
                .contains("60 x 15")
                .contains("72 x 20")
                .contains("The run goes on: 2011 readings, 1")
                .contains("alarm");
        assertThat(Picture.of(drifted, 1, 1)).isNotNull();
    }

    @Test
    void liveIsNotReplay() {
        Snapshot live = Views.of(Views.channels(2), Views.unknowns(1, 2), List.of(), true);
        assertThat(Picture.of(live, 80, 24))
                .contains("L I V E")
                .contains("LINE 0.3 s AGO")
                .doesNotContain("R E P L A Y");
    }

    @ParameterizedTest
    @CsvSource({"72, 20", "80, 24", "120, 36", "200, 60"})
    void numbersOfAnySizeStayInTheirColumns(int width, int height) {
        double[] values = {1e-12, 1e12, -3.3e-7, 0, Double.NaN, 12345678.9, 1, 999.9996};
        String picture =
                Picture.of(Views.of(Views.channels(20), Views.unknowns(values), List.of(), false), width, height);
        List<String> rows = picture.lines().toList();
        assertThat(rows)
                .hasSize(height)
                .allSatisfy(row -> assertThat(row.length()).isLessThanOrEqualTo(width));
        assertThat(picture).contains("more");
    }

    @Test
    void eightUnknownsAreAllThereWhereThereIsRoom() {
        double[] values = {1e-12, 1e12, -3.3e-7, 0, Double.NaN, 12345678.9, 1, 999.9996};
        String picture = Picture.of(Views.of(Views.channels(4), Views.unknowns(values), List.of(), false), 120, 36);
        for (int i = 1; i <= 8; i++) {
            assertThat(picture).contains("k" + i + " ");
        }
        assertThat(picture)
                .contains("(1.000 ± 0.010)e-12")
                .contains("(1.000 ± 0.010)e12")
                .contains("not determined");
    }

    @Test
    void textsFromOutsideAreHarmless() {
        Snapshot wild = Views.of(
                List.of(
                        Views.channel("日本日本日本日本日本", "°C", 20, "good"),
                        Views.channel("a\u001b[2J\u0007", "\r\n", 1, "stuck")),
                List.of(Views.unknown("e\u0301\u202E", "Ω", 1, 0.1)),
                List.of(Views.alarm(1, Alarm.State.RAISED, "\u001b]0;title\u0007 " + "x".repeat(500))),
                false);
        for (boolean ascii : new boolean[] {false, true}) {
            String picture = Picture.of(Picture.shown(wild), 80, 24, ascii);
            assertThat(picture.replace("\n", "").chars()).allMatch(c -> !Character.isISOControl(c));
            assertThat(picture)
                    .doesNotContain("\u0301")
                    .doesNotContain("\u202E")
                    .contains("stuck");
        }
        assertThat(Picture.of(Picture.shown(wild), 80, 24, false)).contains("日本");
    }

    @Test
    void everythingCanBeWrittenInAscii() {
        for (Snapshot snapshot :
                List.of(drifted, Shots.of("valve-stem", 700), Shots.of("pressure-transmitter", 1300))) {
            String picture = Picture.of(Picture.shown(snapshot), 120, 36, true);
            assertThat(picture.chars()).allMatch(c -> c < 128);
            assertThat(picture).contains("+/-");
        }
    }

    @Test
    void everyRigFitsAtEveryTimeOfItsRun() {
        for (String rig :
                List.of("dosing-vessel", "pressure-transmitter", "valve-stem", "cyclone", "prt-self-heating")) {
            for (double seconds : new double[] {0, 5, 300}) {
                String picture = Picture.of(Shots.of(rig, seconds), 80, 24);
                assertThat(picture.lines().toList()).hasSize(24);
                assertThat(picture).contains("REPLAY".replace("", " ").strip()).contains("Estimates");
            }
        }
    }

    @Test
    void theEndOpensNothingByItselfButSaysSo() {
        assertThat(Picture.of(Shots.of("prt-self-heating", 1e9), 120, 36)).contains("ENDED");
    }

    @Test
    void digitsDoNotDanceAboutAPowerOfTen() {
        Decimals decimals = new Decimals();
        assertThat(decimals.text("D", 11.3031, 0.0099)).isEqualTo("11.3031 ± 0.0099");
        assertThat(decimals.text("D", 11.3031, 0.0102)).isEqualTo("11.3031 ± 0.0102");
        assertThat(decimals.text("D", 11.3031, 0.0140)).isEqualTo("11.303 ± 0.014");
        assertThat(decimals.text("D", 11.3031, 0.0102)).isEqualTo("11.303 ± 0.011");
        assertThat(decimals.text("D", 11.3031, 0.0098)).isEqualTo("11.3031 ± 0.0098");
    }
}
