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

  public WorkingUnits {
    requireSize("length", length);
    requireSize("mass", mass);
    requireSize("time", time);
    requireSize("temperature", temperature);
  }

  private static void requireSize(String name, double size) {
    if (!(size > 0) || Double.isInfinite(size)) {
      throw new IllegalArgumentException("working unit of " + name + " has size " + size);
    }
  }

  /**
   * Working units from four units.
   *
   * @throws IllegalArgumentException if one of them has another dimension, or a zero of its own
   *     ({@code degC}): a reader of files checks that first, with {@link #fits}
   */
  public static WorkingUnits of(Unit length, Unit time, Unit mass, Unit temperature) {
    return new WorkingUnits(
        size(length, Dimension.LENGTH),
        size(mass, Dimension.MASS),
        size(time, Dimension.TIME),
        size(temperature, Dimension.TEMPERATURE),
        false);
  }

  /** Whether a unit can be the working unit of a dimension: it measures it, from zero. */
  public static boolean fits(Unit unit, Dimension dimension) {
    return unit.dimension().equals(dimension) && unit.offset() == 0;
  }

  private static double size(Unit unit, Dimension dimension) {
    if (!fits(unit, dimension)) {
      throw new IllegalArgumentException(unit.code() + " is no working unit of " + dimension);
    }
    return unit.scale();
  }

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
