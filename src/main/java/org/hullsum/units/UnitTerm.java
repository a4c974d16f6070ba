package org.hullsum.units;

/**
 * What a part of a unit code stands for.
 *
 * @param offset of a temperature scale in kelvins; dropped by every product and power, because in a
 *     compound a temperature is a difference
 */
record UnitTerm(Magnitude magnitude, Dimension dimension, double offset) {
  static final UnitTerm ONE = new UnitTerm(Magnitude.ONE, Dimension.NONE, 0);

  static UnitTerm of(double numerator, int tens, Dimension dimension) {
    return new UnitTerm(Magnitude.of(numerator, tens), dimension, 0);
  }

  UnitTerm times(UnitTerm other) {
    return new UnitTerm(magnitude.times(other.magnitude), dimension.times(other.dimension), 0);
  }

  UnitTerm over(UnitTerm other) {
    return new UnitTerm(
        magnitude.times(other.magnitude.inverse()), dimension.dividedBy(other.dimension), 0);
  }

  /**
   * This term to a whole power.
   *
   * @throws ArithmeticException if an exponent of the dimension would be out of range
   */
  UnitTerm power(int exponent) {
    if (exponent == 1) {
      return this;
    }
    return new UnitTerm(magnitude.power(exponent), dimension.power(exponent), 0);
  }
}
