package benchtrue.sheet;

import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.regex.Pattern;

/**
 * Which queries may be sent to an instrument (IEEE 488.2 and SCPI-1999): one in a message, and none that makes the instrument do
 * more than measure. Commands are never sent: one can energise an output.
 */
final class ScpiQuery {
    /** A common query as {@code *IDN?}, or a path of mnemonics; then parameters. */
    private static final Pattern QUERY =
            Pattern.compile("(\\*[A-Za-z]+|:?[A-Za-z][A-Za-z0-9_]*(:[A-Za-z][A-Za-z0-9_]*)*)\\?( .*)?");

    private static final Pattern PRINTABLE = Pattern.compile("[ -~]*");

    /** Long forms of what acts: calibration, self-tests and diagnostics may switch outputs and take minutes. */
    private static final List<String> ACTING = List.of("CALIBRATION", "TEST", "TST", "DIAGNOSTIC");

    private static final int SHORT_FORM = 3;

    private ScpiQuery() {}

    /** What stands at a key; a mistake where it may not be sent. */
    static String read(Keys keys, String key) {
        String query = keys.needed(key, "\"READ?\", as the instrument's manual has it");
        if (query.isEmpty()) {
            return query;
        }
        if (!PRINTABLE.matcher(query).matches()) {
            keys.mistake(key, "a query has only printable ASCII characters", "leave the line end to terminator");
        } else if (query.contains(";")) {
            keys.mistake(key, "a message may hold one query only, so no \";\"", "give each channel its own query");
        } else if (!QUERY.matcher(query).matches()) {
            keys.mistake(
                    key,
                    "\"" + query + "\" is no query, and nothing else is sent",
                    "end its header in \"?\", and set the instrument up by hand");
        } else if (nodes(query).stream().anyMatch(ScpiQuery::acts)) {
            keys.mistake(
                    key,
                    "\"" + query + "\" makes the instrument calibrate or test itself, which is never asked for here",
                    "ask for a measured value, as READ? does");
        } else if (nodes(query).stream().anyMatch(node -> isShort(node, "MEASURE", 4))) {
            keys.sheet()
                    .notice(
                            keys.place(key),
                            "\"" + query + "\" sets the instrument up anew each time it is asked",
                            "set it up by hand and ask with READ? or FETC? where it has them");
        }
        return query;
    }

    private static List<String> nodes(String query) {
        String header = query.substring(0, query.indexOf('?')).toUpperCase(Locale.ROOT);
        return Arrays.stream(header.split("[:*]"))
                .map(node -> node.replaceAll("\\d+$", ""))
                .toList();
    }

    private static boolean acts(String node) {
        return ACTING.stream().anyMatch(word -> isShort(node, word, SHORT_FORM));
    }

    /** Whether a mnemonic is the word or its beginning. */
    private static boolean isShort(String node, String word, int least) {
        return node.length() >= least && word.startsWith(node);
    }
}
