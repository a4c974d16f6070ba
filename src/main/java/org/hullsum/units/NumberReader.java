package org.hullsum.units;

import org.hullsum.problem.ProblemKind;
import org.hullsum.problem.TextFault;

/**
 * Reads a number at a place in a text: an optional sign, digits, an optional decimal point with
 * digits on both sides, an optional exponent. Nothing else is a number: no separators, no
 * hexadecimal, no infinity.
 */
final class NumberReader {
  private static final int MAX_LENGTH = 400;

  private final String text;
  private int position;

  private NumberReader(String text, int start) {
    this.text = text;
    this.position = start;
  }

  /**
   * A number and where it ends.
   *
   * @param value finite
   * @param end index after its last character
   */
  record Parsed(double value, int end) {}

  static Parsed read(String text, int start) throws TextFault {
    return new NumberReader(text, start).read();
  }

  private Parsed read() throws TextFault {
    int start = position;
    boolean negative = peek() == '-' || peek() == '−';
    if (negative || peek() == '+') {
      position++;
    }
    int first = position;
    if (!digits()) {
      throw noNumber(start, first);
    }
    boolean hasZeroOnly = onlyZeros(first, position);
    if (peek() == '.') {
      int point = position;
      position++;
      int fraction = position;
      if (!digits()) {
        throw fault(
            start,
            position,
            "digits are missing after the decimal point; write "
                + text.substring(start, point)
                + ".0");
      }
      hasZeroOnly &= onlyZeros(fraction, position);
    }
    exponent(start);
    refuseForeign(start);
    if (position - start > MAX_LENGTH) {
      throw fault(start, position, "a number of more than " + MAX_LENGTH + " characters");
    }
    double value = Double.parseDouble(text.substring(first, position));
    if (Double.isInfinite(value)) {
      throw fault(start, position, "this number is too large to be held (above 1.7e308)");
    }
    if (value == 0 && !hasZeroOnly) {
      throw fault(start, position, "this number is too small to be told from zero");
    }
    return new Parsed(negative ? -value : value, position);
  }

  /** Takes digits; true if there was at least one. */
  private boolean digits() {
    int first = position;
    while (UnitCursor.isDigit(peek())) {
      position++;
    }
    return position > first;
  }

  private TextFault noNumber(int start, int first) {
    int end = first;
    while (end < text.length() && !Character.isWhitespace(text.charAt(end))) {
      end++;
    }
    String found = text.substring(start, end);
    if (found.isEmpty()) {
      return fault(start, start, "a number is missing");
    }
    if (at(first) == '.') {
      return fault(
          start, end, "'" + found + "': write a digit before the decimal point, as in 0.5");
    }
    return fault(
        start, end, "'" + found + "' is not a number; expected digits such as 4.0 or -3e-2");
  }

  private void exponent(int start) throws TextFault {
    if (peek() != 'e' && peek() != 'E') {
      return;
    }
    int mark = position;
    position++;
    if (peek() == '-' || peek() == '+') {
      position++;
    }
    if (!digits()) {
      throw fault(start, position, "digits are missing after '" + text.charAt(mark) + "'");
    }
  }

  /** What follows at once may show that another notation was meant. */
  private void refuseForeign(int start) throws TextFault {
    char next = peek();
    if (next == ',' && UnitCursor.isDigit(at(position + 1))) {
      throw fault(
          start,
          position + 1,
          "a comma in a number; write a decimal point (1.5), and nothing between thousands");
    }
    if (next == '_' || next == '\'') {
      throw fault(start, position + 1, "nothing may separate the digits of a number");
    }
    if (next == '.') {
      throw fault(start, position + 1, "a second decimal point in a number");
    }
    boolean zero = position == start + 1 && at(start) == '0';
    if (zero && (next == 'x' || next == 'X' || next == 'b' || next == 'o')) {
      throw fault(start, position + 1, "numbers are decimal; expected digits such as 16");
    }
  }

  private boolean onlyZeros(int from, int to) {
    for (int i = from; i < to; i++) {
      if (text.charAt(i) != '0') {
        return false;
      }
    }
    return true;
  }

  private char peek() {
    return at(position);
  }

  private char at(int index) {
    return index >= 0 && index < text.length() ? text.charAt(index) : UnitCursor.END;
  }

  private static TextFault fault(int start, int end, String message) {
    return new TextFault(ProblemKind.WRONG_VALUE, start, end, message);
  }
}
