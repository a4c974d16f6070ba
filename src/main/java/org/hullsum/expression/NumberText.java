package org.hullsum.expression;

import java.math.BigDecimal;
import java.math.MathContext;

/** Numbers as a person writes them: the fewest digits that read back to the same double. */
final class NumberText {
  private static final int FEWEST_PLAIN_EXPONENT = -4;
  private static final int MOST_PLAIN_EXPONENT = 9;

  private NumberText() {}

  /** The text of a number; what is not finite is written as a quotient that gives it. */
  static String of(double value) {
    if (Double.isNaN(value)) {
      return "(0/0)";
    }
    if (Double.isInfinite(value)) {
      return value > 0 ? "(1/0)" : "(-1/0)";
    }
    if (value == 0) {
      return "0";
    }
    BigDecimal shortest = shortest(value);
    int exponent = shortest.precision() - shortest.scale() - 1;
    if (exponent >= FEWEST_PLAIN_EXPONENT && exponent <= MOST_PLAIN_EXPONENT) {
      return shortest.toPlainString();
    }
    String digits = shortest.unscaledValue().abs().toString();
    String mantissa = digits.length() == 1 ? digits : digits.charAt(0) + "." + digits.substring(1);
    return (value < 0 ? "-" : "") + mantissa + "e" + exponent;
  }

  /** Double.toString of JDK 17 sometimes gives a digit more than is needed. */
  private static BigDecimal shortest(double value) {
    BigDecimal best = new BigDecimal(Double.toString(value)).stripTrailingZeros();
    for (int precision = best.precision() - 1; precision > 0; precision--) {
      BigDecimal shorter = best.round(new MathContext(precision)).stripTrailingZeros();
      if (shorter.doubleValue() != value) {
        break;
      }
      best = shorter;
    }
    return best;
  }
}
