package org.hullsum.report;

import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;
import java.util.Optional;
import org.hullsum.numeric.Vector3;

/**
 * Figures as text: as many digits as their error supports, never more than eight, and never in a
 * locale's own way.
 *
 * <p>Numbers from 1e-4 up to 1e7 are written out, others with a power of ten. What does not exist
 * is a dash, an infinite bound says so. Thread-safe.
 */
final class Figures {
  /** The most significant digits that a report prints. */
  static final int MOST_DIGITS = 8;

  /** Digits of a figure that is quoted in a sentence. */
  private static final int DIGITS_IN_TEXT = 6;

  /** Digits of an error or an uncertainty. */
  private static final int DIGITS_OF_ERROR = 2;

  private static final int LEAST_PLAIN_EXPONENT = -4;
  private static final int MOST_PLAIN_EXPONENT = 6;

  private Figures() {}

  /** A figure in a sentence, to six digits. */
  static String quoted(double value) {
    return significant(value, DIGITS_IN_TEXT);
  }

  /** A figure in a sentence with its unit; a plain number for the unit 1. */
  static String quoted(double value, String unit) {
    return withUnit(quoted(value), unit);
  }

  /** An error bound or a standard uncertainty, to two digits. */
  static String error(double value) {
    return significant(value, DIGITS_OF_ERROR);
  }

  /** A place or a direction, its components to one decimal: six digits of the largest. */
  static String vector(Vector3 v) {
    double largest = Math.max(Math.abs(v.x()), Math.max(Math.abs(v.y()), Math.abs(v.z())));
    int decimals = largest == 0 ? 0 : DIGITS_IN_TEXT - 1 - exponent(largest);
    return "["
        + rounded(v.x(), decimals)
        + ", "
        + rounded(v.y(), decimals)
        + ", "
        + rounded(v.z(), decimals)
        + "]";
  }

  private static String rounded(double value, int decimals) {
    return Double.isFinite(value)
        ? quoted(new BigDecimal(value).setScale(decimals, RoundingMode.HALF_EVEN).doubleValue())
        : "-";
  }

  /** A figure that may not exist. */
  static String optional(Optional<Double> value) {
    return value.map(Figures::quoted).orElse("-");
  }

  /** A share of one in percent. */
  static String percent(double share) {
    return significant(100 * share, 3) + " %";
  }

  static String withUnit(String figure, String unit) {
    return unit.equals("1") ? figure : figure + " " + unit;
  }

  /** The value rounded to so many significant digits, trailing zeros left out. */
  static String significant(double value, int digits) {
    if (!Double.isFinite(value)) {
      return Double.isNaN(value) ? "-" : "unbounded";
    }
    if (value == 0) {
      return "0";
    }
    BigDecimal rounded =
        new BigDecimal(value).round(new MathContext(digits, RoundingMode.HALF_EVEN));
    int exponent = exponent(rounded);
    return exponent < LEAST_PLAIN_EXPONENT || exponent > MOST_PLAIN_EXPONENT
        ? scientific(rounded.stripTrailingZeros())
        : plain(rounded.stripTrailingZeros());
  }

  /** The power of ten of the leading digit; the value is not zero. */
  static int exponent(BigDecimal value) {
    return value.precision() - value.scale() - 1;
  }

  /** The power of ten of the leading digit of a finite value that is not zero. */
  static int exponent(double value) {
    return exponent(BigDecimal.valueOf(value));
  }

  /** Whether a figure of this size is written out rather than with a power of ten. */
  static boolean isPlain(double value) {
    return value == 0
        || (exponent(value) >= LEAST_PLAIN_EXPONENT && exponent(value) <= MOST_PLAIN_EXPONENT);
  }

  static String plain(BigDecimal value) {
    return value.scale() < 0 ? value.setScale(0).toPlainString() : value.toPlainString();
  }

  /** Such as {@code -1.25e-7}: all digits of the value, one before the point. */
  static String scientific(BigDecimal value) {
    String digits = value.unscaledValue().abs().toString();
    String mantissa = digits.length() == 1 ? digits : digits.charAt(0) + "." + digits.substring(1);
    return (value.signum() < 0 ? "-" : "") + mantissa + "e" + exponent(value);
  }
}
