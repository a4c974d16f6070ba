package org.hullsum.flux;

import java.util.Arrays;
import java.util.OptionalInt;
import org.hullsum.numeric.Vector3;
import org.hullsum.quadrature.GaussRule;

/**
 * Integrals of densities along straight rays, ∫_0^1 g(p + s(r − p)) s^k ds, for many rays at once:
 * k = 2 for cones, 0 for columns.
 *
 * <p>For polynomials one Gauss rule is exact. Otherwise two rules of different sizes are compared;
 * where they differ by more than the tolerance, or a density switches along the ray, the ray is
 * done by itself, adaptively. The error of each ray comes with it. Not thread-safe.
 */
final class RayIntegrals {
  /** Sizes of the smaller and the larger rule, by level. */
  private static final int[][] LEVELS = {{6, 9}, {10, 14}, {16, 22}, {26, 36}};

  /** The level for a first look. */
  static final int COARSE = 1;

  /** Points evaluated in one go. */
  static final int BLOCK = 4096;

  private final Densities densities;
  private final int power;
  private final RayRefiner refiner;
  private final GaussRule[] rules;
  private final double tolerance;
  private final double[][] points = new double[3][BLOCK];
  private final double[][] values;
  private final double[][] switchValues;
  private final double[][] tips = new double[3][BLOCK];
  private final double[][] tipValues;

  /**
   * @param power k
   * @param level how large the rules are; of no account for polynomials
   * @param tolerance allowed error of a ray's integral of the first density
   */
  RayIntegrals(Densities densities, int power, int level, double tolerance) {
    this.densities = densities;
    this.power = power;
    this.tolerance = tolerance;
    this.rules = rules(densities, power, level);
    this.values = new double[densities.count()][BLOCK];
    this.switchValues = new double[densities.switchCount()][BLOCK];
    this.tipValues = new double[densities.switchCount()][BLOCK];
    this.refiner = new RayRefiner(densities, power, tolerance);
  }

  private static GaussRule[] rules(Densities densities, int power, int level) {
    if (densities.degree().isPresent()) {
      // n nodes are exact to degree 2n − 1.
      int nodes = (densities.degree().getAsInt() + power) / 2 + 1;
      if (nodes <= GaussRule.LARGEST) {
        return new GaussRule[] {GaussRule.of(nodes)};
      }
    }
    return new GaussRule[] {GaussRule.of(LEVELS[level][0]), GaussRule.of(LEVELS[level][1])};
  }

  /** The degree of the densities in x, y, z where they are polynomials that one rule does. */
  OptionalInt degree() {
    return rules.length == 1 ? densities.degree() : OptionalInt.empty();
  }

  /** Rows that {@link #integrate} writes: one per density, then ∫|g| s^k ds of the first, error. */
  static int rows(int densities) {
    return densities + 2;
  }

  /**
   * Integrates along rays.
   *
   * @param starts rows x, y, z of their starts p
   * @param ends rows x, y, z of their ends r
   * @param wanted the rays that count; the others are set to zero
   */
  void integrate(
      int count, double[][] starts, double[][] ends, boolean[] wanted, double[][] results) {
    int nodes = 0;
    for (GaussRule rule : rules) {
      nodes += rule.size();
    }
    int chunk = BLOCK / nodes;
    int[] rays = new int[chunk];
    int n = 0;
    for (int i = 0; i < count; i++) {
      if (wanted[i]) {
        rays[n++] = i;
      } else {
        for (double[] row : results) {
          row[i] = 0;
        }
      }
      if (n == chunk || (i == count - 1 && n > 0)) {
        integrate(rays, n, nodes, starts, ends, results);
        n = 0;
      }
    }
  }

