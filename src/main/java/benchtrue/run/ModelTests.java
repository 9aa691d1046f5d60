package benchtrue.run;

import benchtrue.estimate.Fit;
import benchtrue.estimate.InputNoise;
import benchtrue.estimate.LackOfFit;
import benchtrue.estimate.ResidualSpectrum;
import benchtrue.estimate.RobustFits;
import benchtrue.estimate.Stability;
import benchtrue.estimate.ThinnedRows;
import benchtrue.sheet.Group;
import benchtrue.sheet.UnknownSpec;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;

/** What the rows of one segment say against the equation itself: periods, moved unknowns, lack of fit, wild readings, noise of x. */
final class ModelTests {
    /** Smaller autocorrelations are left alone (common practice, no source). */
    private static final double MATTERS = 0.1;

    private final Group group;
    private final Fit fit;
    private final ResidualSpectrum[] spectra;
    private final Stability[] stabilities;
    private final LackOfFit[] lacks;
    private final ThinnedRows rows;
    private final InputNoise inputs;
    private final Systematic noise;
    private double first = Double.NaN;
    private double last = Double.NaN;
    private long readings;

    /** @param noise rows with each channel moved by its declared noise */
    ModelTests(Group group, Fit fit, Systematic noise) {
        this.group = group;
        this.fit = fit;
        this.noise = noise;
        int p = fit.estimates().length;
        int relations = group.relations().size();
        spectra = new ResidualSpectrum[relations];
        stabilities = new Stability[relations];
        lacks = new LackOfFit[relations];
        for (int k = 0; k < relations; k++) {
            spectra[k] = new ResidualSpectrum();
            stabilities[k] = new Stability(p);
            lacks[k] = new LackOfFit(p);
        }
        rows = new ThinnedRows(p);
        inputs = new InputNoise(p);
    }

    /** The rows that follow are of the next reading, at this time. */
    void next(double time) {
        rows.next();
        first = Double.isNaN(first) ? time : first;
        last = time;
        readings++;
    }

    /** @param weight of the relation's rows beside the others */
    void row(int index, int relation, Row row, double weight) {
        double residual = row.residual(fit.estimates()) * Math.sqrt(row.weight);
        spectra[relation].add(residual);
        stabilities[relation].add(last, row.phi, row.response, row.weight);
        lacks[relation].add(row.phi, residual);
        rows.add(row.phi, row.response, row.weight * weight);
        for (int c = 0; c < noise.size(); c++) {
            Row moved = noise.row(c, index, relation);
            if (moved.present) {
                inputs.add(row.phi, row.response, moved.phi, moved.response, row.weight * weight);
            }
        }
    }

    /** Whether declared noise explains all that tells this unknown from the others. */
    boolean onlyNoise(int unknown) {
        return fit.determined() && effect(unknown, Double.NaN).onlyNoise();
    }

    private InputNoise.Effect effect(int unknown, double expanded) {
        return inputs.on(unknown, fit.covariance(), fit.estimates(), expanded);
    }

    /** @param autocorrelation of the residuals at lag 1, which the bounds do not allow for */
    List<String> sentences(int relation, double autocorrelation) {
        List<String> sentences = new ArrayList<>();
        ResidualSpectrum.Period period = spectra[relation].dominant();
        if (period != null) {
            sentences.add(String.format(
                    Locale.ROOT,
                    "A period of %.3g readings (about %.3g s) holds %.0f %% of the variance of the residuals: if it is the"
                            + " alias of a faster disturbance, such as mains hum, it moves at another sampling rate; the cure"
                            + " is a filter, or integration over whole mains cycles.",
                    period.readings(),
                    period.readings() * interval(),
                    100 * period.share()));
        }
        stability(sentences, stabilities[relation], autocorrelation > MATTERS);
        LackOfFit.Outcome lack =
                lacks[relation].judge(group.relations().get(relation).unknownIndex().length);
        if (lack != null) {
            sentences.add(lack.sentence());
        }
        return sentences;
    }

    private double interval() {
        return (last - first) / (readings - 1);
    }

    private static void stability(List<String> sentences, Stability stability, boolean dependent) {
        String unless = dependent ? ", unless the noise itself is autocorrelated." : ".";
        Stability.Curve sums = stability.cusum();
        Stability.Curve squares = stability.cusumOfSquares();
        if (sums.crossed()) {
            sentences.add(String.format(
                    Locale.ROOT,
                    "The cumulated recursive residuals cross their 5 %% bound at %.1f s (%.2f of it at most): the unknowns, or"
                            + " an offset, moved during the segment%s",
                    sums.crossedAt(),
                    sums.largest(),
                    unless));
        }
        if (squares.crossed()) {
            sentences.add(String.format(
                    Locale.ROOT,
                    "The cumulated squares of the recursive residuals leave their 5 %% bounds, most at %.1f s: the noise was"
                            + " not the same throughout%s",
                    squares.largestAt(),
                    unless));
        }
        if (!sums.crossed() && !squares.crossed() && !Double.isNaN(sums.largest())) {
            sentences.add("Cumulated recursive residuals and their squares stay within their 5 % bounds.");
        }
    }

    /** Of all relations together: robust fits and noise of the regressors. */
    List<String> sentences(double[] expanded) {
        List<String> sentences = new ArrayList<>();
        if (!fit.determined()) {
            return sentences;
        }
        List<UnknownSpec> unknowns = group.unknowns();
        List<String> names = unknowns.stream().map(UnknownSpec::name).toList();
        List<String> units = unknowns.stream().map(u -> u.unit().symbol()).toList();
        sentences.addAll(RobustFits.of(rows, fit.estimates()).sentences(names, units, fit.residualSd(), expanded));
        for (int i = 0; i < names.size(); i++) {
            inputNoise(sentences, unknowns.get(i), effect(i, expanded[i]));
        }
        return sentences;
    }

    private static void inputNoise(List<String> sentences, UnknownSpec unknown, InputNoise.Effect effect) {
        if (effect.onlyNoise()) {
            sentences.add(
                    unknown.name() + ": of what is left to tell it from the others at least half is the declared noise"
                            + " of the channels, so it is not determined however long the run: vary the operating point.");
        } else if (effect.flagged()) {
            sentences.add(String.format(
                    Locale.ROOT,
                    "%s: the declared noise of the channels in its term moves the estimate by about %+.2g%s, more than a"
                            + " tenth of U, and more readings do not take that away.",
                    unknown.name(),
                    effect.bias(),
                    unknown.unit().symbol().isEmpty()
                            ? ""
                            : " " + unknown.unit().symbol()));
        }
    }
}
