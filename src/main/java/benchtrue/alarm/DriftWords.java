package benchtrue.alarm;

import benchtrue.model.Interval;
import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Set;
import java.util.stream.Collectors;

/** What is said of a change against the reference: what, since when, how much, how sure, what would tell more. */
final class DriftWords {
    private static final String NOT_SEPARABLE = "not separable";

    private final Watched watched;
    private final ReferenceWatch.Frozen frozen;
    private final int p;

    DriftWords(Watched watched, ReferenceWatch.Frozen frozen) {
        this.watched = watched;
        this.frozen = frozen;
        p = watched.size();
    }

    /**
     * @param limit of ℓ
     * @param cusumSince reading at which the CUSUM left its stop, for what the bank does not see yet
     */
    Finding finding(Cause cause, double limit, double now, long cusumSince) {
        boolean noise = isNoise(cause);
        boolean named = cause.named() && !noise;
        boolean weak = !(cause.ratio() > limit);
        Finding.Onset onset = weak && cause.onset().reading() == 0
                ? new Finding.Onset(Double.NaN, Double.NaN, now, cusumSince)
                : cause.onset();
        boolean ofUnknown = named || noise;
        return new Finding(
                noise ? Alarm.Kind.NOISE : cause.ramp() ? Alarm.Kind.DRIFT : Alarm.Kind.STEP,
                watched.label(),
                null,
                named && cause.leader() < p ? name(cause.leader()) : null,
                onset,
                ofUnknown ? cause.size() : cause.shift(),
                ofUnknown ? cause.sizeU() : cause.shiftU(),
                noise ? "" : named ? unit(cause.leader()) : watched.unit(),
                noise
                        ? null
                        : named || (cause.tellable() && !cause.together() && !weak)
                                ? name(cause.leader())
                                : NOT_SEPARABLE,
                !cause.named(),
                named && beyondLimit(cause),
                Alarm.Priority.ACT_NOW,
                text(cause, onset, limit));
    }

    private boolean isNoise(Cause cause) {
        return cause.leader() > p || (watched.hasConstantTerm() && cause.leader() == p);
    }

    private boolean beyondLimit(Cause cause) {
        int i = cause.leader();
        Interval limits = i < p ? watched.unknowns().get(i).limits() : null;
        return limits != null && !limits.contains(frozen.values()[i] + cause.size());
    }

    private String text(Cause cause, Finding.Onset onset, double limit) {
        List<String> sentences = new ArrayList<>();
        sentences.add(watched.label() + ": " + what(cause) + since(onset));
        if (cause.ratio() > 1) {
            sentences.add(howSure(cause, limit));
        }
        String more = more(cause);
        if (!more.isEmpty()) {
            sentences.add(more);
        }
        if (onset.reading() > 0) {
            sentences.add("Readings from " + suspect(onset) + " on are suspect");
        }
        if (cause.named() && !isNoise(cause)) {
            sentences.add(inseparable(cause.leader()));
        }
        return String.join(". ", sentences);
    }

    private String what(Cause cause) {
        if (isNoise(cause)) {
            return "the noise is " + Words.number(cause.size()) + " ± " + Words.number(cause.sizeU())
                    + " times that of the reference, " + Words.number(cause.size() * frozen.sd())
                    + Words.unit(watched.unit());
        }
        if (!cause.named()) {
            return "readings lie " + Words.measured(cause.shift(), cause.shiftU()) + Words.unit(watched.unit())
                    + " from the reference model";
        }
        int i = cause.leader();
        String size = Words.measured(cause.size(), cause.sizeU()) + Words.unit(unit(i));
        if (i == p) {
            return "an offset of " + size + (cause.ramp() ? " has crept in" : " has appeared");
        }
        double value = frozen.values()[i];
        return name(i) + (cause.ramp() ? " has drifted by " : " has stepped by ") + size + " from the reference's "
                + Words.number(value) + channelInstead(i, cause.size() / value);
    }

