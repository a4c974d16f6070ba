package org.hullsum.quadrature;

/**
 * A curvilinear quadrangle of a parameter domain, seen as the unit square of its own coordinates
 * (x, y): the integrand times the Jacobian of the map, smooth over the cell as far as is known.
 */
interface Cell {
  int components();

  /** Whether the integrand is periodic in x over the whole of [0, 1]. */
  boolean periodicX();

  boolean periodicY();

  /**
   * Evaluates integrand times Jacobian on a tensor grid.
   *
   * @param nx number of x coordinates
   * @param x ascending
   * @param ny number of y coordinates
   * @param y ascending
   * @param values receives component c at (x_i, y_j) in {@code values[c][i·ny + j]}
   * @return false where the cell turned out not to be what it was made for; {@link #surprise} then
   *     tells where, and the values mean nothing
   */
  boolean sample(int nx, double[] x, int ny, double[] y, double[][] values);

  /** Error of the cell's own boundary, by rounding, as part of its magnitude. */
  double rounding();

  /** A place of the parameter domain whose neighbourhood needs a closer look. */
  ParameterPoint surprise();

  /** The place of the parameter domain where the cell has the coordinates (x, y). */
  ParameterPoint place(double x, double y);
}
