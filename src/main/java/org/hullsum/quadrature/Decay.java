package org.hullsum.quadrature;

/**
 * What the coefficients of an integrand in one direction say about the error of the rule there.
 *
 * <p>The coefficients are taken to fall like top · r^k beyond the top modes, with the ratio r seen
 * between the middle and the top modes. Only part of the reach of the rule is credited, since a
 * ratio seen over few degrees is worth only so much.
 */
final class Decay {
  /** The part of the reach beyond the top modes that is credited. */
  private static final double CREDITED_REACH = 0.75;

  /** Ratios beyond this are no geometric decay; also bounds the sum of the geometric series. */
  private static final double SLOWEST = 0.9;

  private static final double FASTEST = 1e-3;
  private static final double SAFETY = 4;

  /** Coefficients below this part of the magnitude are taken for rounding. */
  private static final double ROUNDING = 64 * Math.ulp(1.0);

  private Decay() {}

  /** The ratio of successive coefficients. */
  static double ratio(DirectionRule rule, double top, double middle, double magnitude) {
    if (resolved(top, magnitude)) {
      return FASTEST;
    }
    if (top >= middle) {
      return SLOWEST;
    }
    double ratio = Math.pow(top / middle, 1 / rule.modeDistance());
    return Math.min(SLOWEST, Math.max(FASTEST, ratio));
  }

  /** Whether nothing but rounding is left in the top coefficients. */
  static boolean resolved(double top, double magnitude) {
    return top <= ROUNDING * magnitude;
  }

  /** A bound of the rule's error in this direction, given the decay holds. */
  static double error(DirectionRule rule, double top, double ratio, double magnitude) {
    if (resolved(top, magnitude)) {
      return 0;
    }
    return SAFETY * top * Math.pow(ratio, CREDITED_REACH * rule.reach()) / (1 - ratio);
  }

  /** The smallest size at which {@link #error} is expected to be at most {@code tolerance}. */
  static int neededSize(
      DirectionRule rule, double top, double ratio, double magnitude, double tolerance) {
    double error = error(rule, top, ratio, magnitude);
    if (error <= tolerance) {
      return rule.size();
    }
    if (!(tolerance > 0)) {
      return Integer.MAX_VALUE;
    }
    double degrees =
        Math.log(tolerance / error) / Math.log(ratio) / (1 + CREDITED_REACH * rule.reachPerTop());
    double size = Math.ceil(rule.sizeForHigherTop(degrees));
    return size < Integer.MAX_VALUE ? (int) size : Integer.MAX_VALUE;
  }
}
