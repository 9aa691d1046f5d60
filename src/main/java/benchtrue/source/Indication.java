package benchtrue.source;

import benchtrue.model.Evaluator;
import benchtrue.model.Expression;
import benchtrue.model.Observation;
import benchtrue.sheet.Channel;
import benchtrue.sheet.Fault;
import benchtrue.sheet.Rehearsal;
import java.math.BigDecimal;
import java.util.List;
import org.jspecify.annotations.Nullable;

/** What one channel of the simulated rig indicates: the truth, with the channel's faults and noise, in whole steps. */
final class Indication {
    private static final int CORRECTION_STEPS = 20;

    private final Rehearsal.Instrument instrument;
    private final double interval;
    private final List<? extends Fault.OfChannel> faults;
    private final Noise noise;
    private final Noise chance;
    private final @Nullable Evaluator correction;
    private final Observation observation;
    private final int channel;
    private final double[] past;
    private int count;
    private double error = Double.NaN;
    private @Nullable BigDecimal last;

    Indication(int channel, Channel of, int channels, Rehearsal rehearsal, long seed) {
        this.channel = channel;
        instrument = rehearsal.channels().get(channel);
        interval = 1 / rehearsal.ratePerSecond();
        faults = rehearsal.faults().stream()
                .filter(fault -> fault instanceof Fault.OfChannel own && own.channel() == channel)
                .map(Fault.OfChannel.class::cast)
                .toList();
        noise = new Noise(seed, 2 * channel + 1);
        chance = new Noise(seed, 2 * channel + 2);
        Expression expression = of.correction();
        correction = expression == null ? null : expression.compile();
        observation = new Observation(channels);
        boolean late = faults.stream().anyMatch(Fault.Late.class::isInstance);
        past = new double[late ? Math.toIntExact(rehearsal.readings()) : 0];
    }

    /**
     * Draws its random numbers whether they show or not, so that a fault changes nothing but what it spoils.
     *
     * @return null for an empty cell
     */
    @Nullable
    BigDecimal next(double seconds, double truth) {
        double value = noisy(disturbed(seconds, indicated(delayed(seconds, truth))));
        boolean missing = false;
        boolean stuck = false;
        for (Fault.OfChannel fault : faults) {
            boolean now = fault.from() <= seconds && seconds < fault.to();
            if (fault instanceof Fault.Loose loose) {
                value += looseness(loose, now);
            } else if (fault instanceof Fault.Missing some) {
                missing |= chance.uniform() < some.probability() && now;
            } else if (fault instanceof Fault.Clip clip && now) {
                value = Math.max(clip.low(), Math.min(clip.high(), value));
            } else if (fault instanceof Fault.Stuck) {
                stuck |= now;
            }
        }
        if (!stuck || last == null) {
            last = Double.isFinite(value) ? inSteps(value) : null;
        }
        return missing ? null : last;
    }

    private double delayed(double seconds, double truth) {
        if (past.length == 0) {
            return truth;
        }
        past[count++] = truth;
        double delay = 0;
        for (Fault.OfChannel fault : faults) {
            if (fault instanceof Fault.Late late && late.from() <= seconds && seconds < late.to()) {
                delay += late.delaySeconds();
            }
        }
        double place = Math.max(0, count - 1 - delay / interval);
        int before = (int) place;
        int after = Math.min(before + 1, count - 1);
        return past[before] + (place - before) * (past[after] - past[before]);
    }

    /** The indication that the channel's correction turns into the true value (secant method). */
    private double indicated(double truth) {
        if (correction == null) {
            return truth;
        }
        double x = truth;
        double slope = 1;
        double miss = corrected(x) - truth;
        for (int i = 0; i < CORRECTION_STEPS && miss != 0; i++) {
            double to = x - miss / slope;
            double missThere = corrected(to) - truth;
            if (to == x || missThere == miss) {
                return to;
            }
            slope = (missThere - miss) / (to - x);
            x = to;
            miss = missThere;
        }
        return x;
    }

    private double corrected(double indication) {
        observation.values[channel] = indication;
        return correction == null ? indication : correction.evaluate(observation);
    }

    private double disturbed(double seconds, double truth) {
        double value = truth;
        for (Fault.OfChannel fault : faults) {
            double since = seconds - fault.from();
            if (since < 0 || seconds >= fault.to()) {
                continue;
            }
            if (fault instanceof Fault.Gain gain) {
                value *= 1 + gain.size() * reached(since, gain.overSeconds());
            } else if (fault instanceof Fault.Offset offset) {
                value += offset.size() * reached(since, offset.overSeconds());
            } else if (fault instanceof Fault.WarmUp warmUp) {
                value += warmUp.size() * StrictMath.exp(-since / warmUp.timeConstantSeconds());
            } else if (fault instanceof Fault.Hum hum) {
                value += hum.size() * StrictMath.sin(2 * Math.PI * hum.frequencyHertz() * seconds);
            }
        }
        return value;
    }

    private static double reached(double since, double over) {
        return over > 0 ? Math.min(1, since / over) : 1;
    }

    /** Of the first order, with the declared standard deviation from the first reading on. */
    private double noisy(double value) {
        double rho = instrument.correlation();
        double fresh = instrument.noise() * noise.normal();
        error = Double.isNaN(error) ? fresh : rho * error + Math.sqrt(1 - rho * rho) * fresh;
        return value + error;
    }

    private double looseness(Fault.Loose loose, boolean now) {
        boolean off = chance.uniform() < loose.probability();
        double size = loose.low() + (loose.high() - loose.low()) * chance.uniform();
        boolean turned = chance.uniform() < 0.5 && loose.eitherSign();
        return !off || !now ? 0 : turned ? -size : size;
    }

    private BigDecimal inSteps(double value) {
        BigDecimal step = instrument.step();
        return BigDecimal.valueOf((long) Math.rint(value / step.doubleValue())).multiply(step);
    }
}
