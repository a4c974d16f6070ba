package org.hullsum.quadrature;

import java.util.List;

/**
 * Integrates vector functions over the unit square with error bounds that hold.
 *
 * <p>Smooth integrands cost one small tensor rule and a second, larger one to check it: the
 * trapezoidal rule in periodic directions, Gauss–Legendre in the others. Where the integrand does
 * not decay geometrically the square is halved, one direction at a time.
 */
public final class SquareIntegrator {
  private SquareIntegrator() {}

  /** Integrates every component of the problem's integrand. */
  public static Integral[] integrate(SquareProblem problem) {
    RegionIntegrator watched = regions(problem, problem.switches(), 0);
    Integral[] integrals = watched.integrate();
    if (watched.surprise().isEmpty()) {
      return integrals;
    }
    return regions(problem, SwitchFunctions.none(), watched.evaluations()).integrate();
  }

  private static RegionIntegrator regions(
      SquareProblem problem, SwitchFunctions watched, long spent) {
    return new RegionIntegrator(
        List.of(new PlainCell(problem, watched)),
        problem.accuracy(),
        problem.accurateComponents(),
        spent);
  }
}
