package org.hullsum.quadrature;

/**
 * A vector-valued function on the unit square, evaluated at blocks of points.
 *
 * <p>An implementation may keep scratch space: one integration calls it from one thread.
 */
public interface SquareIntegrand {
  /** The largest number of points asked for in one call; scratch space may be sized by it. */
  int BLOCK = 1024;

  /** Number of components, at least 1. */
  int components();

  /**
   * Evaluates the components at {@code count} points.
   *
   * @param count number of points, 1 to {@link #BLOCK}
   * @param u first parameters, in [0, 1]; entries from {@code count} on are not to be read
   * @param v second parameters, in [0, 1]
   * @param values receives component {@code c} of point {@code i} in {@code values[c][i]}
   */
  void evaluate(int count, double[] u, double[] v, double[][] values);
}
