package benchtrue.model;

import java.util.Collection;
import java.util.Locale;
import org.jspecify.annotations.Nullable;

/** The known name that a misspelt one is closest to. */
final class Nearest {
    private Nearest() {}

    /** The same letters in another case, else one or, of five characters and more, two slips away; null where none is close. */
    static @Nullable String to(String name, Collection<String> known) {
        int best = name.length() > 4 ? 2 : 1;
        String nearest = null;
        for (String candidate : known) {
            int distance = candidate.equalsIgnoreCase(name) ? 0 : distance(name, candidate);
            boolean sharesALetter = distance < Math.max(name.length(), candidate.length());
            if (sharesALetter && (distance < best || (distance == best && nearest == null))) {
                best = distance;
                nearest = candidate;
            }
        }
        return nearest;
    }

    /** Insertions, deletions, replacements and swaps of neighbours (Damerau 1964), regardless of case. */
    static int distance(String first, String second) {
        String a = first.toLowerCase(Locale.ROOT);
        String b = second.toLowerCase(Locale.ROOT);
        if (Math.abs(a.length() - b.length()) > 2) {
            return 3;
        }
        int[][] slips = new int[a.length() + 1][b.length() + 1];
        for (int i = 0; i <= a.length(); i++) {
            for (int j = 0; j <= b.length(); j++) {
                slips[i][j] = i == 0 ? j : j == 0 ? i : step(slips, a, b, i, j);
            }
        }
        return slips[a.length()][b.length()];
    }

    private static int step(int[][] slips, String a, String b, int i, int j) {
        int replaced = slips[i - 1][j - 1] + (a.charAt(i - 1) == b.charAt(j - 1) ? 0 : 1);
        int least = Math.min(replaced, 1 + Math.min(slips[i - 1][j], slips[i][j - 1]));
        boolean swapped = i > 1 && j > 1 && a.charAt(i - 1) == b.charAt(j - 2) && a.charAt(i - 2) == b.charAt(j - 1);
        return swapped ? Math.min(least, slips[i - 2][j - 2] + 1) : least;
    }
}
