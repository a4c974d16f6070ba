package org.hullsum.expression;

/** Pictures of a place in a text: the line, and below it carets under the characters meant. */
public final class Carets {
  private static final int MOST_COLUMNS = 76;

  /** Columns kept before the first caret where a long line is cut. */
  private static final int COLUMNS_BEFORE = 30;

  private static final String CUT = "…";

  private Carets() {}

  /**
   * Two lines joined by a line feed: the line of {@code text} that holds {@code start}, cut to at
   * most 76 columns, and carets from {@code start} to before {@code end} (one where they are
   * equal).
   *
   * @throws IndexOutOfBoundsException unless 0 ≤ start ≤ end ≤ length
   */
  public static String render(String text, int start, int end) {
    java.util.Objects.checkFromToIndex(start, end, text.length());
    int lineStart = text.lastIndexOf('\n', start - 1) + 1;
    int feed = text.indexOf('\n', start);
    int lineEnd = feed < 0 ? text.length() : feed;
    int from =
        lineEnd - lineStart <= MOST_COLUMNS
            ? lineStart
            : Math.max(lineStart, start - COLUMNS_BEFORE);
    int to = Math.min(lineEnd, from + MOST_COLUMNS);
    int lastMarked = Math.max(start + 1, Math.min(end, to));
    String before = (from > lineStart ? CUT : "") + text.substring(from, start);
    String line = before + text.substring(start, to) + (to < lineEnd ? CUT : "");
    String marked = text.substring(start, Math.min(lastMarked, lineEnd));
    return printable(line)
        + "\n"
        + " ".repeat(columns(before))
        + "^".repeat(Math.max(1, columns(marked)));
  }

  private static int columns(String text) {
    return text.codePointCount(0, text.length());
  }

  private static String printable(String line) {
    return line.replaceAll("\\p{Cntrl}", " ").stripTrailing();
  }
}
