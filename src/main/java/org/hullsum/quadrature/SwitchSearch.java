package org.hullsum.quadrature;

import java.util.ArrayList;
import java.util.List;

/**
 * Looks for sign changes of switch functions on the unit square: on a grid, and between its points
 * wherever a function bends toward zero, so that a small closed curve is found as well.
 */
final class SwitchSearch {
  private static final int INTERVALS = 48;
  private static final int STEPS = 60;
  private static final double SMALLEST_STEP = 1e-9;
  private static final int[][] AROUND = {
    {-1, -1}, {-1, 0}, {-1, 1}, {0, -1}, {0, 1}, {1, -1}, {1, 0}, {1, 1}
  };

  private final SwitchFunctions switches;
  private final double[][][] grid;
  private final double[] u = new double[SquareIntegrand.BLOCK];
  private final double[] v = new double[SquareIntegrand.BLOCK];
  private final double[][] block;
  private final List<ParameterPoint> seeds = new ArrayList<>();
  private boolean found;
  private int changesAlongU;
  private int changesAlongV;

  SwitchSearch(SwitchFunctions switches) {
    this.switches = switches;
    block = new double[switches.count()][SquareIntegrand.BLOCK];
    grid = new double[switches.count()][INTERVALS + 1][INTERVALS + 1];
    fill();
    for (double[][] one : grid) {
      look(one);
    }
    for (int k = 0; k < grid.length; k++) {
      descend(k);
    }
  }

  /** Whether any function changes sign. */
  boolean found() {
    return found || !seeds.isEmpty();
  }

  /** Places inside curves that the grid alone does not show. */
  List<ParameterPoint> seeds() {
    return List.copyOf(seeds);
  }

  /** Whether the structure of the rows of constant u changes no more often than of constant v. */
  boolean rowsOfConstantU() {
    return changesAlongU <= changesAlongV;
  }

  private void fill() {
    int pending = 0;
    int done = 0;
    int total = (INTERVALS + 1) * (INTERVALS + 1);
    for (int n = 0; n < total; n++) {
      u[pending] = place(n / (INTERVALS + 1));
      v[pending++] = place(n % (INTERVALS + 1));
      if (pending == SquareIntegrand.BLOCK || n == total - 1) {
        switches.evaluate(pending, u, v, block);
        for (int k = 0; k < grid.length; k++) {
          for (int i = 0; i < pending; i++) {
            int at = done + i;
            grid[k][at / (INTERVALS + 1)][at % (INTERVALS + 1)] = block[k][i];
          }
        }
        done += pending;
        pending = 0;
      }
    }
  }

  private static double place(int i) {
    return (double) i / INTERVALS;
  }

  private void look(double[][] s) {
    int[] inRow = new int[INTERVALS + 1];
    int[] inColumn = new int[INTERVALS + 1];
    for (int i = 0; i <= INTERVALS; i++) {
      for (int j = 0; j <= INTERVALS; j++) {
        boolean sign = s[i][j] >= 0;
        if (j > 0 && s[i][j - 1] >= 0 != sign) {
          inRow[i]++;
        }
        if (i > 0 && s[i - 1][j] >= 0 != sign) {
          inColumn[j]++;
        }
      }
    }
    for (int i = 0; i <= INTERVALS; i++) {
      found |= inRow[i] > 0 || inColumn[i] > 0;
      if (i > 1 && i < INTERVALS) {
        changesAlongU += inRow[i] != inRow[i - 1] ? 1 : 0;
        changesAlongV += inColumn[i] != inColumn[i - 1] ? 1 : 0;
      }
    }
  }

  /** From every least |s| among grid neighbours, when all are of one sign and it is near zero. */
  private void descend(int k) {
    for (int i = 0; i <= INTERVALS; i++) {
      for (int j = 0; j <= INTERVALS; j++) {
        if (isLeast(grid[k], i, j)) {
          descend(k, place(i), place(j), grid[k][i][j]);
        }
      }
    }
  }

  private static boolean isLeast(double[][] s, int i, int j) {
    double here = Math.abs(s[i][j]);
    if (here == 0) {
      return false;
    }
    double largest = 0;
    for (int[] step : AROUND) {
      int a = i + step[0];
      int b = j + step[1];
      if (a < 0 || b < 0 || a > INTERVALS || b > INTERVALS) {
        continue;
      }
      if (s[a][b] >= 0 != s[i][j] >= 0 || Math.abs(s[a][b]) < here) {
        return false;
      }
      largest = Math.max(largest, Math.abs(s[a][b]) - here);
    }
    return here <= largest;
  }

  private void descend(int k, double startU, double startV, double start) {
    double bestU = startU;
    double bestV = startV;
    double best = Math.abs(start);
    double step = 0.5 / INTERVALS;
    for (int n = 0; n < STEPS && step > SMALLEST_STEP; n++) {
      int count = AROUND.length;
      for (int i = 0; i < count; i++) {
        u[i] = Math.min(1, Math.max(0, bestU + step * AROUND[i][0]));
        v[i] = Math.min(1, Math.max(0, bestV + step * AROUND[i][1]));
      }
      switches.evaluate(count, u, v, block);
      int lower = -1;
      for (int i = 0; i < count; i++) {
        if (block[k][i] >= 0 != start >= 0) {
          seeds.add(new ParameterPoint(u[i], v[i]));
          return;
        }
        if (Math.abs(block[k][i]) < best) {
          best = Math.abs(block[k][i]);
          lower = i;
        }
      }
      if (lower < 0) {
        step *= 0.5;
      } else {
        bestU = u[lower];
        bestV = v[lower];
      }
    }
  }
}
