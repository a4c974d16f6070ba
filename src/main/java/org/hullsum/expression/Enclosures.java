package org.hullsum.expression;

import org.hullsum.numeric.ErrorFunction;

/**
 * Interval operations on the ends of intervals that stand in two arrays, rounded outward.
 *
 * <p>An operation encloses its values at all members where it is defined; where it is defined at
 * none, it gives all numbers. The basic operations are rounded to nearest by the virtual machine,
 * so one unit in the last place outward is enough; {@link Math}'s functions are within one unit
 * (the hyperbolic ones 2.5, {@code atan2} 2), the error function within a few; they get three and
 * eight units. A result whose sign is certain keeps it: x² + y² is never found negative.
 *
 * <p>Reference: R. E. Moore, R. B. Kearfott, M. J. Cloud, Introduction to Interval Analysis, 2009,
 * chapters 2 and 5.
 */
final class Enclosures {
  private static final int LIBRARY_UNITS = 3;
  private static final int ERROR_FUNCTION_UNITS = 8;
  private static final double TURN = 2 * Math.PI;

  /** Beyond this the places of the extrema of sine and cosine are not known well enough. */
  private static final double LARGE_ANGLE = 1e8;

  /** Relative slack for the place of an extremum, in turns. */
  private static final double ANGLE_SLACK = 1e-14;

  private final double[] low;
  private final double[] high;

  /**
   * @param low lower ends, changed in place; never NaN
   * @param high upper ends, changed in place; never NaN
   */
  Enclosures(double[] low, double[] high) {
    this.low = low;
    this.high = high;
  }

  private static double down(double value, int units) {
    if (Double.isInfinite(value)) {
      return Math.nextDown(value);
    }
    return value == 0 ? -units * Double.MIN_VALUE : value - units * Math.ulp(value);
  }

  private static double up(double value, int units) {
    return -down(-value, units);
  }

  /** An end that became NaN is unbounded; −0 is 0. */
  void set(int t, double lower, double upper) {
    low[t] = Double.isNaN(lower) ? Double.NEGATIVE_INFINITY : lower + 0.0;
    high[t] = Double.isNaN(upper) ? Double.POSITIVE_INFINITY : upper + 0.0;
  }

  private void all(int t) {
    set(t, Double.NEGATIVE_INFINITY, Double.POSITIVE_INFINITY);
  }

  private boolean containsZero(int a) {
    return low[a] <= 0 && high[a] >= 0;
  }

  private boolean isZero(int a) {
    return low[a] == 0 && high[a] == 0;
  }

  /** A sum that rounds to 0 is 0. */
  private void setSum(int t, double lower, double upper) {
    set(t, lower == 0 ? 0 : Math.nextDown(lower), upper == 0 ? 0 : Math.nextUp(upper));
  }

  void add(int t, int a, int b) {
    setSum(t, low[a] + low[b], high[a] + high[b]);
  }

  void subtract(int t, int a, int b) {
    if (a == b) {
      set(t, 0, 0);
    } else {
      setSum(t, low[a] - high[b], high[a] - low[b]);
    }
  }

  void negate(int t, int a) {
    set(t, -high[a], -low[a]);
  }

  private static double times(double a, double b) {
    return a == 0 || b == 0 ? 0 : a * b;
  }

  void multiply(int t, int a, int b) {
    if (a == b) {
      integerPower(t, a, 2);
      return;
    }
    if (isZero(a) || isZero(b)) {
      set(t, 0, 0);
      return;
    }
    double ll = times(low[a], low[b]);
    double lh = times(low[a], high[b]);
    double hl = times(high[a], low[b]);
    double hh = times(high[a], high[b]);
    double lower = Math.nextDown(Math.min(Math.min(ll, lh), Math.min(hl, hh)));
    double upper = Math.nextUp(Math.max(Math.max(ll, lh), Math.max(hl, hh)));
    setSigned(t, lower, upper, sign(a) * sign(b));
  }

  /** 1 where no member is negative, −1 where none is positive, else 0. */
  private int sign(int a) {
    return low[a] >= 0 ? 1 : high[a] <= 0 ? -1 : 0;
  }

