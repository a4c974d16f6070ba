package org.hullsum.casefile;

import java.util.Optional;
import org.hullsum.problem.Place;

/**
 * A scalar, taken as its text, with its range in the file, so that every character of the text has
 * its own place, quotes, escapes and folded lines notwithstanding.
 *
 * @param text the text that YAML reads
 * @param style how it is written
 * @param inFlow whether it stands inside braces or brackets
 * @param start index in the file of its first character, the quote included
 * @param end index after its last character
 * @param source the file
 */
record YamlText(String text, Style style, boolean inFlow, int start, int end, SourceText source)
    implements YamlValue {
  /** How a scalar is written. */
  enum Style {
    PLAIN,
    SINGLE_QUOTED,
    DOUBLE_QUOTED,
    BLOCK
  }

  private static final int LONGEST_SHOWN = 40;

  /** What after a backslash stands for white space. */
  private static final String ESCAPED_BLANKS = " \t\r\ntnvfrLP";

  boolean plain() {
    return style == Style.PLAIN;
  }

  /** Whether there is no text at all, as after a key without a value. */
  boolean missing() {
    return plain() && (text.isEmpty() || text.equals("~") || text.equals("null"));
  }

  boolean manyLines() {
    return source.lineAt(start) != source.lineAt(Math.max(start, end - 1));
  }

  @Override
  public Place place() {
    return source.place(style == Style.PLAIN || style == Style.BLOCK ? start : start + 1);
  }

  @Override
  public String described() {
    return missing() ? "nothing" : "the text " + shown();
  }

  /** The text in back quotes, cut where it is long. */
  String shown() {
    return quoted(text);
  }

  /** A text in back quotes, on one line, cut where it is long. */
  static String quoted(String text) {
    String line = text.strip().replaceAll("\\s+", " ");
    if (line.codePointCount(0, line.length()) <= LONGEST_SHOWN) {
      return "`" + line + "`";
    }
    return "`" + line.substring(0, line.offsetByCodePoints(0, LONGEST_SHOWN - 1)) + "…`";
  }

  @Override
  public Optional<YamlText> asText() {
    return Optional.of(this);
  }

  /**
   * The place of the character at an index of the text. White space is skipped on both sides and
   * all other characters are followed one by one; where an escape hides the text behind it, the
   * place is that of the last character that could be followed.
   */
  Place place(int index) {
    int at = style == Style.PLAIN ? start : bodyStart();
    int last = at;
    for (int i = 0; i <= Math.min(index, text.length() - 1); i++) {
      if (Character.isWhitespace(text.charAt(i))) {
        continue;
      }
      at = skipBlanks(at);
      if (at >= end) {
        return source.place(last);
      }
      last = at;
      at = after(at);
    }
    return source.place(index >= text.length() ? Math.min(at, end) : last);
  }

  private int bodyStart() {
    if (style != Style.BLOCK) {
      return start + 1;
    }
    int lineEnd = source.text().indexOf('\n', start);
    return lineEnd < 0 ? start : lineEnd + 1;
  }

  private int skipBlanks(int from) {
    int at = from;
    while (at < end && isBlank(at)) {
      at += escapesBlank(at) ? 2 : 1;
    }
    return at;
  }

  private boolean isBlank(int at) {
    return Character.isWhitespace(source.text().charAt(at)) || escapesBlank(at);
  }

  /** An escaped line end, which joins two lines of a double-quoted text, or an escaped blank. */
  private boolean escapesBlank(int at) {
    return style == Style.DOUBLE_QUOTED
        && source.text().charAt(at) == '\\'
        && at + 1 < end
        && ESCAPED_BLANKS.indexOf(source.text().charAt(at + 1)) >= 0;
  }

  /** The index after the character of the text that is written at an index of the file. */
  private int after(int at) {
    char c = source.text().charAt(at);
    if (style == Style.SINGLE_QUOTED && c == '\'') {
      return at + 2;
    }
    if (style == Style.DOUBLE_QUOTED && c == '\\' && at + 1 < end) {
      return switch (source.text().charAt(at + 1)) {
        case 'x' -> at + 4;
        case 'u' -> at + 6;
        case 'U' -> at + 10;
        default -> at + 2;
      };
    }
    return at + 1;
  }
}
