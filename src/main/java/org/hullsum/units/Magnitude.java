package org.hullsum.units;

/**
 * A positive size kept as {@code numerator · 10^tens / denominator}, so that sizes that are ratios
 * of whole numbers, such as those of {@code mm3/h}, are rounded only once, when asked for.
 */
record Magnitude(double numerator, double denominator, int tens) {
  static final Magnitude ONE = new Magnitude(1, 1, 0);

  static Magnitude of(double numerator, int tens) {
    return new Magnitude(numerator, 1, tens);
  }

  static Magnitude powerOfTen(int tens) {
    return new Magnitude(1, 1, tens);
  }

  Magnitude times(Magnitude other) {
    return new Magnitude(
        numerator * other.numerator, denominator * other.denominator, tens + other.tens);
  }

  Magnitude inverse() {
    return new Magnitude(denominator, numerator, -tens);
  }

  Magnitude power(int exponent) {
    if (exponent < 0) {
      return power(-exponent).inverse();
    }
    return new Magnitude(
        Math.pow(numerator, exponent), Math.pow(denominator, exponent), tens * exponent);
  }

  /** As a plain number; 0, infinite or NaN where it is beyond the range of a double. */
  double value() {
    double shift = Math.pow(10, Math.abs(tens));
    return tens < 0 ? numerator / (denominator * shift) : numerator * shift / denominator;
  }
}