  private void setSigned(int t, double lower, double upper, int sign) {
    set(t, sign > 0 ? Math.max(0, lower) : lower, sign < 0 ? Math.min(0, upper) : upper);
  }

  void divide(int t, int a, int b) {
    if (isZero(b)) {
      all(t);
      return;
    }
    if (isZero(a)) {
      set(t, 0, 0);
      return;
    }
    if (low[b] < 0 && high[b] > 0) {
      all(t);
      return;
    }
    // an end that is 0 is approached from the inside: its quotient is unbounded
    double inverseOfLow = low[b] == 0 ? Double.POSITIVE_INFINITY : 1 / low[b];
    double inverseOfHigh = high[b] == 0 ? Double.NEGATIVE_INFINITY : 1 / high[b];
    double ll = over(low[a], low[b], inverseOfLow);
    double lh = over(low[a], high[b], inverseOfHigh);
    double hl = over(high[a], low[b], inverseOfLow);
    double hh = over(high[a], high[b], inverseOfHigh);
    double lower = Math.nextDown(Math.min(Math.min(ll, lh), Math.min(hl, hh)));
    double upper = Math.nextUp(Math.max(Math.max(ll, lh), Math.max(hl, hh)));
    setSigned(t, lower, upper, sign(a) * sign(b));
  }

  private static double over(double a, double b, double inverse) {
    if (a == 0 || Double.isInfinite(b)) {
      return Double.isInfinite(a) ? Double.NaN : 0;
    }
    return b == 0 ? a * inverse : a / b;
  }

  /** The quotient, or the mean value c of the numerator's derivative where the divisor vanishes. */
  void removableDivide(int t, int a, int b, int c) {
    if (containsZero(b)) {
      set(t, low[c], high[c]);
    } else {
      divide(t, a, b);
    }
  }

  void integerPower(int t, int a, double exponent) {
    boolean even = exponent % 2 == 0;
    double l = Math.pow(low[a], exponent);
    double h = Math.pow(high[a], exponent);
    int units = exponent == 2 ? 1 : LIBRARY_UNITS;
    if (!even) {
      setSigned(t, down(l, units), up(h, units), sign(a));
    } else if (containsZero(a)) {
      set(t, 0, isZero(a) ? 0 : up(Math.max(l, h), units));
    } else {
      set(t, Math.max(0, down(Math.min(l, h), units)), up(Math.max(l, h), units));
    }
  }

  /** A power of what is not negative in a; with the negative powers too where b may be whole. */
  void power(int t, int a, int b) {
    boolean whole = Math.ceil(low[b]) <= high[b];
    if (high[a] < 0 && !whole) {
      all(t);
      return;
    }
    double least = low[a] < 0 && (whole || high[a] >= 0) ? 0 : low[a];
    double most = low[a] < 0 && whole ? Math.max(-low[a], high[a]) : high[a];
    double ll = Math.pow(least, low[b]);
    double lh = Math.pow(least, high[b]);
    double hl = Math.pow(most, low[b]);
    double hh = Math.pow(most, high[b]);
    double lower = down(Math.min(Math.min(ll, lh), Math.min(hl, hh)), LIBRARY_UNITS);
    double upper = up(Math.max(Math.max(ll, lh), Math.max(hl, hh)), LIBRARY_UNITS);
    if (low[a] < 0 && whole) {
      set(t, -upper, upper);
    } else {
      set(t, Math.max(0, lower), upper);
    }
  }

  /** A function that grows (or, with ends swapped by the caller, falls), clipped to its range. */
  private void monotone(int t, double atLow, double atHigh, int units, double least, double most) {
    set(t, Math.max(least, down(atLow, units)), Math.min(most, up(atHigh, units)));
  }

  void sin(int t, int a) {
    wave(t, a, 0.25, Math.sin(low[a]), Math.sin(high[a]));
  }

  void cos(int t, int a) {
    wave(t, a, 0, Math.cos(low[a]), Math.cos(high[a]));
  }

