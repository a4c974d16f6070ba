package org.hullsum.units;

import java.util.Optional;
import org.hullsum.problem.ProblemKind;
import org.hullsum.problem.TextFault;

/**
 * Reads one unit code from a text by recursive descent:
 *
 * <pre>
 * unit      = ["/"] product
 * product   = component { ("." | "*" | "·" | "/") component }      left to right
 * component = "(" product ")" ["^" exponent] {annotation}
 *           | number {annotation} | ("10*" | "10^") [exponent]
 *           | symbol ["^"] [exponent] {annotation} | annotation
 * exponent  = [sign] digits, plain or superscript
 * </pre>
 *
 * <p>In a longer text (an expression) the unit ends where no further component follows; there
 * {@code *} is never a part of it, and neither is a divisor that is a number.
 */
final class UnitReader {
  private static final int MAX_LENGTH = 200;
  private static final int MAX_DEPTH = 20;
  private static final int MAX_EXPONENT = 30;
  private static final int MAX_TENS = 300;
  private static final int MAX_DIGITS = 15;

  private final String text;
  private final boolean embedded;
  private final UnitCursor cursor;
  private final UnitNoteAccumulator notes = new UnitNoteAccumulator();
  private int depth;

  private UnitReader(String text, int start, boolean embedded) {
    this.text = text;
    this.embedded = embedded;
    this.cursor = new UnitCursor(text, start);
  }

  /** Reads a text that is nothing but a unit. */
  static Noted<Unit> readWhole(String text) throws TextFault {
    if (text.length() > MAX_LENGTH) {
      throw new TextFault(
          ProblemKind.LIMIT_EXCEEDED,
          0,
          text.length(),
          "a unit of " + text.length() + " characters; at most " + MAX_LENGTH + " are read");
    }
    UnitReader reader = new UnitReader(text, 0, false);
    Unit unit = reader.unit(0);
    if (!reader.cursor.atEnd()) {
      throw reader.trailing();
    }
    return new Noted<>(unit, reader.notes.notes());
  }

  /** Reads the longest unit that begins at {@code start} of a longer text. */
  static UnitPrefix readPrefix(String text, int start) throws TextFault {
    UnitReader reader = new UnitReader(text, start, true);
    Unit unit = reader.unit(start);
    return new UnitPrefix(unit, reader.notes.notes(), reader.cursor.position());
  }

  private Unit unit(int start) throws TextFault {
    if (cursor.atEnd()) {
      throw fault(start, start, "a unit is missing; expected one such as m3/h");
    }
    UnitTerm term;
    if (!embedded && cursor.skip('/')) {
      term = UnitTerm.ONE.over(component(true));
      term = productAfter(term, false);
    } else {
      term = product(false);
    }
    String code = text.substring(start, cursor.position());
    double scale = term.magnitude().value();
    if (!(scale > 0) || Double.isInfinite(scale)) {
      throw fault(start, cursor.position(), "the size of '" + code + "' is beyond all numbers");
    }
    return new Unit(code, term.dimension(), scale, term.offset());
  }

  private UnitTerm product(boolean inverted) throws TextFault {
    return productAfter(component(inverted), inverted);
  }

  private UnitTerm productAfter(UnitTerm first, boolean inverted) throws TextFault {
    UnitTerm term = first;
    boolean divided = false;
    while (cursor.atOperator(embedded)) {
      int before = cursor.position();
      int notesBefore = notes.size();
      int depthBefore = depth;
      boolean divide = cursor.takeOperator();
      if (embedded && Character.isDigit(cursor.peek())) {
        cursor.moveTo(before);
        return term;
      }
      try {
        UnitTerm factor = component(divide != inverted);
        if (divided && !divide) {
          notes.factorAfterDivision(
              text.substring(before + 1, cursor.position()), text.substring(0, cursor.position()));
        }
        term = divide ? term.over(factor) : term.times(factor);
      } catch (ArithmeticException tooLarge) {
        throw exponentFault(before, cursor.position());
      } catch (TextFault notAUnit) {
        if (!embedded) {
          throw notAUnit;
        }
        cursor.moveTo(before);
        depth = depthBefore;
        notes.cutTo(notesBefore);
        return term;
      }
      divided |= divide;
    }
    return term;
  }

