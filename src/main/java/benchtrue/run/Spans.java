package benchtrue.run;

import java.util.Arrays;

/** A set of reading numbers that grows at its end, kept as spans: a run that leaves out little takes little space. */
final class Spans {
    private long[] bounds = new long[16];
    private int size;

    /** @param reading above all that were added */
    void add(long reading) {
        if (size > 0 && bounds[size - 1] == reading - 1) {
            bounds[size - 1] = reading;
            return;
        }
        if (size == bounds.length) {
            bounds = Arrays.copyOf(bounds, 2 * size);
        }
        bounds[size++] = reading;
        bounds[size++] = reading;
    }

    /** Takes out all from this reading on; returns how many there were. */
    long removeFrom(long reading) {
        long removed = 0;
        while (size > 0 && bounds[size - 1] >= reading) {
            long first = Math.max(bounds[size - 2], reading);
            removed += bounds[size - 1] - first + 1;
            if (first == bounds[size - 2]) {
                size -= 2;
            } else {
                bounds[size - 1] = reading - 1;
            }
        }
        return removed;
    }

    /** Answers in order: each reading asked must be at least the one asked before. */
    Cursor cursor() {
        return new Cursor();
    }

    /** Walks the spans upwards. */
    final class Cursor {
        private int at;

        boolean contains(long reading) {
            while (at < size && bounds[at + 1] < reading) {
                at += 2;
            }
            return at < size && bounds[at] <= reading;
        }
    }
}
