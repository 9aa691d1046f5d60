package benchtrue.record;

import benchtrue.alarm.Alarm;
import benchtrue.model.Forgetting;
import benchtrue.model.Interval;
import benchtrue.model.Memory;
import benchtrue.run.Closing;
import java.time.Instant;
import java.util.List;
import org.jspecify.annotations.Nullable;

/** A closing summary made by hand, with something in every part of it. */
public final class Closings {
    private Closings() {}

    public static Closing pump() {
        Closing.Unknown d = unknown("D", "cm^3/rev", 11.30312, 0.00342, "conditional pass", null);
        Closing.Unknown c = unknown("c", "L/min/bar", -0.02101, 0.00021, null, "a drift alarm stands");
        Closing.Batch batch = new Closing.Batch(
                List.of(
                        new Closing.Fitted("D", 11.30312, 0.00342, 1e-11),
                        new Closing.Fitted("c", -0.02101, 0.00021, -2e-12)),
                1e-11,
                true,
                "Largest difference 1e-11 u, allowed 1e-6 u.");
        Closing.Relation relation = new Closing.Relation(
                "Q = D*n + c*dp",
                "Q",
                "L/min",
                new Forgetting(Forgetting.Kind.EXPONENTIAL, new Memory.Seconds(120)),
                "120 s",
                0,
                List.of(d, c),
                0.997,
                1 / (0.06 * 0.06),
                598,
                3.2,
                List.of(),
                0.02,
                1.97,
                599,
                batch,
                new Closing.Constancy(1.2, 2, 0.55),
                List.of("Durbin-Watson 1.97: no sign of correlation."),
                List.of(
                        new Closing.Segment(0, 380.2, "start", List.of(d, c)),
                        new Closing.Segment(380.2, 600, "step of c", List.of(d, c))));
        return new Closing(
                "Gear-pump slip, stand 2",
                "pump 0417",
                "ab".repeat(32),
                List.of("Oil under pressure: depressurise and bleed before opening."),
                List.of(new Closing.Instrument("dp", "bar", "2027-03-01", "", "1.002*x - 0.1")),
                "replay",
                "readings.csv",
                "cd".repeat(32),
                Instant.parse("2026-03-01T08:00:00Z"),
                new Closing.Readings(3000, 2990, 7, 3, 1, 2, 0, 0, 599.8, 599.8),
                List.of(new Closing.Held("coupling reseated", 3)),
                List.of(relation),
                List.of(new Closing.Result(
                        "flow at 1800 rev/min",
                        "L/min",
                        17.871,
                        0.012,
                        0.0236,
                        1.964,
                        598,
                        new Interval(16, Double.POSITIVE_INFINITY),
                        "U",
                        "pass",
                        null,
                        1)),
                List.of(alarm()),
                List.of("100.0 s: filter changed"),
                List.of("One equation cannot separate a gain error of dp from c."),
                3,
                "the run found something: a drift alarm");
    }

    static Alarm alarm() {
        return new Alarm(
                1,
                Alarm.Kind.STEP,
                "Q",
                null,
                null,
                380.2,
                380.0,
                380.6,
                1902,
                380.8,
                1905,
                -0.35,
                0.08,
                "L/min",
                "not separable",
                true,
                Alarm.State.RAISED,
                false,
                1,
                Alarm.Priority.ACT_NOW,
                "Change the pressure at constant speed.",
                "");
    }

    static Closing.Unknown unknown(
            String name,
            String unit,
            double estimate,
            double u,
            @Nullable String verdict,
            @Nullable String verdictWithheld) {
        return new Closing.Unknown(
                name,
                unit,
                estimate,
                u,
                2 * u,
                2,
                Double.POSITIVE_INFINITY,
                true,
                true,
                Double.NaN,
                new Interval(estimate - 1, estimate + 1),
                "U",
                verdict,
                verdictWithheld,
                0.9987,
                List.of(new Closing.Contribution("scatter (type A)", u, 598)));
    }
}