  private void integrate(
      int[] rays, int n, int nodes, double[][] starts, double[][] ends, double[][] results) {
    place(rays, n, nodes, starts, ends);
    int total = n * nodes;
    densities.evaluate(total, points[0], points[1], points[2], values);
    if (densities.switchCount() > 0) {
      densities.evaluateSwitches(total, points[0], points[1], points[2], switchValues);
      for (int axis = 0; axis < 3; axis++) {
        for (int k = 0; k < n; k++) {
          tips[axis][2 * k] = starts[axis][rays[k]];
          tips[axis][2 * k + 1] = ends[axis][rays[k]];
        }
      }
      densities.evaluateSwitches(2 * n, tips[0], tips[1], tips[2], tipValues);
    }
    int errorRow = densities.count() + 1;
    for (int k = 0; k < n; k++) {
      int ray = rays[k];
      sum(k * nodes, ray, results);
      if (tolerance < Double.POSITIVE_INFINITY
          && (switches(k, nodes) || !(results[errorRow][ray] <= tolerance))) {
        Vector3 start = new Vector3(starts[0][ray], starts[1][ray], starts[2][ray]);
        Vector3 end = new Vector3(ends[0][ray], ends[1][ray], ends[2][ray]);
        refiner.refine(start, end, ray, results);
      }
    }
  }

  private void place(int[] rays, int n, int nodes, double[][] starts, double[][] ends) {
    for (int axis = 0; axis < 3; axis++) {
      for (int k = 0; k < n; k++) {
        double from = starts[axis][rays[k]];
        double span = ends[axis][rays[k]] - from;
        int at = k * nodes;
        for (GaussRule rule : rules) {
          for (int j = 0; j < rule.size(); j++) {
            points[axis][at++] = from + rule.node(j) * span;
          }
        }
      }
    }
  }

  private void sum(int first, int ray, double[][] results) {
    int count = densities.count();
    double error = 0;
    for (int k = 0; k < count; k++) {
      double previous = 0;
      double absolute = 0;
      int at = first;
      for (int r = 0; r < rules.length; r++) {
        GaussRule rule = rules[r];
        double sum = 0;
        absolute = 0;
        for (int j = 0; j < rule.size(); j++) {
          double s = rule.node(j);
          double term = rule.weight(j) * power(s) * values[k][at++];
          sum += term;
          absolute += Math.abs(term);
        }
        if (r == 0) {
          previous = sum;
        }
        results[k][ray] = sum;
      }
      if (k == 0) {
        error = Math.abs(results[0][ray] - previous);
        results[count][ray] = absolute;
      }
    }
    results[count + 1][ray] = error;
  }

  private double power(double s) {
    return power == 2 ? s * s : 1;
  }

  /** Whether a switch function changes sign among a ray's nodes, or between them and its ends. */
  private boolean switches(int ray, int nodes) {
    int first = ray * nodes;
    for (int f = 0; f < switchValues.length; f++) {
      double[] function = switchValues[f];
      double low = Double.POSITIVE_INFINITY;
      double high = Double.NEGATIVE_INFINITY;
      for (int j = first; j < first + nodes; j++) {
        low = Math.min(low, function[j]);
        high = Math.max(high, function[j]);
      }
      double atStart = tipValues[f][2 * ray];
      double atEnd = tipValues[f][2 * ray + 1];
      boolean steady = low > 0 ? Math.min(atStart, atEnd) >= 0 : Math.max(atStart, atEnd) <= 0;
      if (!(low > 0 || high < 0) || !steady) {
        return true;
      }
    }
    return false;
  }

  /** The smallest level whose error is within the tolerance on most of the given rays. */
  static int level(
      Densities densities, int power, double[][] starts, double[][] ends, double tolerance) {
    if (densities.degree().isPresent()) {
      return 0;
    }
    int count = ends[0].length;
    boolean[] all = new boolean[count];
    Arrays.fill(all, true);
    double[][] results = new double[rows(densities.count())][count];
    for (int level = 0; level < LEVELS.length - 1; level++) {
      // Without a tolerance no ray is refined here.
      new RayIntegrals(densities, power, level, Double.POSITIVE_INFINITY)
          .integrate(count, starts, ends, all, results);
      int poor = 0;
      for (double error : results[densities.count() + 1]) {
        poor += error <= tolerance ? 0 : 1;
      }
      if (poor * 20 <= count) {
        return level;
      }
    }
    return LEVELS.length - 1;
  }
}
