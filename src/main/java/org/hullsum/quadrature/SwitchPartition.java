package org.hullsum.quadrature;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;

/**
 * Divides the unit square along switch curves into strips on which the integrand is smooth.
 *
 * <p>Rows run in the direction in which their structure changes less often. The outer coordinates
 * at which the structure changes (a curve turns back, meets another, or reaches a side) are found
 * by bisection; between two of them the rows are alike, and each pair of neighbouring curves bounds
 * a {@link StripCell}.
 */
final class SwitchPartition {
  private static final int SAMPLES = 65;

  /** The first and last row stand this far off the sides, where charts may shrink to a point. */
  private static final double SIDE = 0x1p-40;

  private static final double MERGED = 0x1p-46;

  /** More cells than this are no structure but noise. */
  private static final int MOST_CELLS = 600;

  private final SquareProblem problem;
  private final RowRoots roots;
  private double[] outers;

  private SwitchPartition(SquareProblem problem, boolean rowsOfConstantU) {
    this.problem = problem;
    roots = new RowRoots(problem.switches(), rowsOfConstantU);
    outers = new double[SAMPLES];
    for (int i = 0; i < SAMPLES; i++) {
      outers[i] = Math.min(1 - SIDE, Math.max(SIDE, (double) i / (SAMPLES - 1)));
    }
  }

  static SwitchPartition of(SquareProblem problem, SwitchSearch search) {
    SwitchPartition partition = new SwitchPartition(problem, search.rowsOfConstantU());
    search.seeds().forEach(partition::consider);
    return partition;
  }

  /** Takes a place of unforeseen structure into the rows that are looked at. */
  void consider(ParameterPoint place) {
    double outer = roots.outerIsU() ? place.u() : place.v();
    if (outer > SIDE && outer < 1 - SIDE && Arrays.binarySearch(outers, outer) < 0) {
      outers = Arrays.copyOf(outers, outers.length + 1);
      outers[outers.length - 1] = outer;
      Arrays.sort(outers);
    }
  }

  /** The strips; empty where the structure is too rich to be told from noise. */
  Optional<List<Cell>> cells() {
    Signature signature = outer -> roots.at(outer).signature();
    long[] signatures = Arrays.stream(outers).mapToLong(signature::at).toArray();
    return Breakpoints.between(signature, outers, signatures)
        .map(SwitchPartition::merged)
        .flatMap(this::strips);
  }

  /**
   * Where curves cross, rounding shuffles their roots over a few neighbouring numbers: changes so
   * close together are one.
   */
  private static double[] merged(double[] critical) {
    int kept = 0;
    for (double one : critical) {
      if (kept == 0 || one - critical[kept - 1] > MERGED) {
        critical[kept++] = one;
      }
    }
    return Arrays.copyOf(critical, kept);
  }

  private Optional<List<Cell>> strips(double[] critical) {
    List<Cell> cells = new ArrayList<>();
    for (int i = 0; i <= critical.length; i++) {
      double from = i == 0 ? 0 : critical[i - 1];
      double to = i == critical.length ? 1 : critical[i];
      EndMap map = EndMap.of(i > 0, i < critical.length);
      Row like = roots.at(from + 0.5 * (to - from));
      for (int strip = 0; strip < like.strips() && to > from; strip++) {
        cells.add(new StripCell(problem, roots, from, to, map, strip, like));
      }
      if (cells.size() > MOST_CELLS) {
        return Optional.empty();
      }
    }
    return Optional.of(cells);
  }
}
