package org.hullsum.quadrature;

import java.util.List;
import java.util.Optional;

/**
 * Integrates vector functions over the unit square with error bounds that hold.
 *
 * <p>Smooth integrands cost one small tensor rule and a second, larger one to check it: the
 * trapezoidal rule in periodic directions, Gauss–Legendre in the others. Where the integrand does
 * not decay geometrically the square is halved, one direction at a time. Where it switches, the
 * square is first divided along the curves of the switch functions ({@link SwitchPartition}), and
 * each piece is smooth again; a curve that shows itself only during the integration is taken up and
 * the division made anew.
 */
public final class SquareIntegrator {
  /** How often the division is made anew before the curves are left to the halving. */
  private static final int DIVISIONS = 8;

  private SquareIntegrator() {}

  /** Integrates every component of the problem's integrand. */
  public static Integral[] integrate(SquareProblem problem) {
    if (problem.switches().count() == 0) {
      return regions(problem, plain(problem, SwitchFunctions.none()), 0).integrate();
    }
    SwitchSearch search = new SwitchSearch(problem.switches());
    SwitchPartition partition = SwitchPartition.of(problem, search);
    long spent = 0;
    boolean divide = search.found();
    for (int division = 0; division < DIVISIONS; division++) {
      Optional<List<Cell>> cells =
          divide ? partition.cells() : Optional.of(plain(problem, problem.switches()));
      if (cells.isEmpty()) {
        break;
      }
      RegionIntegrator regions = regions(problem, cells.get(), spent);
      Integral[] integrals = regions.integrate();
      if (regions.surprise().isEmpty()) {
        return integrals;
      }
      spent = regions.evaluations();
      partition.consider(regions.surprise().get());
      divide = true;
    }
    return regions(problem, plain(problem, SwitchFunctions.none()), spent).integrate();
  }

  private static List<Cell> plain(SquareProblem problem, SwitchFunctions watched) {
    return List.of(new PlainCell(problem, watched));
  }

  private static RegionIntegrator regions(SquareProblem problem, List<Cell> cells, long spent) {
    return new RegionIntegrator(cells, problem.accuracy(), problem.accurateComponents(), spent);
  }
}
