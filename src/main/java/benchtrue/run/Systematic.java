package benchtrue.run;

import benchtrue.estimate.InputNoise;
import benchtrue.reading.Reading;
import benchtrue.sheet.BenchSheet;
import benchtrue.sheet.Channel;
import java.util.ArrayList;
import java.util.List;
import java.util.function.ToDoubleFunction;

/**
 * What an error that stays the same through the run does to the rows: each channel with declared other uncertainty is moved by
 * one standard uncertainty, and the rows are made again. To first order the estimates move by the least-squares fit of
 * (y′ − φ′ᵀθ) − (y − φᵀθ) on φ, however the channel enters the equation (GUM 5.1.4: numerical sensitivity).
 */
final class Systematic {
    private final List<String> names = new ArrayList<>();
    private final List<Integer> channels = new ArrayList<>();
    private final List<Double> shifts = new ArrayList<>();
    private final List<Rows> moved = new ArrayList<>();
    private final List<Boolean> felt = new ArrayList<>();
    private final Reading scratch;

    Systematic(BenchSheet sheet) {
        this(sheet, Channel::otherUncertainty);
    }

    private Systematic(BenchSheet sheet, ToDoubleFunction<Channel> error) {
        scratch = new Reading(sheet.channels().size());
        for (int i = 0; i < sheet.channels().size(); i++) {
            Channel channel = sheet.channels().get(i);
            double shift = error.applyAsDouble(channel);
            if (shift > 0) {
                names.add(channel.name());
                channels.add(i);
                shifts.add(shift);
                moved.add(new Rows(sheet));
                felt.add(false);
            }
        }
    }

    /** The same with the declared noise of one reading, the rounding of its indication included. */
    static Systematic ofNoise(BenchSheet sheet) {
        return new Systematic(sheet, Systematic::noise);
    }

    /** The same channels with rows of their own, for another pass over the run. */
    Systematic again(BenchSheet sheet) {
        Systematic again = ofNoise(sheet);
        names.forEach(again::felt);
        again.dropUnfelt();
        return again;
    }

    private void felt(String name) {
        felt(names.indexOf(name));
    }

    private static double noise(Channel channel) {
        double sd = Double.isNaN(channel.noise()) ? 0 : channel.noise();
        return sd > 0 ? InputNoise.standard(sd, Double.isNaN(channel.resolution()) ? 0 : channel.resolution()) : 0;
    }

    int size() {
        return names.size();
    }

    List<String> names() {
        return List.copyOf(names);
    }

    void fill(Reading reading) {
        for (int c = 0; c < size(); c++) {
            scratch.number = reading.number;
            scratch.time = reading.time;
            System.arraycopy(reading.values, 0, scratch.values, 0, scratch.values.length);
            scratch.values[channels.get(c)] += shifts.get(c);
            moved.get(c).fill(scratch);
        }
    }

    /** The channel moves a regressor. */
    void felt(int c) {
        felt.set(c, true);
    }

    /** Leaves out the channels of which no effect has been felt, as those that stand in responses only. */
    void dropUnfelt() {
        for (int c = size() - 1; c >= 0; c--) {
            if (!felt.get(c)) {
                names.remove(c);
                channels.remove(c);
                shifts.remove(c);
                moved.remove(c);
                felt.remove(c);
            }
        }
    }

    /** The row of the reading last filled in, with the channel moved. */
    Row row(int c, int group, int relation) {
        return moved.get(c).row(group, relation);
    }

    /** How far the residual of a row moves with the channel, at these estimates; NaN where a side is missing. */
    double shift(int c, int group, int relation, Row row, double[] estimates) {
        Row other = moved.get(c).row(group, relation);
        return other.present ? other.residual(estimates) - row.residual(estimates) : Double.NaN;
    }
}