  /** A wave with its crest at that phase and its trough half a turn on. */
  private void wave(int t, int a, double crest, double atLow, double atHigh) {
    double lower = meets(a, crest + 0.5, 1) ? -1 : down(Math.min(atLow, atHigh), LIBRARY_UNITS);
    double upper = meets(a, crest, 1) ? 1 : up(Math.max(atLow, atHigh), LIBRARY_UNITS);
    set(t, Math.max(-1, lower), Math.min(1, upper));
  }

  /** Whether (phase + k · period) turns may lie inside for a whole k. */
  private boolean meets(int a, double phase, double period) {
    if (!(Math.abs(low[a]) < LARGE_ANGLE && Math.abs(high[a]) < LARGE_ANGLE)) {
      return true;
    }
    double from = (low[a] / TURN - phase) / period;
    double to = (high[a] / TURN - phase) / period;
    double slack = ANGLE_SLACK * (1 + Math.max(Math.abs(from), Math.abs(to)));
    return Math.ceil(from - slack) <= to + slack;
  }

  /** Whether a tangent may have a pole inside. */
  boolean mayHavePole(int a) {
    return meets(a, 0.25, 0.5);
  }

  void tan(int t, int a) {
    if (mayHavePole(a)) {
      all(t);
    } else {
      set(t, down(Math.tan(low[a]), LIBRARY_UNITS), up(Math.tan(high[a]), LIBRARY_UNITS));
    }
  }

  void asin(int t, int a) {
    if (low[a] > 1 || high[a] < -1) {
      all(t);
    } else {
      double from = Math.asin(Math.max(-1, low[a]));
      double to = Math.asin(Math.min(1, high[a]));
      set(t, down(from, LIBRARY_UNITS), up(to, LIBRARY_UNITS));
    }
  }

  void acos(int t, int a) {
    if (low[a] > 1 || high[a] < -1) {
      all(t);
    } else {
      double from = Math.acos(Math.min(1, high[a]));
      double to = Math.acos(Math.max(-1, low[a]));
      set(t, Math.max(0, down(from, LIBRARY_UNITS)), up(to, LIBRARY_UNITS));
    }
  }

  void atan2(int t, int y, int x) {
    // a zero may have been computed as -0, which is on the other side of the cut
    boolean cut = low[x] <= 0 && containsZero(y);
    double half = up(Math.PI, 1);
    if (cut) {
      set(t, -half, half);
      return;
    }
    double ll = Math.atan2(low[y], low[x]);
    double lh = Math.atan2(low[y], high[x]);
    double hl = Math.atan2(high[y], low[x]);
    double hh = Math.atan2(high[y], high[x]);
    set(
        t,
        Math.max(-half, down(Math.min(Math.min(ll, lh), Math.min(hl, hh)), LIBRARY_UNITS)),
        Math.min(half, up(Math.max(Math.max(ll, lh), Math.max(hl, hh)), LIBRARY_UNITS)));
  }

  void cosh(int t, int a) {
    double l = Math.cosh(low[a]);
    double h = Math.cosh(high[a]);
    double lower = containsZero(a) ? 1 : down(Math.min(l, h), LIBRARY_UNITS);
    set(t, Math.max(1, lower), up(Math.max(l, h), LIBRARY_UNITS));
  }

  void logarithm(Operation operation, int t, int a) {
    if (high[a] <= 0) {
      all(t);
      return;
    }
    double lower =
        low[a] <= 0 ? Double.NEGATIVE_INFINITY : down(operation.apply(low[a], 0, 0), LIBRARY_UNITS);
    set(t, lower, up(operation.apply(high[a], 0, 0), LIBRARY_UNITS));
  }

  void sqrt(int t, int a) {
    if (high[a] < 0) {
      all(t);
      return;
    }
    double lower = low[a] <= 0 ? 0 : Math.nextDown(Math.sqrt(low[a]));
    set(t, lower, high[a] == 0 ? 0 : Math.nextUp(Math.sqrt(high[a])));
  }