  private UnitTerm component(boolean inverted) throws TextFault {
    char next = cursor.peek();
    if (next == '(') {
      return parenthesis(inverted);
    }
    if (next == '{') {
      skipAnnotations();
      return UnitTerm.ONE;
    }
    UnitTerm term = UnitCursor.isDigit(next) ? number() : symbol(inverted);
    skipAnnotations();
    return term;
  }

  private UnitTerm parenthesis(boolean inverted) throws TextFault {
    int open = cursor.position();
    cursor.advance();
    depth++;
    if (depth > MAX_DEPTH) {
      throw new TextFault(
          ProblemKind.LIMIT_EXCEEDED,
          open,
          open + 1,
          "more than " + MAX_DEPTH + " parentheses inside one another in a unit");
    }
    UnitTerm inner = product(inverted);
    if (!cursor.skip(')')) {
      throw fault(open, open + 1, "this '(' is never closed");
    }
    depth--;
    if (UnitCursor.isDigit(cursor.peek())) {
      throw here("write '^' between ')' and its exponent");
    }
    boolean raised = cursor.atRaised() && cursor.takeCaret();
    UnitTerm result =
        raised || cursor.atSuperscript()
            ? raise(inner, open, cursor.exponent(MAX_EXPONENT))
            : inner;
    skipAnnotations();
    return result;
  }

  private UnitTerm number() throws TextFault {
    int start = cursor.position();
    if (text.startsWith("10", start) && cursor.atPowerOfTen(start + 2)) {
      cursor.moveTo(start + 3);
      int tens = cursor.atExponent() ? cursor.exponent(MAX_TENS) : 1;
      return new UnitTerm(Magnitude.powerOfTen(tens), Dimension.NONE, 0);
    }
    double value = 0;
    while (UnitCursor.isDigit(cursor.peek())) {
      if (cursor.position() - start >= MAX_DIGITS) {
        throw fault(start, cursor.position(), "a number of more than " + MAX_DIGITS + " digits");
      }
      value = value * 10 + (cursor.peek() - '0');
      cursor.advance();
    }
    if (value == 0) {
      throw fault(start, cursor.position(), "a unit cannot be zero times another");
    }
    if (cursor.atDecimalPoint()) {
      throw fault(
          start,
          cursor.position() + 2,
          "a number inside a unit must be whole ('.' multiplies there); expected one such as 10 or"
              + " 10*-3");
    }
    return UnitTerm.of(value, 0, Dimension.NONE);
  }

  private UnitTerm symbol(boolean inverted) throws TextFault {
    int start = cursor.position();
    String symbol = cursor.symbol();
    if (symbol.isEmpty()) {
      throw UnitAdvice.noUnit(text, start);
    }
    Optional<UnitAtom> found = UnitTable.instance().find(symbol);
    if (found.isEmpty()) {
      throw UnitAdvice.unknown(text, start, symbol);
    }
    UnitAtom atom = found.get();
    boolean caret = cursor.atRaised() && cursor.takeCaret();
    int exponent = caret || cursor.atExponent() ? cursor.exponent(MAX_EXPONENT) : 1;
    if (exponent != 1 && cursor.atDecimalPoint()) {
      throw fault(start, cursor.position() + 2, "the exponent of a unit must be a whole number");
    }
    notes.unit(atom, symbol, exponent, inverted);
    return raise(atom.term(), start, exponent);
  }

  private UnitTerm raise(UnitTerm base, int start, int exponent) throws TextFault {
    try {
      return base.power(exponent);
    } catch (ArithmeticException tooLarge) {
      throw exponentFault(start, cursor.position());
    }
  }

  private void skipAnnotations() throws TextFault {
    while (cursor.peek() == '{') {
      int open = cursor.position();
      int close = text.indexOf('}', open);
      if (close < 0) {
        throw fault(open, open + 1, "this '{' is never closed");
      }
      cursor.moveTo(close + 1);
    }
  }

  private TextFault trailing() {
    int at = cursor.position();
    if (cursor.peek() == ')') {
      return fault(at, at + 1, "this ')' closes nothing");
    }
    return UnitAdvice.noUnit(text, at);
  }

  private TextFault here(String message) {
    int at = cursor.position();
    return fault(at, Math.min(at + 1, text.length()), message);
  }

  private static TextFault exponentFault(int start, int end) {
    return fault(start, end, "the exponents of this unit are out of all bounds");
  }

  private static TextFault fault(int start, int end, String message) {
    return new TextFault(ProblemKind.UNIT, start, end, message);
  }
}
