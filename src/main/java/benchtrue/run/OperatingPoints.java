package benchtrue.run;

import benchtrue.estimate.CandidatePoint;
import benchtrue.model.Evaluator;
import benchtrue.model.Expression;
import benchtrue.model.Interval;
import benchtrue.model.Observation;
import benchtrue.model.Preparation;
import benchtrue.model.Regressor;
import benchtrue.reading.Reading;
import benchtrue.sheet.BenchSheet;
import benchtrue.sheet.Channel;
import benchtrue.sheet.Derived;
import benchtrue.sheet.Group;
import benchtrue.sheet.Joint;
import benchtrue.sheet.Point;
import benchtrue.sheet.RelationSpec;
import java.math.BigDecimal;
import java.math.RoundingMode;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.jspecify.annotations.Nullable;

/** The operating points that the sheet leaves to advice: channels declared adjustable, inside {@code operate} and {@code joint}. */
final class OperatingPoints {
    /** Long enough for {@code rate} to come to rest at a point. */
    private static final double REST_SECONDS = 1e4;
    /** Settings are told to at least so many steps of their range, and at most ten times as many. */
    private static final double STEPS = 50;

    private final BenchSheet sheet;
    private final List<Integer> adjustable = new ArrayList<>();
    private final List<Interval> box = new ArrayList<>();

    OperatingPoints(BenchSheet sheet) {
        this.sheet = sheet;
        for (int i = 0; i < sheet.channels().size(); i++) {
            Channel channel = sheet.channels().get(i);
            Interval operate = channel.operate();
            if (channel.adjustable() && operate != null && operate.width() > 0 && !Double.isInfinite(operate.width())) {
                adjustable.add(i);
                box.add(operate);
            }
        }
    }

    boolean any() {
        return !adjustable.isEmpty();
    }

    /**
     * Points for one group; where a term cannot be computed at a point it is left out.
     *
     * @param present corrected values of all channels: those not adjustable stay as they are
     * @param relationWeights what the rows of each relation are multiplied by
     */
    List<CandidatePoint> candidates(Group group, double[] present, double[] relationWeights) {
        double[] inside = new double[adjustable.size()];
        for (int j = 0; j < inside.length; j++) {
            double value = present[adjustable.get(j)];
            Interval range = box.get(j);
            inside[j] = Double.isNaN(value)
                    ? (range.lower() + range.upper()) / 2
                    : Math.max(range.lower(), Math.min(range.upper(), value));
        }
        List<CandidatePoint> candidates = new ArrayList<>();
        for (double[] setting : CandidatePoint.settings(box, s -> allowed(present, s), inside, planned(present))) {
            double[] rounded = rounded(setting, inside);
            CandidatePoint candidate =
                    allowed(present, rounded) ? candidate(group, present, rounded, relationWeights) : null;
            if (candidate != null) {
                candidates.add(candidate);
            }
        }
        return candidates;
    }

    private List<double[]> planned(double[] present) {
        List<double[]> planned = new ArrayList<>();
        for (Point point : sheet.points()) {
            double[] setting = new double[adjustable.size()];
            for (int j = 0; j < setting.length; j++) {
                double set = point.set()[adjustable.get(j)];
                setting[j] = Double.isNaN(set) ? present[adjustable.get(j)] : set;
            }
            planned.add(setting);
        }
        return planned;
    }

    /** To a step that people can set, towards the inside, so that a limit is not passed by rounding. */
    private double[] rounded(double[] setting, double[] inside) {
        double[] rounded = new double[setting.length];
        for (int j = 0; j < setting.length; j++) {
            double step = step(j);
            double whole = setting[j] / step;
            double near = Math.rint(whole);
            double towards = setting[j] > inside[j] ? Math.floor(whole) : Math.ceil(whole);
            rounded[j] = (Math.abs(whole - near) < 1e-9 * Math.abs(near) + 1e-12 ? near : towards) * step;
        }
        return rounded;
    }

    /** A power of ten, at least the channel's resolution. */
    private double step(int j) {
        double resolution = sheet.channels().get(adjustable.get(j)).resolution();
        double fine = Math.pow(10, Math.floor(Math.log10(box.get(j).width() / STEPS)));
        return resolution > fine ? resolution : fine;
    }

    private double[] all(double[] present, double[] setting) {
        double[] all = Arrays.copyOf(present, sheet.channels().size());
        for (int j = 0; j < setting.length; j++) {
            all[adjustable.get(j)] = setting[j];
        }
        return all;
    }

    /** Settings are corrected values already. */
    private Preparation preparation() {
        List<@Nullable Expression> none = new ArrayList<>();
        sheet.channels().forEach(c -> none.add(null));
        return new Preparation(
                none, sheet.derived().stream().map(Derived::expression).toList());
    }

    private boolean allowed(double[] present, double[] setting) {
        Observation at = preparation().prepare(reading(all(present, setting), 0));
        for (Joint joint : sheet.joint()) {
            Evaluator excess = joint.excess().compile();
            if (!(excess.evaluate(at) <= 0)) {
                return false;
            }
        }
        return true;
    }

    private static Reading reading(double[] values, double time) {
        Reading reading = new Reading(values.length);
        System.arraycopy(values, 0, reading.values, 0, values.length);
        reading.time = time;
        return reading;
    }

    /** The rows after going there from the present point and coming to rest. */
    private @Nullable CandidatePoint candidate(
            Group group, double[] present, double[] setting, double[] relationWeights) {
        double[] from = Arrays.copyOf(present, sheet.channels().size());
        double[] to = all(present, setting);
        List<double[]> rows = new ArrayList<>();
        double[] weights = new double[relationWeights.length];
        for (int k = 0; k < weights.length; k++) {
            RelationSpec spec = group.relations().get(k);
            Preparation preparation = preparation();
            Regressor regressor = spec.relation().compile();
            regressor.evaluate(preparation.prepare(reading(from, 0)));
            regressor.evaluate(preparation.prepare(reading(to, REST_SECONDS)));
            if (!regressor.evaluate(preparation.prepare(reading(to, 2 * REST_SECONDS)))) {
                return null;
            }
            double[] phi = new double[group.unknowns().size()];
            for (int i = 0; i < spec.unknownIndex().length; i++) {
                phi[spec.unknownIndex()[i]] = regressor.regressors()[i];
            }
            rows.add(phi);
            weights[k] = regressor.weight() * relationWeights[k];
        }
        return new CandidatePoint(words(setting), rows, weights);
    }

    private String words(double[] setting) {
        List<String> words = new ArrayList<>();
        for (int j = 0; j < setting.length; j++) {
            Channel channel = sheet.channels().get(adjustable.get(j));
            int places = Math.max(0, (int) -Math.floor(Math.log10(step(j)) + 1e-9));
            String number = BigDecimal.valueOf(setting[j])
                    .setScale(places, RoundingMode.HALF_EVEN)
                    .toPlainString();
            words.add((channel.name() + " = " + number + " " + channel.unit().symbol()).strip());
        }
        return String.join(", ", words);
    }
}
