package org.hullsum.expression;

import java.math.BigDecimal;

/**
 * A number in the normal form of the simplifier: an exact fraction where numerator and denominator
 * are small enough, else a rounded number.
 *
 * <p>Decimal literals are read as the fractions that they write, so that 0.1 + 0.2 is 0.3 and
 * thirds add up to one. A sum of rounded numbers that is within their rounding of zero is zero.
 *
 * @param numerator in lowest terms; 0 for a rounded number
 * @param denominator positive, or 0 for a rounded number
 * @param rounded the value of a rounded number, else 0
 */
record Coefficient(long numerator, long denominator, double rounded) {
  static final Coefficient ZERO = new Coefficient(0, 1, 0);
  static final Coefficient ONE = new Coefficient(1, 1, 0);
  static final Coefficient HALF = new Coefficient(1, 2, 0);

  /** Digits beyond this are not exact as a double. */
  private static final long LARGEST_EXACT = 1L << 53;

  private static final int MOST_DECIMALS = 18;
  private static final int MOST_MULTIPLIED = 64;

  /** Sums within so many roundings of their larger term are zero. */
  private static final double ROUNDINGS = 4;

  static Coefficient of(long whole) {
    return new Coefficient(whole, 1, 0);
  }

  private static Coefficient rounded(double value) {
    return value == 0 ? ZERO : new Coefficient(0, 0, value);
  }

  static Coefficient of(double value) {
    if (value == Math.rint(value) && Math.abs(value) < LARGEST_EXACT) {
      return of((long) value);
    }
    if (!Double.isFinite(value)) {
      return rounded(value);
    }
    BigDecimal decimal = new BigDecimal(Double.toString(value)).stripTrailingZeros();
    if (decimal.scale() <= 0
        || decimal.scale() > MOST_DECIMALS
        || decimal.unscaledValue().bitLength() >= Long.SIZE - 11) {
      return rounded(value);
    }
    return reduced(
        decimal.unscaledValue().longValueExact(),
        BigDecimal.TEN.pow(decimal.scale()).longValueExact());
  }

  private static Coefficient reduced(long numerator, long denominator) {
    long divisor = divisor(numerator, denominator);
    long sign = denominator < 0 ? -1 : 1;
    return new Coefficient(sign * numerator / divisor, sign * denominator / divisor, 0);
  }

  /** The greatest common divisor, positive unless both are zero. */
  static long divisor(long a, long b) {
    long m = Math.abs(a);
    long n = Math.abs(b);
    while (n != 0) {
      long rest = m % n;
      m = n;
      n = rest;
    }
    return m;
  }

  // written out because it is in every comparison of the simplifier, and a record's own is linked
  // at first use, at the cost of a good part of a short run
  @Override
  public boolean equals(Object other) {
    return other instanceof Coefficient that
        && numerator == that.numerator
        && denominator == that.denominator
        && Double.compare(rounded, that.rounded) == 0;
  }

  @Override
  public int hashCode() {
    return Long.hashCode(31 * numerator + denominator) + Double.hashCode(rounded);
  }

  boolean isExact() {
    return denominator != 0;
  }

  boolean isZero() {
    return isExact() && numerator == 0;
  }

  boolean isOne() {
    return equals(ONE);
  }

  boolean isWhole() {
    return denominator == 1;
  }

  boolean isEven() {
    return isWhole() && numerator % 2 == 0;
  }

  boolean isNegative() {
    return numerator < 0 || rounded < 0;
  }

  double value() {
    return isExact() ? (double) numerator / denominator : rounded;
  }

  Coefficient negated() {
    return new Coefficient(-numerator, denominator, -rounded + 0.0);
  }

  Coefficient absolute() {
    return isNegative() ? negated() : this;
  }

  Coefficient plus(Coefficient other) {
    if (isExact() && other.isExact()) {
      try {
        return reduced(
            Math.addExact(
                Math.multiplyExact(numerator, other.denominator),
                Math.multiplyExact(other.numerator, denominator)),
            Math.multiplyExact(denominator, other.denominator));
      } catch (ArithmeticException tooLarge) {
        return roundedSum(other);
      }
    }
    return roundedSum(other);
  }

  private Coefficient roundedSum(Coefficient other) {
    double a = value();
    double b = other.value();
    boolean vanishes = Math.abs(a + b) <= ROUNDINGS * Math.ulp(Math.max(Math.abs(a), Math.abs(b)));
    return vanishes ? ZERO : rounded(a + b);
  }

  Coefficient minus(Coefficient other) {
    return plus(other.negated());
  }

  Coefficient times(Coefficient other) {
    if (isExact() && other.isExact()) {
      long first = divisor(numerator, other.denominator);
      long second = divisor(other.numerator, denominator);
      if (first == 0 || second == 0) {
        return ZERO;
      }
      try {
        return new Coefficient(
            Math.multiplyExact(numerator / first, other.numerator / second),
            Math.multiplyExact(denominator / second, other.denominator / first),
            0);
      } catch (ArithmeticException tooLarge) {
        return rounded(value() * other.value());
      }
    }
    return isZero() || other.isZero() ? ZERO : rounded(value() * other.value());
  }

  /** One over this number, which is not zero. */
  Coefficient inverse() {
    return isExact()
        ? new Coefficient(numerator < 0 ? -denominator : denominator, Math.abs(numerator), 0)
        : rounded(1 / rounded);
  }

  /** This number, not zero, to a whole power. */
  Coefficient power(long exponent) {
    if (Math.abs(exponent) > MOST_MULTIPLIED) {
      return isOne() ? ONE : rounded(Math.pow(value(), (double) exponent));
    }
    Coefficient result = ONE;
    Coefficient base = exponent < 0 ? inverse() : this;
    for (long k = Math.abs(exponent); k > 0; k--) {
      result = result.times(base);
    }
    return result;
  }

  /** Whole part, toward zero. */
  long wholePart() {
    return isExact() ? numerator / denominator : (long) rounded;
  }

  /** The square root where it is a fraction of whole numbers, else empty. */
  java.util.Optional<Coefficient> exactRoot() {
    if (!isExact() || numerator < 0) {
      return java.util.Optional.empty();
    }
    long n = Math.round(Math.sqrt((double) numerator));
    long d = Math.round(Math.sqrt((double) denominator));
    return n * n == numerator && d * d == denominator
        ? java.util.Optional.of(reduced(n, d))
        : java.util.Optional.empty();
  }
}
