package org.hullsum.units;

import java.util.Objects;

/**
 * A quantity with its standard uncertainty (JCGM 100).
 *
 * @param quantity the best estimate
 * @param standardUncertainty in the quantity's unit (a difference, never an offset), zero for an
 *     exact one, at least 0
 * @param degreesOfFreedom of the standard uncertainty, infinite unless stated
 * @param stated whether any uncertainty was written; a figure without any is taken as exact
 */
public record MeasuredQuantity(
    Quantity quantity, double standardUncertainty, double degreesOfFreedom, boolean stated) {
  public MeasuredQuantity {
    Objects.requireNonNull(quantity, "quantity");
    if (!(standardUncertainty >= 0) || !(degreesOfFreedom > 0)) {
      throw new IllegalArgumentException(
          "standard uncertainty " + standardUncertainty + " with dof " + degreesOfFreedom);
    }
  }

  public static MeasuredQuantity exact(Quantity quantity) {
    return new MeasuredQuantity(quantity, 0, Double.POSITIVE_INFINITY, false);
  }

  /** Standard uncertainty in working units. */
  public double standardUncertaintyIn(WorkingUnits working) {
    return quantity.bare()
        ? standardUncertainty
        : working.fromSi(
            standardUncertainty * quantity.unit().scale(), quantity.unit().dimension());
  }
}
