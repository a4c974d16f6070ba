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

  /** Takes a word if it stands here. */
  boolean skip(String word) {
    if (text.startsWith(word, position)) {
      position += word.length();
      return true;
    }
    return false;
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
        position < text.length() && !startsUncertainty(position) && !startsMeaning(position);
    position = here;
    return follows;
  }

  /**
   * Reads the blank after a number and the unit behind it.
   *
   * @param onlyAngles whether the case has no units, and so none but {@code deg} and {@code rad}
   */
  Noted<Unit> unit(boolean onlyAngles) throws TextFault {
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
    if (onlyAngles && !code.equals("deg") && !code.equals("rad")) {
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

  /** Whether a parenthesis follows that is a meaning and not the beginning of a unit. */
  private boolean startsMeaning(int index) {
    return text.charAt(index) == '(';
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
