package benchtrue.sheet;

import benchtrue.model.Expression;
import benchtrue.model.Preparation;
import benchtrue.model.Regressor;
import benchtrue.model.Relation;
import benchtrue.reading.Reading;
import java.util.Arrays;
import java.util.Collections;
import java.util.List;
import org.jspecify.annotations.Nullable;

/**
 * Finds out whether the right side of a relation needs its response, now or one reading ago, by trying: what has a value at two
 * made-up readings and none when the response is missing at one of them needs the response.
 */
final class SelfReference {
    private static final double FIRST = 1;
    /** Far from the first, so that every direction and rate is known. */
    private static final double SECOND = 1e6;

    private SelfReference() {}

    /** @param response index of the channel that is the left side */
    static boolean isIn(Relation relation, int response, int channels, List<Derived> derived) {
        double[] known = terms(relation, response, channels, derived, FIRST, SECOND);
        double[] before = terms(relation, response, channels, derived, Double.NaN, SECOND);
        double[] now = terms(relation, response, channels, derived, FIRST, Double.NaN);
        boolean found = isLost(known[0], before[0]); // the left side itself is missing in the third trial
        for (int i = 1; i < known.length; i++) {
            found |= isLost(known[i], before[i]) || isLost(known[i], now[i]);
        }
        return found;
    }

    private static boolean isLost(double known, double without) {
        return !Double.isNaN(known) && Double.isNaN(without);
    }

    /** Known terms, then regressors, at the second of two readings. */
    private static double[] terms(
            Relation relation, int response, int channels, List<Derived> derived, double first, double second) {
        List<@Nullable Expression> uncorrected = Collections.nCopies(channels, null);
        List<Expression> expressions = derived.stream().map(Derived::expression).toList();
        Preparation preparation = new Preparation(uncorrected, expressions);
        Regressor regressor = relation.compile();
        Reading reading = new Reading(channels);
        Arrays.fill(reading.values, FIRST);
        reading.values[response] = first;
        regressor.evaluate(preparation.prepare(reading));
        reading.time = 1;
        Arrays.fill(reading.values, SECOND);
        reading.values[response] = second;
        regressor.evaluate(preparation.prepare(reading));
        double[] terms = new double[regressor.regressors().length + 1];
        terms[0] = regressor.response();
        System.arraycopy(regressor.regressors(), 0, terms, 1, terms.length - 1);
        return terms;
    }
}
