package benchtrue.alarm;

import benchtrue.estimate.Quantiles;
import benchtrue.estimate.ResidualSpectrum;
import java.util.Locale;
import org.jspecify.annotations.Nullable;

/**
 * What the residuals of one relation follow though they should not: the direction of a channel (hysteresis), its rate (it is
 * late or early), or a period that may be the alias of something faster than the readings. Each is told once a segment, as a
 * suggestion with its numbers.
 */
final class ResidualShapes {
    private static final int LOOK = 512;
    private static final int PERIOD_LOOK = 4096;
    /** A line that explains less is not worth anybody's time (common practice, no source). */
    private static final double SHARE = 0.1;
    /** Its chance by noise; neighbours that depend on each other ask for more. */
    private static final double CHANCE = 1e-9;
    /** A channel turns round when it has come back by this share of its range so far. */
    private static final double TURN = 0.02;
    /** Another rate that moves the alias of any steady disturbance: no small ratio to the present one. */
    private static final double OTHER_RATE = 1.13;

    private final Watched watched;
    private final AlarmBook book;
    private final Autocorrelation dependence;
    private final int p;
    private final Follows[] rate;
    private final Follows[] direction;
    private final double[] before;
    private final double[] last;
    private final double[] lowest;
    private final double[] highest;
    private final double[] extreme;
    private final double[] way;
    private final boolean[] onlySigns;
    private ResidualSpectrum spectrum = new ResidualSpectrum();
    private double lastResidual = Double.NaN;
    private double lastTime;
    private double timeBefore = Double.NaN;
    private long rows;

    ResidualShapes(Watched watched, AlarmBook book, Autocorrelation dependence) {
        this.watched = watched;
        this.book = book;
        this.dependence = dependence;
        p = watched.size();
        rate = new Follows[p];
        direction = new Follows[p];
        for (int i = 0; i < p; i++) {
            rate[i] = new Follows();
            direction[i] = new Follows();
        }
        before = new double[p];
        last = new double[p];
        lowest = new double[p];
        highest = new double[p];
        extreme = new double[p];
        way = new double[p];
        onlySigns = new boolean[p];
        clear();
    }

    void clear() {
        rows = 0;
        lastResidual = Double.NaN;
        timeBefore = Double.NaN;
        spectrum = new ResidualSpectrum();
        for (int i = 0; i < p; i++) {
            rate[i].clear();
            direction[i].clear();
            lowest[i] = Double.POSITIVE_INFINITY;
            highest[i] = Double.NEGATIVE_INFINITY;
            extreme[i] = Double.NaN;
            way[i] = 0;
            onlySigns[i] = true;
        }
    }

    /**
     * @param phi the relation's own regressors; read
     * @param estimates of its own unknowns, that change seldom; read
     * @param interval median of readings in s
     */
    void add(double[] phi, double residual, double[] estimates, double time, double interval) {
        for (int i = 0; i < p; i++) {
            turn(i, phi[i]);
            // The rate at the row before, from the rows beside it: noise of that row itself must not look like a rate.
            if (!Double.isNaN(lastResidual) && time - timeBefore < 3 * interval) {
                rate[i].add((phi[i] - before[i]) / (time - timeBefore), lastResidual);
            }
            if (way[i] != 0 && !mayHaveTurned(i, phi[i])) {
                direction[i].add(way[i], residual);
            }
            before[i] = last[i];
            last[i] = phi[i];
        }
        timeBefore = rows == 0 ? Double.NaN : lastTime;
        lastTime = time;
        lastResidual = Double.isNaN(timeBefore) ? Double.NaN : residual;
        spectrum.add(residual);
        if (++rows % LOOK == 0) {
            look(estimates, time);
        }
        if (rows % PERIOD_LOOK == 0) {
            period(time, interval);
        }
    }

    private void turn(int i, double value) {
        onlySigns[i] &= Math.abs(value) == 1;
        lowest[i] = Math.min(lowest[i], value);
        highest[i] = Math.max(highest[i], value);
        double turn = TURN * (highest[i] - lowest[i]);
        if (Double.isNaN(extreme[i]) || (value - extreme[i]) * way[i] > 0) {
            extreme[i] = value;
        } else if (turn > 0 && Math.abs(value - extreme[i]) > turn) {
            way[i] = Math.signum(value - extreme[i]);
            extreme[i] = value;
        }
    }

