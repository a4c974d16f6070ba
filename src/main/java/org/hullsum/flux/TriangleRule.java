package org.hullsum.flux;

import java.util.ArrayList;
import java.util.List;

/**
 * A symmetric rule over a triangle: points by barycentric coordinates, weights that sum to 1.
 *
 * <p>Degree 5 on 7 points: J. Radon, "Zur mechanischen Kubatur", Monatshefte für Mathematik 52
 * (1948) 286–300. Degree 8 on 16 points: D. A. Dunavant, "High degree efficient symmetrical
 * Gaussian quadrature rules for the triangle", Int. J. Numer. Methods Eng. 21 (1985) 1129–1148.
 */
final class TriangleRule {
  static final TriangleRule CENTROID = new TriangleRule(1).centre(1);

  static final TriangleRule DEGREE_5 =
      new TriangleRule(5)
          .centre(9.0 / 40)
          .three((155 - Math.sqrt(15)) / 1200, (6 - Math.sqrt(15)) / 21)
          .three((155 + Math.sqrt(15)) / 1200, (6 + Math.sqrt(15)) / 21);

  static final TriangleRule DEGREE_8 =
      new TriangleRule(8)
          .centre(0.144315607677787)
          .three(0.095091634267285, 0.459292588292723)
          .three(0.103217370534718, 0.170569307751760)
          .three(0.032458497623198, 0.050547228317031)
          .six(0.027230314174435, 0.008394777409958, 0.263112829634638);

  private final int degree;
  private final List<double[]> points = new ArrayList<>();

  private TriangleRule(int degree) {
    this.degree = degree;
  }

  private TriangleRule centre(double weight) {
    return add(1.0 / 3, 1.0 / 3, weight);
  }

  /** The points two of whose coordinates are {@code b}. */
  private TriangleRule three(double weight, double b) {
    return add(b, b, weight).add(1 - 2 * b, b, weight).add(b, 1 - 2 * b, weight);
  }

  private TriangleRule six(double weight, double b, double c) {
    double a = 1 - b - c;
    return add(a, b, weight)
        .add(b, a, weight)
        .add(a, c, weight)
        .add(c, a, weight)
        .add(b, c, weight)
        .add(c, b, weight);
  }

  private TriangleRule add(double second, double third, double weight) {
    points.add(new double[] {second, third, weight});
    return this;
  }

  /** Polynomials up to this total degree are integrated exactly. */
  int degree() {
    return degree;
  }

  int size() {
    return points.size();
  }

  /** The barycentric coordinate of point k that belongs to the second corner. */
  double second(int k) {
    return points.get(k)[0];
  }

  /** That of the third corner. */
  double third(int k) {
    return points.get(k)[1];
  }

  double weight(int k) {
    return points.get(k)[2];
  }
}
