package org.hullsum.units;

import java.util.Objects;

/**
 * A number with its unit as written.
 *
 * @param value the number in {@code unit}
 * @param unit the stated unit; {@link Unit#ONE} with {@code bare} where none was written
 * @param bare true where no unit was written: the number is then in the working units of whatever
 *     dimension is needed
 */
public record Quantity(double value, Unit unit, boolean bare) {
  public Quantity {
    Objects.requireNonNull(unit, "unit");
  }

  /** In working units; a bare number is returned as it stands. */
  public double in(WorkingUnits working) {
    return bare ? value : working.fromSi(unit.toSi(value), unit.dimension());
  }
}