  void abs(int t, int a) {
    if (containsZero(a)) {
      set(t, 0, Math.max(-low[a], high[a]));
    } else {
      set(
          t,
          Math.min(Math.abs(low[a]), Math.abs(high[a])),
          Math.max(Math.abs(low[a]), Math.abs(high[a])));
    }
  }

  void min(int t, int a, int b) {
    set(t, Math.min(low[a], low[b]), Math.min(high[a], high[b]));
  }

  void max(int t, int a, int b) {
    set(t, Math.max(low[a], low[b]), Math.max(high[a], high[b]));
  }

  void hypot(int t, int a, int b) {
    double leastA = containsZero(a) ? 0 : Math.min(Math.abs(low[a]), Math.abs(high[a]));
    double leastB = containsZero(b) ? 0 : Math.min(Math.abs(low[b]), Math.abs(high[b]));
    double least = Math.hypot(leastA, leastB);
    double most =
        Math.hypot(
            Math.max(Math.abs(low[a]), Math.abs(high[a])),
            Math.max(Math.abs(low[b]), Math.abs(high[b])));
    set(t, least == 0 ? 0 : down(least, LIBRARY_UNITS), most == 0 ? 0 : up(most, LIBRARY_UNITS));
  }

  void grow(Operation operation, int t, int a) {
    double l = operation.apply(low[a], 0, 0);
    double h = operation.apply(high[a], 0, 0);
    double infinite = Double.POSITIVE_INFINITY;
    switch (operation) {
      case EXP -> monotone(t, l, h, LIBRARY_UNITS, 0, infinite);
      case TANH -> monotone(t, l, h, LIBRARY_UNITS, -1, 1);
      case SIGN -> set(t, l, h);
      default -> monotone(t, l, h, LIBRARY_UNITS, -infinite, infinite);
    }
  }

  void erf(int t, int a) {
    monotone(t, ErrorFunction.erf(low[a]), ErrorFunction.erf(high[a]), ERROR_FUNCTION_UNITS, -1, 1);
  }

  void erfc(int t, int a) {
    monotone(
        t, ErrorFunction.erfc(high[a]), ErrorFunction.erfc(low[a]), ERROR_FUNCTION_UNITS, 0, 2);
  }

  /** −1 where a condition surely does not hold, 1 where it surely does, else 0. */
  int decided(int a) {
    return isZero(a) ? -1 : containsZero(a) ? 0 : 1;
  }

  private void truth(int t, boolean surely, boolean surelyNot) {
    set(t, surely ? 1 : 0, surelyNot ? 0 : 1);
  }

  void condition(Operation operation, int t, int a, int b) {
    switch (operation) {
      case LESS -> truth(t, high[a] < low[b], low[a] >= high[b]);
      case LESS_OR_EQUAL -> truth(t, high[a] <= low[b], low[a] > high[b]);
      case GREATER -> truth(t, low[a] > high[b], high[a] <= low[b]);
      case GREATER_OR_EQUAL -> truth(t, low[a] >= high[b], high[a] < low[b]);
      case EQUAL -> truth(t, a == b || same(a, b), apart(a, b));
      case NOT_EQUAL -> truth(t, apart(a, b), a == b || same(a, b));
      case AND ->
          truth(t, Math.min(decided(a), decided(b)) > 0, Math.min(decided(a), decided(b)) < 0);
      case OR ->
          truth(t, Math.max(decided(a), decided(b)) > 0, Math.max(decided(a), decided(b)) < 0);
      case NOT -> truth(t, decided(a) < 0, decided(a) > 0);
      default -> throw new IllegalStateException(operation + " is not a condition");
    }
  }

  private boolean same(int a, int b) {
    return low[a] == high[a] && low[b] == high[b] && low[a] == low[b];
  }

  private boolean apart(int a, int b) {
    return high[a] < low[b] || high[b] < low[a];
  }

  void select(int t, int a, int b, int c) {
    int decided = decided(a);
    int one = decided < 0 ? c : b;
    int other = decided > 0 ? b : c;
    set(t, Math.min(low[one], low[other]), Math.max(high[one], high[other]));
  }
}
