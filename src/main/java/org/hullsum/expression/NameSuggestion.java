package org.hullsum.expression;

import java.util.Collection;
import java.util.Locale;
import java.util.Optional;

/**
 * The nearest known name to one that is not known: by the number of letters to insert, leave out,
 * replace or swap with their neighbour (optimal string alignment).
 */
final class NameSuggestion {
  /** Names longer than this are compared by their beginnings only. */
  private static final int LONGEST = 60;

  private NameSuggestion() {}

  /** The nearest of the known names, where one is near enough to be meant. */
  static Optional<String> nearest(String name, Collection<String> known) {
    int allowed = name.length() <= 2 ? 0 : name.length() <= 4 ? 1 : 2;
    String best = null;
    int least = allowed + 1;
    for (String candidate : known) {
      if (Math.abs(candidate.length() - name.length()) > allowed) {
        continue;
      }
      int distance =
          candidate.equalsIgnoreCase(name)
              ? 0
              : distance(name.toLowerCase(Locale.ROOT), candidate.toLowerCase(Locale.ROOT));
      if (distance < least) {
        least = distance;
        best = candidate;
      }
    }
    return Optional.ofNullable(best);
  }

  private static int distance(String first, String second) {
    String a = first.substring(0, Math.min(LONGEST, first.length()));
    String b = second.substring(0, Math.min(LONGEST, second.length()));
    int[][] cost = new int[a.length() + 1][b.length() + 1];
    for (int i = 0; i <= a.length(); i++) {
      for (int j = 0; j <= b.length(); j++) {
        if (i == 0 || j == 0) {
          cost[i][j] = i + j;
          continue;
        }
        boolean same = a.charAt(i - 1) == b.charAt(j - 1);
        int best = Math.min(cost[i - 1][j], cost[i][j - 1]) + 1;
        best = Math.min(best, cost[i - 1][j - 1] + (same ? 0 : 1));
        if (i > 1
            && j > 1
            && a.charAt(i - 1) == b.charAt(j - 2)
            && a.charAt(i - 2) == b.charAt(j - 1)) {
          best = Math.min(best, cost[i - 2][j - 2] + 1);
        }
        cost[i][j] = best;
      }
    }
    return cost[a.length()][b.length()];
  }
}
