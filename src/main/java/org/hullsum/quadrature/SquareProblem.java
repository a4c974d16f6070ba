package org.hullsum.quadrature;

import java.util.Objects;

/**
 * An integral over the unit square, to be computed by {@link SquareIntegrator}.
 *
 * @param integrand the function
 * @param switches functions where whose signs change the integrand may kink or jump
 * @param periodicU whether the integrand, with all its derivatives, is periodic in u with period 1
 * @param periodicV the same in v
 * @param accuracy the accuracy asked for
 * @param accurateComponents the first so many components are to reach the accuracy; the others come
 *     along, each with a bound of its own
 */
public record SquareProblem(
    SquareIntegrand integrand,
    SwitchFunctions switches,
    boolean periodicU,
    boolean periodicV,
    Accuracy accuracy,
    int accurateComponents) {
  public SquareProblem {
    Objects.requireNonNull(switches, "switches");
    Objects.requireNonNull(accuracy, "accuracy");
    if (accurateComponents < 1 || accurateComponents > integrand.components()) {
      throw new IllegalArgumentException(
          accurateComponents + " accurate components of " + integrand.components());
    }
  }

  /** A smooth, non-periodic integrand all of whose components are to reach the accuracy. */
  public static SquareProblem smooth(SquareIntegrand integrand, Accuracy accuracy) {
    return new SquareProblem(
        integrand, SwitchFunctions.none(), false, false, accuracy, integrand.components());
  }
}
