package benchtrue.source;

import org.jspecify.annotations.Nullable;

/**
 * What the thread at the line hands on.
 *
 * @param line without its end; null where the line was opened, or is gone
 * @param whole whether the line is surely all of what was sent: not the first after opening, not cut for its length
 * @param why the line is gone; empty where it is there
 */
record Arrival(long utcMicros, byte @Nullable [] line, boolean whole, String why) {

    boolean isLine() {
        return line != null;
    }
}
