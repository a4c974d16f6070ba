package org.hullsum.model;

import java.util.Objects;
import java.util.OptionalDouble;

/**
 * The tolerance of a balance; with both figures the larger holds, with neither the default of the
 * check.
 *
 * @param absolute a rate in working units
 * @param relative a fraction of the throughput
 * @param coverage the coverage probability of expanded uncertainties, between 0 and 1
 */
public record Tolerances(OptionalDouble absolute, OptionalDouble relative, double coverage) {
  /** The coverage probability unless stated. */
  public static final double USUAL_COVERAGE = 0.95;

  public static final Tolerances NONE =
      new Tolerances(OptionalDouble.empty(), OptionalDouble.empty(), USUAL_COVERAGE);

  public Tolerances {
    Objects.requireNonNull(absolute, "absolute");
    Objects.requireNonNull(relative, "relative");
    if (!(coverage > 0 && coverage < 1)) {
      throw new IllegalArgumentException("coverage " + coverage);
    }
  }

  /** Whether any tolerance is stated. */
  public boolean stated() {
    return absolute.isPresent() || relative.isPresent();
  }
}
