package org.hullsum.casefile;

import java.util.Collection;
import java.util.Locale;
import java.util.Optional;

/**
 * Finds the known name that a misspelt one probably means: by the least number of letters left out,
 * put in, changed or swapped with their neighbour (restricted Damerau–Levenshtein distance), case
 * ignored.
 */
final class Nearest {
  private static final int LONGEST = 64;

  private Nearest() {}

  /** The nearest of the known names, if it is near: at most one fault in three letters. */
  static Optional<String> to(String name, Collection<String> known) {
    if (name.length() > LONGEST) {
      return Optional.empty();
    }
    String wanted = name.toLowerCase(Locale.ROOT);
    int best = Math.max(1, (name.length() + 1) / 3) + 1;
    String found = null;
    for (String candidate : known) {
      if (Math.abs(candidate.length() - name.length()) < best) {
        int distance = distance(wanted, candidate.toLowerCase(Locale.ROOT));
        if (distance < best) {
          best = distance;
          found = candidate;
        }
      }
    }
    return Optional.ofNullable(found);
  }

  /** {@code "; did you mean `flux`?"}, or nothing. */
  static String hint(String name, Collection<String> known) {
    return to(name, known).map(n -> "; did you mean `" + n + "`?").orElse("");
  }

  static int distance(String a, String b) {
    int[] beforeLast = new int[b.length() + 1];
    int[] last = new int[b.length() + 1];
    int[] row = new int[b.length() + 1];
    for (int j = 0; j <= b.length(); j++) {
      last[j] = j;
    }
    for (int i = 1; i <= a.length(); i++) {
      row[0] = i;
      for (int j = 1; j <= b.length(); j++) {
        int change = a.charAt(i - 1) == b.charAt(j - 1) ? 0 : 1;
        row[j] = Math.min(Math.min(row[j - 1] + 1, last[j] + 1), last[j - 1] + change);
        if (i > 1
            && j > 1
            && a.charAt(i - 1) == b.charAt(j - 2)
            && a.charAt(i - 2) == b.charAt(j - 1)) {
          row[j] = Math.min(row[j], beforeLast[j - 2] + 1);
        }
      }
      int[] free = beforeLast;
      beforeLast = last;
      last = row;
      row = free;
    }
    return last[b.length()];
  }
}