    /** Between a tenth of a turn and a turn the direction is not known. */
    private boolean mayHaveTurned(int i, double value) {
        return Math.abs(value - extreme[i]) > TURN / 10 * (highest[i] - lowest[i]);
    }

    private void look(double[] estimates, double time) {
        double limit =
                Quantiles.student(CHANCE, Double.POSITIVE_INFINITY) * Math.sqrt(dependence.wholeVarianceFactor());
        boolean hasDirection = hasDirection();
        int late = -1;
        int turning = -1;
        double most = SHARE;
        for (int i = 0; i < p; i++) {
            if (watched.factors().get(i).isEmpty() || onlySigns[i]) {
                continue;
            }
            if (matters(rate[i], most, limit)) {
                most = rate[i].share();
                late = i;
            }
            if (!hasDirection && matters(direction[i], most, limit)) {
                most = direction[i].share();
                turning = i;
                late = -1;
            }
        }
        if (late >= 0) {
            tellLate(late, estimates[late], time);
        } else if (turning >= 0) {
            tellHysteresis(turning, time);
        }
    }

    private static boolean matters(Follows follows, double most, double limit) {
        return follows.share() > most && follows.significance() > limit;
    }

    /** Whether the equation already has a term that follows a direction. */
    private boolean hasDirection() {
        for (int i = 0; i < p; i++) {
            if (onlySigns[i] && !watched.unknowns().get(i).constantTerm()) {
                return true;
            }
        }
        return false;
    }

    private void tellLate(int i, double estimate, double time) {
        double late = rate[i].slope() / estimate;
        double u = 2 * Math.abs(late) / rate[i].significance();
        String channel = watched.factors().get(i).get(0);
        String words = channel + (late > 0 ? " is late by " : " is early by ") + Words.measured(Math.abs(late), u)
                + " s against " + watched.label() + ": the residuals follow its rate (" + percent(rate[i].share())
                + " of their variance). " + watched.unknowns().get(i).name()
                + " is biased in transients: stamp each channel, or use dwells only";
        report(Alarm.Kind.SKEW, channel, late, u, "s", time, words);
    }

    private void tellHysteresis(int i, double time) {
        String channel = watched.factors().get(i).get(0);
        double half = direction[i].slope();
        double u = 2 * Math.abs(half) / direction[i].significance();
        String words = watched.label() + ": the residuals follow the direction of " + channel + ", "
                + Words.measured(half, u)
                + Words.unit(watched.unit()) + " rising against falling at half width ("
                + percent(direction[i].share()) + " of their variance): hysteresis or friction? A term h*dir(" + channel
                + ") in the equation would take it up";
        report(Alarm.Kind.HYSTERESIS, null, half, u, watched.unit(), time, words);
    }

    private void period(double time, double interval) {
        ResidualSpectrum.Period period = spectrum.dominant();
        if (period == null) {
            return;
        }
        double rateNow = 1 / interval;
        String words = String.format(
                Locale.ROOT,
                "%s: a period of %.3g s holds %s of the residuals' variance. It may be real, or the alias of something faster, such as"
                        + " mains hum: record at %.3g Hz instead of %.3g Hz; if the period moves, it is an alias. The cure is a"
                        + " filter, or integration over whole mains cycles. Do not trust a CUSUM until then",
                watched.label(),
                period.readings() * interval,
                percent(period.share()),
                OTHER_RATE * rateNow,
                rateNow);
        report(Alarm.Kind.ALIAS, null, period.readings() * interval, Double.NaN, "s", time, words);
    }

    private static String percent(double share) {
        return String.format(Locale.ROOT, "%.0f %%", 100 * share);
    }

    private void report(
            Alarm.Kind kind, @Nullable String channel, double size, double u, String unit, double time, String words) {
        if (!book.stands(kind, watched.label(), channel)) {
            book.report(new Finding(
                    kind,
                    watched.label(),
                    channel,
                    null,
                    new Finding.Onset(Double.NaN, Double.NaN, time, 0),
                    size,
                    u,
                    unit,
                    null,
                    false,
                    false,
                    Alarm.Priority.NEXT_STOP,
                    words));
        }
    }
}
