package org.hullsum.quadrature;

/**
 * Smooth functions on the unit square; the integrand may kink or jump where one of them changes
 * sign, and is smooth between.
 *
 * <p>A function that touches zero without changing sign needs no mention. In a direction declared
 * periodic the functions are periodic too.
 */
public interface SwitchFunctions {
  /** Number of functions, 0 where the integrand is smooth throughout. */
  int count();

  /**
   * Evaluates all functions at {@code count} points.
   *
   * @param count number of points, 1 to {@link SquareIntegrand#BLOCK}
   * @param u first parameters, in [0, 1]
   * @param v second parameters, in [0, 1]
   * @param values receives function {@code k} at point {@code i} in {@code values[k][i]}
   */
  void evaluate(int count, double[] u, double[] v, double[][] values);

  /** No switches: the integrand is smooth. */
  static SwitchFunctions none() {
    return NoSwitches.INSTANCE;
  }
}
