package org.hullsum.units;

import java.util.Objects;

/**
 * The coherent units in which a case is computed: every number inside a case (coordinates,
 * parameters, constants of expressions, fluxes) is in them, so that a bare number of the case file
 * means itself.
 *
 * @param length size of the working length in metres
 * @param mass in kilograms
 * @param time in seconds
 * @param temperature in kelvins
 * @param none true where the case says {@code units: none}: every number is plain, results have
 *     unit 1
 */
public record WorkingUnits(
    double length, double mass, double time, double temperature, boolean none) {
  public static final WorkingUnits SI = new WorkingUnits(1, 1, 1, 1, false);
  public static final WorkingUnits NONE = new WorkingUnits(1, 1, 1, 1, true);

  /** Size of the coherent working unit of a dimension in the coherent SI unit. */
  public double scale(Dimension dimension) {
    Objects.requireNonNull(dimension, "dimension");
    return Math.pow(length, dimension.exponent(0))
        * Math.pow(mass, dimension.exponent(1))
        * Math.pow(time, dimension.exponent(2))
        * Math.pow(temperature, dimension.exponent(4));
  }

  /** A value in coherent SI units, in working units. */
  public double fromSi(double value, Dimension dimension) {
    return value / scale(dimension);
  }

  /** A value in working units, in coherent SI units. */
  public double toSi(double value, Dimension dimension) {
    return value * scale(dimension);
  }
}
