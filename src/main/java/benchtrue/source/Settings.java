package benchtrue.source;

import benchtrue.sheet.Course;
import benchtrue.sheet.Rehearsal;
import java.util.List;

/** The channels of the simulated rig that follow a course. To be asked for each reading once, in order. */
final class Settings {
    private final List<Rehearsal.Instrument> instruments;
    private final double interval;
    private final double[] lagged;
    private boolean begun;

    Settings(Rehearsal rehearsal) {
        instruments = rehearsal.channels();
        interval = 1 / rehearsal.ratePerSecond();
        lagged = new double[instruments.size()];
    }

    /** @param values written where a channel has a course, else left as they are */
    void next(double seconds, double[] values) {
        set(seconds, values, false);
        set(seconds, values, true);
        begun = true;
    }

    /** Channels that follow others come after all others. */
    private void set(double seconds, double[] values, boolean following) {
        for (int channel = 0; channel < values.length; channel++) {
            Course course = instruments.get(channel).course();
            if (course != null && course instanceof Course.Following == following) {
                values[channel] = lag(channel, Courses.at(course, seconds, values));
            }
        }
    }

    /** Of the first order, settled at the start. */
    private double lag(int channel, double wanted) {
        double constant = instruments.get(channel).lagSeconds();
        double pace = constant > 0 && begun ? -StrictMath.expm1(-interval / constant) : 1;
        lagged[channel] += pace * (wanted - lagged[channel]);
        return lagged[channel];
    }
}
