package org.hullsum.audit;

import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;
import org.hullsum.numeric.Vector3;

/** Figures in the sentences of findings and explanations: four significant digits. */
final class Figures {
  private static final MathContext DIGITS = new MathContext(4, RoundingMode.HALF_EVEN);
  private static final MathContext ERROR_DIGITS = new MathContext(2, RoundingMode.HALF_EVEN);
  private static final int LARGEST_PLAIN_EXPONENT = 6;
  private static final int SMALLEST_PLAIN_EXPONENT = -4;

  /** Components of a point below this share of the largest are rounding. */
  private static final double NOTHING = 1e-12;

  private Figures() {}

  static String text(double value) {
    return text(value, DIGITS);
  }

  /** An error bound or an uncertainty with its unit: two significant digits. */
  static String error(double value, String unit) {
    return withUnit(text(value, ERROR_DIGITS), unit);
  }

  private static String text(double value, MathContext digits) {
    if (value == 0 || !Double.isFinite(value)) {
      return value == 0 ? "0" : "not finite";
    }
    BigDecimal rounded = BigDecimal.valueOf(value).round(digits).stripTrailingZeros();
    int exponent = rounded.precision() - rounded.scale() - 1;
    if (exponent < SMALLEST_PLAIN_EXPONENT || exponent >= LARGEST_PLAIN_EXPONENT) {
      return rounded.unscaledValue().signum() == 0
          ? "0"
          : rounded.scaleByPowerOfTen(-exponent).toPlainString() + "e" + exponent;
    }
    return rounded.toPlainString();
  }

  /** A value with its unit; the unit 1 is not written. */
  static String text(double value, String unit) {
    return withUnit(text(value), unit);
  }

  private static String withUnit(String figure, String unit) {
    return unit.equals("1") ? figure : figure + " " + unit;
  }

  /** A point; what is nothing beside its largest component is written as 0. */
  static String point(Vector3 point) {
    double nothing =
        NOTHING * Math.max(Math.abs(point.x()), Math.max(Math.abs(point.y()), Math.abs(point.z())));
    return "("
        + component(point.x(), nothing)
        + ", "
        + component(point.y(), nothing)
        + ", "
        + component(point.z(), nothing)
        + ")";
  }

  private static String component(double value, double nothing) {
    return Math.abs(value) <= nothing ? "0" : text(value);
  }

  /** A fraction as a percentage. */
  static String percent(double fraction) {
    return text(100 * fraction) + " %";
  }
}
