package benchtrue.alarm;

import benchtrue.model.Unit;
import benchtrue.sheet.Channel;

/** A 4–20 mA loop after NAMUR NE 43: valid from 3.8 to 20.5 mA, failed at or below 3.6 and at or above 21 mA. */
final class CurrentLoop {
    private static final double LOWEST_VALID = 3.8;
    private static final double HIGHEST_VALID = 20.5;
    private static final double FAILED_LOW = 3.6;
    private static final double FAILED_HIGH = 21;

    private CurrentLoop() {}

    static double milliamperes(double value, Unit unit) {
        return unit.symbol().equals("A") ? 1000 * value : value;
    }

    /** A loop that is clipped sits on the very edge: the edge is no longer valid. */
    static boolean valid(double milliamperes) {
        return milliamperes > LOWEST_VALID && milliamperes < HIGHEST_VALID;
    }

    static boolean failed(double milliamperes) {
        return milliamperes <= FAILED_LOW || milliamperes >= FAILED_HIGH;
    }

    /** What NE 43 says of the value, to stand behind it. */
    static String note(Channel channel, double value) {
        if (!channel.currentLoop()) {
            return "";
        }
        return failed(milliamperes(value, channel.unit()))
                ? " (NE 43: failed, a break or a short circuit)"
                : " (NE 43: at the end of 3.8 to 20.5 mA)";
    }
}
