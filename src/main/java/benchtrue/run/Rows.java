package benchtrue.run;

import benchtrue.model.Observation;
import benchtrue.model.Preparation;
import benchtrue.model.Regressor;
import benchtrue.reading.Reading;
import benchtrue.sheet.BenchSheet;
import benchtrue.sheet.Channel;
import benchtrue.sheet.Derived;
import benchtrue.sheet.Group;
import benchtrue.sheet.RelationSpec;
import java.util.List;

/**
 * Turns readings into the rows of all relations. Holds what {@code prev}, {@code rate} and {@code dir} remember: one for each
 * pass over a run, filled once for each reading in order.
 */
final class Rows {
    private final Preparation preparation;
    private final Regressor[][] regressors;
    private final int[][][] places;
    private final Row[][] rows;
    private Observation observation;

    Rows(BenchSheet sheet) {
        preparation = new Preparation(
                sheet.channels().stream().map(Channel::correction).toList(),
                sheet.derived().stream().map(Derived::expression).toList());
        observation = new Observation(sheet.channels().size() + sheet.derived().size());
        List<Group> groups = sheet.groups();
        regressors = new Regressor[groups.size()][];
        places = new int[groups.size()][][];
        rows = new Row[groups.size()][];
        for (int g = 0; g < regressors.length; g++) {
            Group group = groups.get(g);
            List<RelationSpec> specs = group.relations();
            regressors[g] = specs.stream().map(s -> s.relation().compile()).toArray(Regressor[]::new);
            places[g] = specs.stream().map(RelationSpec::unknownIndex).toArray(int[][]::new);
            rows[g] = specs.stream().map(s -> new Row(group.unknowns().size())).toArray(Row[]::new);
        }
    }

    void fill(Reading reading) {
        observation = preparation.prepare(reading);
        for (int g = 0; g < rows.length; g++) {
            for (int k = 0; k < rows[g].length; k++) {
                fill(rows[g][k], regressors[g][k], places[g][k]);
            }
        }
    }

    private void fill(Row row, Regressor regressor, int[] place) {
        row.present = regressor.evaluate(observation);
        row.response = regressor.response();
        row.weight = regressor.weight();
        double[] own = regressor.regressors();
        for (int i = 0; i < own.length; i++) {
            row.phi[place[i]] = own[i];
        }
    }

    Row row(int group, int relation) {
        return rows[group][relation];
    }

    /** All of one group, in its order. */
    Row[] of(int group) {
        return rows[group];
    }

    /** Corrected channels, then derived ones, of the reading last filled in; used again for the next. */
    Observation observation() {
        return observation;
    }
}
