package org.hullsum.expression;

import java.util.Collection;
import org.hullsum.problem.ProblemKind;
import org.hullsum.problem.TextFault;
import org.hullsum.units.WorkingUnits;

/**
 * Reads formulas.
 *
 * <p>From loose to tight, with the side to which equal ones group:
 *
 * <pre>
 *   or                       left
 *   and                      left
 *   not                      prefix
 *   &lt; &lt;= &gt; &gt;= == !=         one at a time
 *   + -                      left
 *   * /                      left
 *   -                        prefix: -x^2 is -(x^2), -x*y is (-x)*y
 *   ^                        right; its exponent may have a minus: 2^-3
 * </pre>
 *
 * <p>Operands are numbers, {@code pi}, {@code e}, symbols, functions of {@link Function}, {@code
 * if(condition, a, b)} and parentheses. A condition used as a number is 1 or 0; a number is never a
 * condition.
 *
 * <p><b>Numbers with a unit.</b> A unit follows its number after one or more blanks and begins with
 * a letter, {@code %}, {@code °}, {@code [} or {@code 1/}; it is the longest text from there that
 * the unit grammar takes. It holds no blank and no {@code *}, so it ends at the next blank, {@code
 * *}, comma, comparison or parenthesis that it did not open, and at a {@code +} or {@code -} that
 * is not an exponent's; a {@code /} belongs to it only where a unit follows at once, without a
 * blank. So {@code 3 m + x}, {@code 4 m/s * t}, {@code 5 1/s*x}, {@code 2 m/x} (x is no unit) do
 * what they say, and {@code 4 m/s} is a speed whatever {@code s} is; {@code (4 m)/s} divides by the
 * symbol. The number is converted to the working units.
 *
 * <p>Formulas are at most {@value #MAX_LENGTH} characters long and {@value #MAX_DEPTH} parentheses
 * or {@value #MAX_HEIGHT} operations deep. Cost: linear in the length. Thread-safe.
 */
public final class ExpressionParser {
  static final int MAX_LENGTH = 10_000;
  static final int MAX_DEPTH = 200;
  static final int MAX_HEIGHT = 400;

  private ExpressionParser() {}

  /**
   * Reads one formula.
   *
   * @param text the formula
   * @param symbols names of the variables and parameters that it may use
   * @param working the units into which its quantities are converted
   * @throws TextFault of kind {@code EXPRESSION}, {@code UNKNOWN_NAME}, {@code UNIT} or {@code
   *     LIMIT_EXCEEDED}, with the place in the text
   */
  public static ParsedExpression parse(
      String text, Collection<String> symbols, WorkingUnits working) throws TextFault {
    if (text.length() > MAX_LENGTH) {
      throw new TextFault(
          ProblemKind.LIMIT_EXCEEDED,
          MAX_LENGTH,
          MAX_LENGTH,
          "the formula has "
              + text.length()
              + " characters; at most "
              + MAX_LENGTH
              + " are read. Name its parts as parameters");
    }
    return new ExpressionReader(text, symbols, working).read();
  }
}
