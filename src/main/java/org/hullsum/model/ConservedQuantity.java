package org.hullsum.model;

import java.util.Objects;
import org.hullsum.units.Unit;
import org.hullsum.units.WorkingUnits;

/**
 * What is conserved.
 *
 * @param name such as {@code volume}, or the case's own text
 * @param rateUnit the unit of rates in which every flux is reported
 */
public record ConservedQuantity(String name, Unit rateUnit) {
  public ConservedQuantity {
    Objects.requireNonNull(name, "name");
    Objects.requireNonNull(rateUnit, "rateUnit");
  }

  /** The factor that turns a rate in working units into the reported unit. */
  public double reportedPerWorking(WorkingUnits working) {
    return working.scale(rateUnit.dimension()) / rateUnit.scale();
  }
}
