package org.hullsum.quadrature;

/**
 * The trapezoidal rule of n equal steps for functions of period 1: exact on every sine and cosine
 * whose wave number is not a multiple of n, hence geometric convergence on analytic integrands
 * (Trefethen and Weideman, "The exponentially convergent trapezoidal rule", SIAM Review 56, 2014).
 *
 * <p>The grid is shifted by an amount that depends on n, so that two rules share no node and none
 * falls on the seam or on quarter turns. Immutable; cost O(n) to make.
 */
final class TrapezoidRule implements DirectionRule {
  private static final int MODES = 4;
  private static final int LARGEST_IN_TENSOR = 96;

  /** The golden section, the number worst approximated by fractions. */
  private static final double GOLDEN = 0.6180339887498949;

  private final double[] nodes;
  private final double[] weights;
  private final double[][] topModes;
  private final double[][] middleModes;
  private final double shift;

  TrapezoidRule(int size) {
    double turn = GOLDEN * size;
    shift = 0.1 + 0.8 * (turn - Math.floor(turn));
    nodes = new double[size];
    weights = new double[size];
    for (int i = 0; i < size; i++) {
      nodes[i] = (i + shift) / size;
      weights[i] = 1.0 / size;
    }
    topModes = modes(size / 2);
    middleModes = modes(size / 4);
  }

  @Override
  public int size() {
    return nodes.length;
  }

  @Override
  public double[] nodes() {
    return nodes;
  }

  @Override
  public double[] weights() {
    return weights;
  }

  @Override
  public double[][] topModes() {
    return topModes;
  }

  @Override
  public double[][] middleModes() {
    return middleModes;
  }

  @Override
  public double modeDistance() {
    return size() / 2 - size() / 4;
  }

  @Override
  public double reach() {
    return size() - size() / 2;
  }

  @Override
  public double sizeForHigherTop(double degrees) {
    return size() + 2 * degrees;
  }

  @Override
  public double reachPerTop() {
    return 1;
  }

  @Override
  public TrapezoidRule ofSize(int size) {
    return new TrapezoidRule(size);
  }

  @Override
  public int largestSize() {
    return LARGEST_IN_TENSOR;
  }

  @Override
  public double[][] resampling(int count) {
    int n = size();
    double[][] matrix = new double[count][n];
    for (int m = 0; m < count; m++) {
      for (int i = 0; i < n; i++) {
        matrix[m][i] = dirichlet((m + 0.5) / count - nodes[i]);
      }
    }
    return matrix;
  }

  /** The trigonometric interpolant of 1 at node 0 and 0 at the others, at distance {@code gap}. */
  private double dirichlet(double gap) {
    int n = size();
    double half = Math.PI * gap;
    double below = (n & 1) == 1 ? Math.sin(half) : Math.tan(half);
    return Math.abs(below) < Double.MIN_NORMAL ? 1 : Math.sin(n * half) / (n * below);
  }

  private double[][] modes(int highest) {
    double[][] modes = new double[2 * MODES][size()];
    for (int m = 0; m < MODES; m++) {
      int wave = Math.max(1, highest - m);
      double scale = (2 * wave == size() ? 1.0 : 2.0) / size();
      for (int i = 0; i < size(); i++) {
        double angle = 2 * Math.PI * wave * (i + 0.0) / size();
        modes[2 * m][i] = scale * Math.cos(angle);
        modes[2 * m + 1][i] = scale * Math.sin(angle);
      }
    }
    return modes;
  }
}
