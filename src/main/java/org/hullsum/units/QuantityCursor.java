package org.hullsum.units;

import org.hullsum.problem.ProblemKind;
import org.hullsum.problem.TextFault;

/** A place in the text of a quantity or of a measured quantity. */
final class QuantityCursor {
  private final String text;
  private int position;

  QuantityCursor(String text) {
    this.text = text;
  }

  String text() {
    return text;
  }

  int position() {
    return position;
  }

  char peek() {
    return position < text.length() ? text.charAt(position) : UnitCursor.END;
  }

  void skipBlanks() {
    while (position < text.length() && isBlank(text.charAt(position))) {
      position++;
    }
  }

  private static boolean isBlank(char c) {
    return c == ' ' || c == '\t' || c == '\u00a0' || c == '\u2009' || c == '\u202f';
  }

  /** Whether only blanks are left. */
  boolean atEnd() {
    for (int i = position; i < text.length(); i++) {
      if (!isBlank(text.charAt(i))) {
        return false;
      }
    }
    return true;
  }

  /** Whether the text ends here. */
  boolean isDone() {
    return position >= text.length();
  }

  /** Takes signs if they stand here. */
  boolean skip(String signs) {
    if (text.startsWith(signs, position)) {
      position += signs.length();
      return true;
    }
    return false;
  }

  /** Takes a word if it stands here whole. */
  boolean skipWord(String word) {
    return atWord(word) && skip(word);
  }

  private boolean atWord(String word) {
    int end = position + word.length();
    return text.startsWith(word, position)
        && (end >= text.length() || !Character.isLetterOrDigit(text.charAt(end)));
  }

  double number() throws TextFault {
    NumberReader.Parsed number = NumberReader.read(text, position);
    position = number.end();
    return number.value();
  }

  /** Whether a unit stands after the number that was just read. */
  boolean unitFollows() {
    int here = position;
    skipBlanks();
    boolean follows =
        !isDone()
            && !startsUncertainty(position)
            && peek() != '('
            && !atWord("of")
            && !atWord("absolute");
    position = here;
    return follows;
  }

  /**
   * Reads the blank after a number and the unit behind it.
   *
   * @param rule which units the case takes here
   */
  Noted<Unit> unit(UnitRule rule) throws TextFault {
    int afterNumber = position;
    skipBlanks();
    int start = position;
    int end = start;
    while (end < text.length() && !isBlank(text.charAt(end)) && !startsUncertainty(end)) {
      end++;
    }
    String code = text.substring(start, end);
    Noted<Unit> unit;
    try {
      unit = UnitParser.parseWithNotes(code);
    } catch (TextFault inUnit) {
      throw inUnit.shifted(start);
    }
    if (!rule.allows(unit.value())) {
      throw new TextFault(
          ProblemKind.UNIT,
          start,
          end,
          "the case says 'units: none', so the only units are deg and rad on angles; found '"
              + code
              + "'");
    }
    if (start == afterNumber) {
      int numberStart = afterNumber;
      while (numberStart > 0 && !isBlank(text.charAt(numberStart - 1))) {
        numberStart--;
      }
      throw new TextFault(
          ProblemKind.UNIT,
          numberStart,
          end,
          "a blank is missing between number and unit; write '"
              + text.substring(numberStart, afterNumber)
              + " "
              + code
              + "'");
    }
    position = end;
    return unit;
  }

  private boolean startsUncertainty(int index) {
    return text.startsWith("±", index) || text.startsWith("+/-", index);
  }

  /** The fault of text that is left over. */
  TextFault trailing() {
    skipBlanks();
    boolean uncertain = startsUncertainty(position) || peek() == '(';
    return new TextFault(
        uncertain ? ProblemKind.UNCERTAINTY : ProblemKind.UNIT,
        position,
        text.length(),
        uncertain
            ? "an uncertainty is not expected here; expected a quantity such as 12.5 m3/h"
            : "'"
                + text.substring(position)
                + "' is left over after the unit; a unit holds no blanks (write m3/h)");
  }
}
