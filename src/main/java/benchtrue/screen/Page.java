package benchtrue.screen;

import java.util.List;
import java.util.function.IntFunction;
import java.util.stream.Stream;

/**
 * A text over the panes.
 *
 * @param lines of the text at a width in cells
 */
record Page(String title, IntFunction<List<String>> lines) {

    /** A text whose lines are broken where they do not fit. */
    static Page of(String title, String text) {
        return new Page(
                title,
                width -> text.lines()
                        .flatMap(line -> line.length() <= width ? Stream.of(line) : Texts.wrapped(line, width).stream())
                        .toList());
    }
}
