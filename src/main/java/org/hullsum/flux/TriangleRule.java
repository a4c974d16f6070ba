package org.hullsum.flux;

import java.util.Arrays;

/**
 * A symmetric rule over a triangle: points by barycentric coordinates, weights that sum to 1.
 *
 * <p>Degree 5 on 7 points: J. Radon, "Zur mechanischen Kubatur", Monatshefte für Mathematik 52
 * (1948) 286–300. Degree 8 on 16 points: D. A. Dunavant, "High degree efficient symmetrical
 * Gaussian quadrature rules for the triangle", Int. J. Numer. Methods Eng. 21 (1985) 1129–1148.
 */
final class TriangleRule {
  static final TriangleRule CENTROID = new TriangleRule(1, centre(1));

  static final TriangleRule DEGREE_2 = new TriangleRule(2, three(1.0 / 3, 1.0 / 6));

  private static final double NEAR = (6 - Math.sqrt(15)) / 21;

  static final TriangleRule DEGREE_5 =
      new TriangleRule(
          5,
          join(
              centre(9.0 / 40),
              three((155 - Math.sqrt(15)) / 1200, NEAR),
              three((155 + Math.sqrt(15)) / 1200, (6 + Math.sqrt(15)) / 21)));

  /** Degree 2 on some of the points of degree 5, the only one for them; the last three count 0. */
  static final TriangleRule WITHIN_5 = within();

  static final TriangleRule DEGREE_8 =
      new TriangleRule(
          8,
          join(
              centre(0.144315607677787),
              three(0.095091634267285, 0.459292588292723),
              three(0.103217370534718, 0.170569307751760),
              three(0.032458497623198, 0.050547228317031),
              six(0.027230314174435, 0.008394777409958, 0.263112829634638)));

  /** The mean of a barycentric coordinate's square is 1/6. */
  private static TriangleRule within() {
    double weight = 1 / (18 * (6 * NEAR * NEAR - 4 * NEAR + 2.0 / 3));
    return new TriangleRule(
        2, join(centre(1 - 3 * weight), three(weight, NEAR), three(0, (6 + Math.sqrt(15)) / 21)));
  }

  private final int degree;
  private final double[] seconds;
  private final double[] thirds;
  private final double[] weights;

  private TriangleRule(int degree, double[]... points) {
    this.degree = degree;
    this.seconds = Arrays.stream(points).mapToDouble(p -> p[0]).toArray();
    this.thirds = Arrays.stream(points).mapToDouble(p -> p[1]).toArray();
    this.weights = Arrays.stream(points).mapToDouble(p -> p[2]).toArray();
  }

  private static double[][] centre(double weight) {
    return new double[][] {{1.0 / 3, 1.0 / 3, weight}};
  }

  /** The points two of whose coordinates are {@code b}. */
  private static double[][] three(double weight, double b) {
    return new double[][] {{b, b, weight}, {1 - 2 * b, b, weight}, {b, 1 - 2 * b, weight}};
  }

  private static double[][] six(double weight, double b, double c) {
    double a = 1 - b - c;
    return new double[][] {
      {a, b, weight}, {b, a, weight}, {a, c, weight},
      {c, a, weight}, {b, c, weight}, {c, b, weight}
    };
  }

  private static double[][] join(double[][]... parts) {
    return Arrays.stream(parts).flatMap(Arrays::stream).toArray(double[][]::new);
  }

  /** Polynomials up to this total degree are integrated exactly. */
  int degree() {
    return degree;
  }

  int size() {
    return weights.length;
  }

  /** The barycentric coordinate of point k that belongs to the second corner. */
  double second(int k) {
    return seconds[k];
  }

  /** That of the third corner. */
  double third(int k) {
    return thirds[k];
  }

  double weight(int k) {
    return weights[k];
  }
}
