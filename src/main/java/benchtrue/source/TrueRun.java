package benchtrue.source;

import benchtrue.model.Expression;
import benchtrue.model.Observation;
import benchtrue.model.Preparation;
import benchtrue.model.Regressor;
import benchtrue.model.Relation;
import benchtrue.reading.Reading;
import benchtrue.sheet.BenchSheet;
import benchtrue.sheet.Channel;
import benchtrue.sheet.Course;
import benchtrue.sheet.Derived;
import benchtrue.sheet.Group;
import benchtrue.sheet.Rehearsal;
import benchtrue.sheet.RelationSpec;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Objects;
import org.jspecify.annotations.Nullable;

/**
 * What is true on the simulated rig: the channels with a course follow it, the others are the responses of the relations at the
 * true unknowns. To be asked for each reading once, in order.
 */
final class TrueRun {
    /** So many readings before the first are made up, that functions such as {@code dir} know what they look back at. */
    private static final long MOST_BEFORE = 20_000;

    private final Rehearsal rehearsal;
    private final Settings settings;
    private final Reading reading;
    private final List<Response> responses = new ArrayList<>();

    /** A relation that gives a channel, with a memory of earlier readings of its own. */
    private record Response(int channel, Preparation preparation, Regressor regressor, List<Course> truth) {}

    TrueRun(BenchSheet sheet, Rehearsal rehearsal) {
        this.rehearsal = rehearsal;
        settings = new Settings(rehearsal);
        reading = new Reading(sheet.channels().size());
        for (Group group : sheet.groups()) {
            for (RelationSpec spec : group.relations()) {
                addResponse(sheet, spec.relation());
            }
        }
        lookBack();
    }

    private void addResponse(BenchSheet sheet, Relation relation) {
        List<String> names = sheet.channels().stream().map(Channel::name).toList();
        int channel = names.indexOf(relation.responseText());
        if (channel < 0 || rehearsal.channels().get(channel).course() != null) {
            return;
        }
        List<@Nullable Expression> uncorrected = Collections.nCopies(names.size(), null);
        List<Expression> derived =
                sheet.derived().stream().map(Derived::expression).toList();
        List<Course> truth = relation.unknowns().stream()
                .map(unknown -> Objects.requireNonNull(rehearsal.truth().get(unknown.name()), unknown.name()))
                .toList();
        responses.add(new Response(channel, new Preparation(uncorrected, derived), relation.compile(), truth));
    }

    /** Before the start the settings went as they go after it, turned about the first: a first rise was a rise before. */
    private void lookBack() {
        int count = (int) Math.min(MOST_BEFORE, rehearsal.readings());
        double[][] after = new double[count][reading.values.length];
        Settings preview = new Settings(rehearsal);
        for (int k = 0; k < count; k++) {
            preview.next(k / rehearsal.ratePerSecond(), after[k]);
        }
        for (int k = count - 1; k > 0; k--) {
            for (int channel = 0; channel < reading.values.length; channel++) {
                reading.values[channel] = 2 * after[0][channel] - after[k][channel];
            }
            respond(-k / rehearsal.ratePerSecond());
        }
    }

    /** True values of the channels at a time of the run, until the next call; NaN where they cannot be computed. */
    double[] next(double seconds) {
        settings.next(seconds, reading.values);
        respond(seconds);
        return reading.values;
    }

    private void respond(double seconds) {
        reading.time = seconds;
        for (Response response : responses) {
            reading.values[response.channel] = 0;
            Observation observation = response.preparation.prepare(reading);
            response.regressor.evaluate(observation);
            // At a response of 0 what is left of it are the known terms of the right side.
            double value = -response.regressor.response();
            double[] regressors = response.regressor.regressors();
            for (int i = 0; i < regressors.length; i++) {
                value += regressors[i] * Courses.at(response.truth.get(i), seconds, reading.values);
            }
            reading.values[response.channel] = value;
        }
    }
}
