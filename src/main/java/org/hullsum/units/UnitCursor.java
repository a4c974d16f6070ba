package org.hullsum.units;

import org.hullsum.problem.ProblemKind;
import org.hullsum.problem.TextFault;

/** A place in the text of a unit, and the signs that can stand there. */
final class UnitCursor {
  /** Stands for the end of the text. */
  static final char END = '\0';

  private static final String SUPERSCRIPTS = "⁰¹²³⁴⁵⁶⁷⁸⁹";
  private static final String SIGNS_OF_SYMBOLS = "%‰°℃℉_'\"";
  private static final int MAX_EXPONENT_DIGITS = 4;

  private final String text;
  private int position;

  UnitCursor(String text, int start) {
    this.text = text;
    this.position = start;
  }

  int position() {
    return position;
  }

  void moveTo(int place) {
    position = place;
  }

  void advance() {
    position++;
  }

  boolean atEnd() {
    return position >= text.length();
  }

  char peek() {
    return charAt(position);
  }

  private char charAt(int index) {
    return index < text.length() ? text.charAt(index) : END;
  }

  boolean skip(char wanted) {
    if (peek() == wanted && !atEnd()) {
      position++;
      return true;
    }
    return false;
  }

  static boolean isDigit(char c) {
    return c >= '0' && c <= '9';
  }

  private static boolean isSign(char c) {
    return c == '-' || c == '+' || c == '−';
  }

  /** Whether a product or quotient goes on here; {@code *} only where the text is all unit. */
  boolean atOperator(boolean embedded) {
    return switch (peek()) {
      case '.', '/', '·', '⋅' -> true;
      case '*' -> !embedded;
      default -> false;
    };
  }

  /** Takes the operator; true for a division. */
  boolean takeOperator() {
    boolean divide = peek() == '/';
    position++;
    return divide;
  }

  /** Whether {@code 10*} or {@code 10^} is meant, its sign standing at {@code index}. */
  boolean atPowerOfTen(int index) {
    char after = charAt(index + 1);
    return switch (charAt(index)) {
      case '^' -> true;
      case '*' -> !Character.isLetter(after) && after != '[' && after != '(' && after != '%';
      default -> false;
    };
  }

  /** Whether a caret with an exponent stands here. */
  boolean atRaised() {
    char next = charAt(position + 1);
    return peek() == '^' && (isDigit(next) || isSign(next) && isDigit(charAt(position + 2)));
  }

  boolean takeCaret() {
    position++;
    return true;
  }

  boolean atSuperscript() {
    char next = peek();
    return SUPERSCRIPTS.indexOf(next) >= 0
        || next == '⁻' && SUPERSCRIPTS.indexOf(charAt(position + 1)) >= 0;
  }

  boolean atExponent() {
    char next = peek();
    return isDigit(next) || isSign(next) && isDigit(charAt(position + 1)) || atSuperscript();
  }

  /** Whether a decimal point follows the digit before; a product with {@code 10*n} has none. */
  boolean atDecimalPoint() {
    return position > 0
        && isDigit(charAt(position - 1))
        && peek() == '.'
        && isDigit(charAt(position + 1))
        && !(text.startsWith("10", position + 1) && atPowerOfTen(position + 3));
  }

  /** Reads a whole exponent, plain or superscript; {@link #atExponent} must hold. */
  int exponent(int largest) throws TextFault {
    int start = position;
    boolean superscript = atSuperscript();
    boolean negative = peek() == '-' || peek() == '−' || peek() == '⁻';
    if (negative || peek() == '+') {
      position++;
    }
    int first = position;
    int value = 0;
    int digit = digit(superscript);
    while (digit >= 0 && position - first < MAX_EXPONENT_DIGITS) {
      value = value * 10 + digit;
      position++;
      digit = digit(superscript);
    }
    if (position == first || value > largest || digit >= 0) {
      throw new TextFault(
          ProblemKind.UNIT,
          start,
          position,
          "expected a whole exponent between -" + largest + " and " + largest);
    }
    return negative ? -value : value;
  }

  private int digit(boolean superscript) {
    if (superscript) {
      return SUPERSCRIPTS.indexOf(peek());
    }
    return isDigit(peek()) ? peek() - '0' : -1;
  }

  /** Takes the longest run of characters that can be one symbol; empty if there is none. */
  String symbol() {
    int start = position;
    while (!atEnd()) {
      char next = peek();
      if (next == '[') {
        int close = text.indexOf(']', position);
        if (close < 0) {
          break;
        }
        position = close + 1;
      } else if (isSymbolLetter(next)) {
        position++;
      } else if (next == '2' && text.startsWith("H2O", position - 1) && position > start) {
        position += 2;
      } else {
        break;
      }
    }
    return text.substring(start, position);
  }

  private static boolean isSymbolLetter(char c) {
    boolean superscript = SUPERSCRIPTS.indexOf(c) >= 0;
    return !superscript && (Character.isLetter(c) || SIGNS_OF_SYMBOLS.indexOf(c) >= 0);
  }
}
