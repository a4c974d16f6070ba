package org.hullsum.quadrature;

/**
 * A quadrature rule on [0, 1] for one direction of a tensor rule, with the functionals that tell
 * how fast the integrand's spectrum decays in that direction.
 *
 * <p>A mode functional m gives, as Σ m_i f(x_i), one coefficient of f in the rule's own basis
 * (Legendre polynomials of largest value 1, or sines and cosines). The modes called <i>top</i> are
 * the highest that the rule resolves, those called <i>middle</i> lie half-way down. Arrays are
 * shared and must not be written.
 */
interface DirectionRule {
  int size();

  /** Nodes, ascending in [0, 1]. */
  double[] nodes();

  /** Weights; they add to 1. */
  double[] weights();

  double[][] topModes();

  double[][] middleModes();

  /** How many degrees the top modes lie above the middle ones. */
  double modeDistance();

  /** How many degrees the lowest mode that the rule integrates wrongly lies above the top modes. */
  double reach();

  /** The size, unrounded, at which a rule of this kind has its top modes {@code degrees} higher. */
  double sizeForHigherTop(double degrees);

  /** Degrees of reach gained per degree by which the top modes rise. */
  double reachPerTop();

  /** A rule of the same kind with at least the given size. */
  DirectionRule ofSize(int size);

  /** The largest size at which refinement by a larger rule still pays. */
  int largestSize();

  /**
   * The matrix that takes values at the nodes to values at the midpoints of {@code count} equal
   * intervals, by interpolation: row m for midpoint m.
   */
  double[][] resampling(int count);
}
