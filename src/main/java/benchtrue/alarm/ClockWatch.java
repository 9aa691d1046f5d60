package benchtrue.alarm;

import java.util.Locale;
import org.jspecify.annotations.Nullable;

/**
 * The time stamps: silence of more than three usual intervals, and of more than 0.1 s, is a gap, and nothing is interpolated over it; a stamp that
 * goes back, or leaps by more than ten minutes and a thousand intervals, is a restart or a clock that was set, and begins a
 * new segment.
 */
final class ClockWatch {
    private static final double GAP = 3;
    /** A system that has other work may hand lines over so late: common practice, no source. In s. */
    private static final double SHORTEST_GAP = 0.1;

    private static final double LEAP_INTERVALS = 1000;
    private static final double LEAP_SECONDS = 600;

    private final UsualInterval intervals = new UsualInterval();
    private final AlarmBook book;
    private double last = Double.NaN;
    private double running;
    private double elapsed;
    private long gaps;
    private @Nullable String segment;

    ClockWatch(AlarmBook book) {
        this.book = book;
    }

    void arrive(double time, long number) {
        double step = Double.isNaN(last) ? 0 : time - last;
        segment = null;
        elapsed = Math.max(0, step);
        running += elapsed;
        book.at(running, number);
        if (intervals.known()) {
            judge(step, time, number);
        }
        intervals.add(step);
        last = time;
    }

    private void judge(double step, double time, long number) {
        double usual = intervals.seconds();
        if (step < -GAP * usual) {
            elapsed = 0;
            restart(step, time, number);
        } else if (step <= 0) {
            tell(
                    Alarm.Kind.CLOCK,
                    time,
                    number,
                    step,
                    "time stamp repeats or goes back by %.3g s: the reading is used, no time is taken to have passed",
                    -step);
        } else if (step > Math.max(LEAP_SECONDS, LEAP_INTERVALS * usual)) {
            segment = "clock leapt";
            tell(
                    Alarm.Kind.CLOCK,
                    time,
                    number,
                    step,
                    "time leaps forward by %.6g s: a long silence or a clock that was set; a new segment begins",
                    step);
        } else if (step > Math.max(GAP * usual, SHORTEST_GAP)) {
            gaps++;
            tell(
                    Alarm.Kind.GAP,
                    time,
                    number,
                    step,
                    "no reading for %.4g s, " + word(step / usual)
                            + " times the usual interval; nothing is interpolated",
                    step);
        }
    }

    private void restart(double step, double time, long number) {
        segment = "restart";
        tell(
                Alarm.Kind.RESTART,
                time,
                number,
                step,
                "the device's time goes back by %.6g s: it restarted or its clock was set; a new segment begins, to be compared with the one before",
                -step);
    }

    /** The source saw the device begin anew with the reading last arrived, though its time goes on. */
    void restarted(long number) {
        tell(
                Alarm.Kind.RESTART,
                running,
                number,
                Double.NaN,
                "the device began anew; a new segment begins, to be compared with the one before",
                0);
    }

    private static String word(double ratio) {
        return String.format(Locale.ROOT, "%.0f", ratio);
    }

    /** Such a thing is over as soon as it is seen. */
    private void tell(Alarm.Kind kind, double time, long number, double size, String text, double value) {
        book.report(Finding.of(
                kind,
                null,
                Finding.Onset.at(time, number),
                size,
                "s",
                Alarm.Priority.NEXT_STOP,
                String.format(Locale.ROOT, text, value)));
        book.normal(kind, null, null);
    }

    /** Seconds since the reading before, never negative: by so much the estimates age. */
    double elapsed() {
        return elapsed;
    }

    /** Seconds of the run with every step back left out: never goes back. */
    double running() {
        return running;
    }

    /** Usual interval of readings in s; NaN before the second. */
    double interval() {
        return intervals.seconds();
    }

    boolean intervalKnown() {
        return intervals.known();
    }

    long gaps() {
        return gaps;
    }

    /** Why a new segment begins with this reading, or null. */
    @Nullable
    String segment() {
        return segment;
    }
}
