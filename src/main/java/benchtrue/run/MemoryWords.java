package benchtrue.run;

import benchtrue.model.Memory;

/** A memory as a sheet writes it. */
public final class MemoryWords {
    private MemoryWords() {}

    public static String of(Memory memory) {
        if (memory instanceof Memory.Readings readings) {
            return plain(readings.count()) + " readings";
        }
        return memory instanceof Memory.Seconds time ? plain(time.seconds()) + " s" : "all";
    }

    private static String plain(double value) {
        return value == Math.rint(value) && value < 1e15 ? Long.toString((long) value) : Double.toString(value);
    }
}
