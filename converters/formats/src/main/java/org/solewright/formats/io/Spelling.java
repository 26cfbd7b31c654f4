package org.solewright.formats.io;

import java.util.Collection;
import java.util.Locale;
import java.util.Optional;

/** Finds the word that was probably meant. */
public final class Spelling {

    private static final int LONGEST = 64;

    private Spelling() {}

    /**
     * The known word closest to what was written, by the number of letters inserted, dropped, changed or swapped with
     * their neighbour, whatever the case [Damerau 1964].
     *
     * @param written what was found
     * @param known what would have been right
     * @return the closest, the first of several; empty where none lies within a third of the longer
     *     word's letters
     */
    public static Optional<String> nearest(String written, Collection<String> known) {
        String word = written.toLowerCase(Locale.ROOT);
        int best = LONGEST;
        Optional<String> nearest = Optional.empty();
        for (String candidate : known) {
            int longer = Math.max(word.length(), candidate.length());
            if (longer > LONGEST) {
                continue;
            }
            int distance = distance(word, candidate.toLowerCase(Locale.ROOT));
            if (distance < best && distance <= Math.max(1, longer / 3)) {
                best = distance;
                nearest = Optional.of(candidate);
            }
        }
        return nearest;
    }

    /**
     * The question to be put to the user.
     *
     * @param written what was found
     * @param known what would have been right
     * @return {@code did you mean 'X'?}, or the known words where none is close
     */
    public static String hint(String written, Collection<String> known) {
        return nearest(written, known)
                .map(word -> "did you mean '" + word + "'?")
                .orElseGet(() -> "use one of " + String.join(", ", known));
    }

    private static int distance(String a, String b) {
        int[][] d = new int[a.length() + 1][b.length() + 1];
        for (int i = 0; i <= a.length(); i++) {
            for (int j = 0; j <= b.length(); j++) {
                d[i][j] = i == 0 || j == 0 ? i + j : step(d, a, b, i, j);
            }
        }
        return d[a.length()][b.length()];
    }

    private static int step(int[][] d, String a, String b, int i, int j) {
        int change = a.charAt(i - 1) == b.charAt(j - 1) ? 0 : 1;
        int least = Math.min(d[i - 1][j - 1] + change, Math.min(d[i - 1][j], d[i][j - 1]) + 1);
        boolean swapped = i > 1 && j > 1 && a.charAt(i - 1) == b.charAt(j - 2) && a.charAt(i - 2) == b.charAt(j - 1);
        return swapped ? Math.min(least, d[i - 2][j - 2] + 1) : least;
    }
}
