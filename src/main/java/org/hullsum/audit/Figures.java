package org.hullsum.audit;

import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;
import org.hullsum.numeric.Vector3;

/** Figures in the sentences of findings and explanations: four significant digits. */
final class Figures {
  private static final MathContext DIGITS = new MathContext(4, RoundingMode.HALF_EVEN);
  private static final int LARGEST_PLAIN_EXPONENT = 6;
  private static final int SMALLEST_PLAIN_EXPONENT = -4;

  /** Components of a point below this share of the largest are rounding. */
  private static final double NOTHING = 1e-12;

  private Figures() {}

  static String text(double value) {
    if (value == 0 || !Double.isFinite(value)) {
      return value == 0 ? "0" : "not finite";
    }
    BigDecimal rounded = BigDecimal.valueOf(value).round(DIGITS).stripTrailingZeros();
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
    return unit.equals("1") ? text(value) : text(value) + " " + unit;
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
