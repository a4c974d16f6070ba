package org.hullsum.geometry;

/** Points of the unit square at which formulas are looked at. */
final class ChartSamples {
  private ChartSamples() {}

  /** The middles of n × n equal cells: rows of u and of v. */
  static double[][] grid(int n) {
    double[][] at = new double[2][n * n];
    for (int i = 0; i < n * n; i++) {
      int row = i / n;
      int column = i % n;
      at[0][i] = (row + 0.5) / n;
      at[1][i] = (column + 0.5) / n;
    }
    return at;
  }
}
