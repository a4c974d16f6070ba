package org.hullsum.quadrature;

import java.util.concurrent.atomic.AtomicReferenceArray;

/**
 * The Gauss–Legendre rule of n nodes on [0, 1]: exact on polynomials up to degree 2n − 1.
 *
 * <p>Nodes by Newton's iteration on the three-term recurrence from the asymptotic guess cos(π(i −
 * 1/4)/(n + 1/2)), to about one rounding; weights 1/((1 − x²) P_n'(x)²) on [0, 1] (Davis and
 * Rabinowitz, <i>Methods of Numerical Integration</i>, 2nd ed., section 2.7). Cost O(n²), once for
 * each n. Immutable.
 */
public final class GaussRule implements DirectionRule {
  /** The largest rule kept. */
  public static final int LARGEST = 128;

  private static final int NEWTON_STEPS = 20;
  private static final int LARGEST_IN_TENSOR = 44;
  private static final AtomicReferenceArray<GaussRule> KNOWN =
      new AtomicReferenceArray<>(LARGEST + 1);

  private final double[] nodes;
  private final double[] weights;
  private final double[][] topModes;
  private final double[][] middleModes;

  private GaussRule(int size) {
    nodes = new double[size];
    weights = new double[size];
    for (int i = 0; i < (size + 1) / 2; i++) {
      // Solved for 1 − x, so that nodes near the ends keep their relative accuracy.
      double x = Math.cos(Math.PI * (i + 0.75) / (size + 0.5));
      for (int step = 0; step < NEWTON_STEPS; step++) {
        double[] p = legendreWithDerivative(size, x);
        double change = p[0] / p[1];
        x -= change;
        if (Math.abs(change) <= Math.ulp(x)) {
          break;
        }
      }
      if (2 * i + 1 == size) {
        x = 0;
      }
      double slope = legendreWithDerivative(size, x)[1];
      double weight = 1 / ((1 - x) * (1 + x) * slope * slope);
      nodes[i] = 0.5 * (1 - x);
      nodes[size - 1 - i] = 0.5 * (1 + x);
      weights[i] = weight;
      weights[size - 1 - i] = weight;
    }
    topModes = new double[][] {mode(size - 1), mode(Math.max(0, size - 2))};
    middleModes = new double[][] {mode(size / 2), mode(Math.max(0, size / 2 - 1))};
  }

  /**
   * The rule of {@code size} nodes.
   *
   * @throws IllegalArgumentException unless 1 ≤ size ≤ {@link #LARGEST}
   */
  public static GaussRule of(int size) {
    if (size < 1 || size > LARGEST) {
      throw new IllegalArgumentException(
          "Gauss rule of " + size + " nodes; 1 to " + LARGEST + " are kept");
    }
    GaussRule known = KNOWN.get(size);
    if (known == null) {
      known = new GaussRule(size);
      KNOWN.set(size, known);
    }
    return known;
  }

  /** Node i, ascending in (0, 1). */
  public double node(int i) {
    return nodes[i];
  }

  /** Weight of node i; the weights add to 1. */
  public double weight(int i) {
    return weights[i];
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
    return size() - 1 - size() / 2;
  }

  @Override
  public double reach() {
    return size() + 1;
  }

  @Override
  public double sizeForHigherTop(double degrees) {
    return size() + degrees;
  }

  @Override
  public double reachPerTop() {
    return 1;
  }

  /** Even sizes only: an odd rule has a node in the middle, where formulas like to be 0/0. */
  @Override
  public GaussRule ofSize(int size) {
    return of(Math.min(size + (size & 1), LARGEST));
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
      double x = (m + 0.5) / count;
      double sum = 0;
      for (int i = 0; i < n; i++) {
        // Barycentric weights of Gauss–Legendre nodes: ± sqrt(w (1 − x²)), Wang and Xiang 2012.
        double bary = Math.sqrt(weights[i] * nodes[i] * (1 - nodes[i]));
        double gap = x - nodes[i];
        matrix[m][i] = ((i & 1) == 0 ? bary : -bary) / (gap == 0 ? Double.MIN_NORMAL : gap);
        sum += matrix[m][i];
      }
      for (int i = 0; i < n; i++) {
        matrix[m][i] /= sum;
      }
    }
    return matrix;
  }

  private double[] mode(int degree) {
    double[] mode = new double[size()];
    for (int i = 0; i < mode.length; i++) {
      double p = legendreWithDerivative(degree, 2 * nodes[i] - 1)[0];
      mode[i] = (2 * degree + 1) * weights[i] * p;
    }
    return mode;
  }

  /** P_n(x) and its derivative, −1 < x < 1. */
  private static double[] legendreWithDerivative(int degree, double x) {
    double previous = 0;
    double value = 1;
    for (int k = 1; k <= degree; k++) {
      double next = ((2 * k - 1) * x * value - (k - 1) * previous) / k;
      previous = value;
      value = next;
    }
    return new double[] {value, degree * (x * value - previous) / ((x - 1) * (x + 1))};
  }
}
