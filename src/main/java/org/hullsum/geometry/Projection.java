package org.hullsum.geometry;

import java.util.Optional;
import org.hullsum.numeric.Vector3;

/**
 * A chart at a point, projected along a line: the inverse Jacobian Y of (a·r, b·r) by (u, v), and
 * the step of Newton's method to where the line crosses the tangent plane.
 */
record Projection(double uByA, double uByB, double vByA, double vByB, double stepU, double stepV) {
  /** Empty where the line lies in the tangent plane or the chart has none. */
  static Optional<Projection> of(ChartPoint at, Line line) {
    Vector3 a = line.a();
    Vector3 b = line.b();
    double ua = a.dot(at.tangentU());
    double ub = b.dot(at.tangentU());
    double va = a.dot(at.tangentV());
    double vb = b.dot(at.tangentV());
    double determinant = ua * vb - va * ub;
    if (!(Math.abs(determinant) > 0) || Double.isInfinite(determinant)) {
      return Optional.empty();
    }
    Vector3 offset = at.position().minus(line.origin());
    double fa = a.dot(offset);
    double fb = b.dot(offset);
    double uByA = vb / determinant;
    double uByB = -va / determinant;
    double vByA = -ub / determinant;
    double vByB = ua / determinant;
    return Optional.of(
        new Projection(uByA, uByB, vByA, vByB, -(uByA * fa + uByB * fb), -(vByA * fa + vByB * fb)));
  }
}
