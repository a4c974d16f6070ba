package org.hullsum.report;

import java.util.Locale;

/** Small matters of wording that reports share. */
final class Words {
  private static final char REPLACEMENT = '\uFFFD';

  private Words() {}

  /** The text with every control character replaced, so that no terminal obeys one. */
  static String printable(String text) {
    StringBuilder out = new StringBuilder(text.length());
    text.codePoints()
        .forEach(c -> out.appendCodePoint(Character.isISOControl(c) ? REPLACEMENT : c));
    return out.toString();
  }

  /** Such as {@code 1 error}, {@code 3 errors}. */
  static String count(long number, String noun) {
    return number + " " + noun + (number == 1 ? "" : "s");
  }

  /** The word with a capital letter. */
  static String capital(String word) {
    return word.substring(0, 1).toUpperCase(Locale.ROOT) + word.substring(1);
  }
}
