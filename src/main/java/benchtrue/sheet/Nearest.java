package benchtrue.sheet;

import java.util.Collection;
import java.util.Locale;
import org.jspecify.annotations.Nullable;

/** Finds what somebody probably meant. */
public final class Nearest {
    private Nearest() {}

    /** The candidate that the fewest typing slips turn into the word; null where more than a third of it would have to change. */
    public static @Nullable String to(String word, Collection<String> candidates) {
        String best = null;
        int fewest = Math.max(2, word.length() / 3) + 1;
        for (String candidate : candidates) {
            int slips = slips(word.toLowerCase(Locale.ROOT), candidate.toLowerCase(Locale.ROOT));
            if (slips < fewest && slips < Math.max(word.length(), candidate.length())) {
                fewest = slips;
                best = candidate;
            }
        }
        return best;
    }

    /** "did you mean x?" where something is near, else the list of what there is. */
    public static String remedy(String word, Collection<String> candidates) {
        String near = to(word, candidates);
        if (near != null) {
            return "did you mean " + near + "?";
        }
        return candidates.isEmpty() ? "remove it" : "known here: " + String.join(", ", candidates);
    }

    /** Fewest insertions, removals, replacements and swaps of neighbours that turn one word into the other. */
    private static int slips(String a, String b) {
        int[][] d = new int[a.length() + 1][b.length() + 1];
        for (int i = 0; i <= a.length(); i++) {
            for (int j = 0; j <= b.length(); j++) {
                d[i][j] = Math.min(i, j) == 0 ? Math.max(i, j) : cheapest(d, a, b, i, j);
            }
        }
        return d[a.length()][b.length()];
    }

    private static int cheapest(int[][] d, String a, String b, int i, int j) {
        int replaced = d[i - 1][j - 1] + (a.charAt(i - 1) == b.charAt(j - 1) ? 0 : 1);
        int best = Math.min(replaced, 1 + Math.min(d[i - 1][j], d[i][j - 1]));
        boolean swapped = i > 1 && j > 1 && a.charAt(i - 1) == b.charAt(j - 2) && a.charAt(i - 2) == b.charAt(j - 1);
        return swapped ? Math.min(best, d[i - 2][j - 2] + 1) : best;
    }
}