    /** A coefficient that seems to rise by the fraction f is also what a channel that reads low by f/(1 + f) looks like. */
    private String channelInstead(int i, double fraction) {
        List<String> factors = watched.factors().get(i);
        if (factors.size() != 1 || !(Math.abs(fraction) < 0.5)) {
            return "";
        }
        double gain = -fraction / (1 + fraction);
        return ", or " + factors.get(0) + " reads " + (gain < 0 ? "low" : "high") + " by "
                + Words.number(Math.abs(100 * gain)) + " %";
    }

    private static String since(Finding.Onset onset) {
        if (onset.reading() == 0) {
            return "";
        }
        if (Double.isNaN(onset.time())) {
            return ", since about reading " + onset.reading();
        }
        String interval = Double.isNaN(onset.from()) || onset.from() == onset.to()
                ? ""
                : " (between " + Words.number(onset.from()) + " and " + Words.number(onset.to()) + " s)";
        return ", since " + Words.number(onset.time()) + " s" + interval;
    }

    private static String suspect(Finding.Onset onset) {
        return onset.from() < onset.time()
                ? Words.number(onset.from()) + " s (reading " + onset.reading() + " at the likeliest)"
                : "reading " + onset.reading();
    }

    private String howSure(Cause cause, double limit) {
        return "Evidence " + Words.number(Math.rint(cause.ratio())) + ", limit " + Words.number(Math.rint(limit))
                + ", next cause " + Words.number(Math.rint(cause.ratio() - cause.lead()));
    }

    /** What would tell more, or empty. */
    private String more(Cause cause) {
        if (isNoise(cause)) {
            return "Look for a loose lead, a new source of interference or vibration; make the rig safe first";
        }
        if (cause.named()) {
            return "Make the rig safe before opening it: a cause is a lead";
        }
        if (cause.tellable()) {
            if (cause.gain()) {
                return "All coefficients seem to have changed by one factor: does " + watched.label()
                        + " itself read wrong? Check it against a second instrument";
            }
            if (cause.together()) {
                return "No single unknown explains it: several changed, or something that is not in the equation";
            }
        }
        String rivals = cause.rivals().stream().map(this::name).collect(Collectors.joining(" or "));
        return cause.tellable()
                ? "Cause not sure yet: " + rivals + "; more readings will tell"
                : "Cause not separable yet: " + rivals + "; " + change(cause);
    }

    /** "change dp at constant n". */
    private String change(Cause cause) {
        for (int i : cause.rivals()) {
            List<String> factors = factors(i);
            if (!factors.isEmpty()) {
                Set<String> others = new LinkedHashSet<>();
                watched.factors().forEach(others::addAll);
                factors.forEach(others::remove);
                String constant = others.isEmpty() ? "" : " at constant " + String.join(", ", others);
                return "change " + String.join(" or ", factors) + constant;
            }
        }
        return "change the operating point";
    }

    private List<String> factors(int i) {
        return i < p ? watched.factors().get(i) : List.of();
    }

    /** The line about what one equation cannot separate. */
    private String inseparable(int i) {
        String own = i == p || watched.unknowns().get(i).constantTerm()
                ? name(i) + " from the zero error of " + watched.label() + " or of a channel"
                : name(i) + " from the gain of " + String.join(", ", orItsFactor(i));
        return "One equation cannot tell " + own + ": only a second instrument, a zero check or a check standard can";
    }

    private List<String> orItsFactor(int i) {
        List<String> factors = watched.factors().get(i);
        return factors.isEmpty() ? List.of("what it multiplies") : factors;
    }

    private String name(int i) {
        return i < p ? watched.unknowns().get(i).name() : i == p && !watched.hasConstantTerm() ? "offset" : "noise";
    }

    private String unit(int i) {
        return i < p ? watched.unknowns().get(i).unit().symbol() : watched.unit();
    }
}
