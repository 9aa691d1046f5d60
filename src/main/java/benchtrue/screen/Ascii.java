package benchtrue.screen;

import java.util.Map;

/** Texts in ASCII, for terminals whose encoding has nothing else. */
public final class Ascii {
    private static final Map<Integer, String> TRANSCRIBED = Map.ofEntries(
            Map.entry((int) '±', "+/-"),
            Map.entry((int) '−', "-"),
            Map.entry((int) '–', "-"),
            Map.entry((int) '→', "->"),
            Map.entry((int) '×', "x"),
            Map.entry((int) '·', "*"),
            Map.entry((int) '…', "..."),
            Map.entry((int) '≥', ">="),
            Map.entry((int) '≤', "<="),
            Map.entry((int) 'Δ', "d"),
            Map.entry((int) 'ν', "nu"),
            Map.entry((int) 'λ', "lambda"),
            Map.entry((int) 'σ', "sigma"),
            Map.entry((int) 'µ', "u"),
            Map.entry((int) 'μ', "u"),
            Map.entry((int) 'Ω', "ohm"),
            Map.entry((int) '°', "deg"),
            Map.entry((int) '²', "^2"),
            Map.entry((int) '³', "^3"),
            Map.entry((int) '─', "-"),
            Map.entry((int) '│', "|"),
            Map.entry((int) '█', "#"),
            Map.entry((int) '▏', "|"),
            Map.entry((int) '▕', "|"),
            Map.entry((int) '▸', ">"),
            Map.entry((int) '↑', "Up"),
            Map.entry((int) '↓', "Down"),
            Map.entry((int) '▲', "^"),
            Map.entry((int) '▼', "v"));

    private Ascii() {}

    /** What has no counterpart becomes a question mark. */
    public static String of(String text) {
        StringBuilder plain = new StringBuilder();
        text.codePoints()
                .forEach(c -> plain.append(c < 128 ? Character.toString(c) : TRANSCRIBED.getOrDefault(c, "?")));
        return plain.toString();
    }
}
