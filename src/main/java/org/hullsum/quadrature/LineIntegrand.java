package org.hullsum.quadrature;

/**
 * A vector-valued function of one variable, evaluated at blocks of points.
 *
 * <p>An implementation may keep scratch space: one integration calls it from one thread.
 */
public interface LineIntegrand {
  /** Number of components, at least 1. */
  int components();

  /**
   * Evaluates the components at {@code count} points.
   *
   * @param count number of points, 1 to {@link SquareIntegrand#BLOCK}
   * @param t positions; entries from {@code count} on are not to be read
   * @param values receives component {@code c} of point {@code i} in {@code values[c][i]}
   */
  void evaluate(int count, double[] t, double[][] values);
}
