package benchtrue.source;

import benchtrue.sheet.Course;
import java.util.Arrays;

/** Values of courses at a time. */
final class Courses {
    private Courses() {}

    /**
     * @param seconds of the run; may be negative
     * @param channels true values of the channels at that time, for a course that follows one
     */
    static double at(Course course, double seconds, double[] channels) {
        if (course instanceof Course.Constant constant) {
            return constant.value();
        }
        if (course instanceof Course.Steps steps) {
            return steps.values()[Math.max(0, last(steps.times(), seconds))];
        }
        if (course instanceof Course.Ramps ramps) {
            return ramp(ramps, seconds);
        }
        if (course instanceof Course.Stairs stairs) {
            long dwell = (long) Math.floor(seconds / stairs.dwellSeconds() + 1e-9);
            return stairs.values()[Math.floorMod(dwell, stairs.values().length)];
        }
        if (course instanceof Course.Sine sine) {
            return sine.mean() + sine.amplitude() * StrictMath.sin(2 * Math.PI * (seconds / sine.periodSeconds()));
        }
        if (course instanceof Course.Triangle triangle) {
            double turn = seconds / triangle.periodSeconds();
            double phase = turn - Math.floor(turn);
            return triangle.low() + (triangle.high() - triangle.low()) * (1 - Math.abs(1 - 2 * phase));
        }
        Course.Following following = (Course.Following) course;
        return following.offset() + following.gain() * channels[following.channel()];
    }

    /** Index of the last time that is not after this one; −1 where all are. */
    private static int last(double[] times, double seconds) {
        int found = Arrays.binarySearch(times, seconds + 1e-9);
        return found >= 0 ? found : -found - 2;
    }

    private static double ramp(Course.Ramps ramps, double seconds) {
        double[] times = ramps.times();
        double[] values = ramps.values();
        int before = last(times, seconds);
        if (before < 0 || before == times.length - 1) {
            return values[Math.max(0, before)];
        }
        double part = (seconds - times[before]) / (times[before + 1] - times[before]);
        return values[before] + part * (values[before + 1] - values[before]);
    }
}
