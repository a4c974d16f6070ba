package org.hullsum.numeric;

/**
 * A closed interval of real numbers, for enclosures: every operation on it returns an interval that
 * contains every value of the operation on members, rounding included.
 *
 * <p>Rounding outward is by one unit in the last place after each operation ({@link Math#nextDown},
 * {@link Math#nextUp}); an end may be infinite, never NaN.
 *
 * @param low lower end
 * @param high upper end, at least {@code low}
 */
public record Interval(double low, double high) {
  /** All real numbers. */
  public static final Interval ALL =
      new Interval(Double.NEGATIVE_INFINITY, Double.POSITIVE_INFINITY);

  public static final Interval UNIT = new Interval(0, 1);

  public Interval {
    if (!(low <= high)) {
      throw new IllegalArgumentException("interval from " + low + " to " + high);
    }
  }

  public static Interval point(double value) {
    return new Interval(value, value);
  }

  public static Interval hull(double a, double b) {
    return new Interval(Math.min(a, b), Math.max(a, b));
  }

  /** The interval widened by a rounding at each end. */
  public static Interval outward(double low, double high) {
    return Double.isNaN(low) || Double.isNaN(high)
        ? ALL
        : new Interval(Math.nextDown(low), Math.nextUp(high));
  }

  public boolean contains(double value) {
    return low <= value && value <= high;
  }

  public double width() {
    return high - low;
  }

  public double middle() {
    return 0.5 * low + 0.5 * high;
  }

  /** Largest absolute value of a member. */
  public double magnitude() {
    return Math.max(Math.abs(low), Math.abs(high));
  }

  public Interval hullWith(Interval other) {
    return new Interval(Math.min(low, other.low), Math.max(high, other.high));
  }

  public boolean intersects(Interval other) {
    return low <= other.high && other.low <= high;
  }

  public Interval plus(Interval other) {
    return outward(low + other.low, high + other.high);
  }

  public Interval minus(Interval other) {
    return outward(low - other.high, high - other.low);
  }

  public Interval negated() {
    return new Interval(-high, -low);
  }

  public Interval times(Interval other) {
    double a = product(low, other.low);
    double b = product(low, other.high);
    double c = product(high, other.low);
    double d = product(high, other.high);
    return outward(
        Math.min(Math.min(a, b), Math.min(c, d)), Math.max(Math.max(a, b), Math.max(c, d)));
  }

  /** Zero times an infinite end is zero: the end itself is never attained. */
  private static double product(double a, double b) {
    return a == 0 || b == 0 ? 0 : a * b;
  }

  /** The quotient; {@link #ALL} where the divisor contains zero. */
  public Interval dividedBy(Interval other) {
    if (other.contains(0)) {
      return ALL;
    }
    return times(outward(1 / other.high, 1 / other.low));
  }
}
