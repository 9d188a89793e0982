package dev.leadline.problem;

import java.util.Collection;
import java.util.Comparator;
import java.util.Locale;
import java.util.Optional;

/// The known name a person may have meant.
public final class Nearest {

    private Nearest() {}

    /// The closest of `known` to `word`, by the number of letters inserted, dropped, replaced or swapped with a
    /// neighbour; one that differs by case alone comes first. Empty where more than a third of the letters would
    /// change: a wild guess sends people astray.
    public static Optional<String> to(String word, Collection<String> known) {
        if (word.isEmpty() || word.length() > 40) {
            return Optional.empty();
        }
        String lower = word.toLowerCase(Locale.ROOT);
        int most = Math.max(1, word.length() / 3);
        return known.stream()
                .filter(name -> !name.equals(word))
                .filter(name -> Math.abs(name.length() - word.length()) <= most)
                .filter(name -> distance(lower, name.toLowerCase(Locale.ROOT)) <= most)
                .min(Comparator.<String>comparingInt(name -> distance(lower, name.toLowerCase(Locale.ROOT)))
                        .thenComparingInt(name -> distance(word, name)));
    }

    /// Optimal string alignment: edits of single letters and swaps of neighbours.
    private static int distance(String a, String b) {
        int[][] d = new int[a.length() + 1][b.length() + 1];
        for (int i = 0; i <= a.length(); i++) {
            for (int j = 0; j <= b.length(); j++) {
                if (i == 0 || j == 0) {
                    d[i][j] = i + j;
                    continue;
                }
                boolean same = a.charAt(i - 1) == b.charAt(j - 1);
                d[i][j] = Math.min(d[i - 1][j - 1] + (same ? 0 : 1), 1 + Math.min(d[i - 1][j], d[i][j - 1]));
                if (i > 1 && j > 1 && a.charAt(i - 1) == b.charAt(j - 2) && a.charAt(i - 2) == b.charAt(j - 1)) {
                    d[i][j] = Math.min(d[i][j], d[i - 2][j - 2] + 1);
                }
            }
        }
        return d[a.length()][b.length()];
    }
}
