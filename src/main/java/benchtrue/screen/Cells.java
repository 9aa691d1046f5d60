package benchtrue.screen;

import com.googlecode.lanterna.TextCharacter;
import com.googlecode.lanterna.TextColor;
import java.util.EnumMap;
import java.util.HashMap;
import java.util.Map;

/** One cell for each character and style, made once: a frame has thousands. Belongs to the thread of the screen. */
final class Cells {
    private final Map<Style, Map<Character, TextCharacter>> made = new EnumMap<>(Style.class);

    TextCharacter of(char c, Style style) {
        return made.computeIfAbsent(style, s -> new HashMap<>())
                .computeIfAbsent(
                        c,
                        k -> TextCharacter.fromCharacter(
                                k, TextColor.ANSI.DEFAULT, TextColor.ANSI.DEFAULT, style.codes())[0]);
    }
}
