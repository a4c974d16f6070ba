package org.hullsum.mesh;

import org.hullsum.numeric.Vector3;

/**
 * Sums the solid angles of triangles seen from one point, with a bound on the rounding.
 *
 * <p>With a, b, c the corners less the point, tan(Ω/2) = a · (b × c) / (abc + (a·b) c + (b·c) a +
 * (c·a) b), positive where the normal points away from the point (A. Van Oosterom and J. Strackee,
 * "The solid angle of a plane triangle", IEEE Trans. Biomed. Eng. 30 (1983) 125–126). The angle is
 * not defined from a point of the triangle itself: there the bound is that of any value, 4π.
 */
final class SolidAngleAccumulator {
  /** Roundings of numerator and denominator, relative to abc: fewer than this many. */
  private static final double ROUNDINGS = 32 * Math.ulp(1.0);

  /** Between any two values of one triangle's angle. */
  private static final double ANY = 4 * Math.PI;

  private final double x;
  private final double y;
  private final double z;
  private double sum;
  private double error;
  private double magnitude;
  private long count;

  SolidAngleAccumulator(Vector3 point) {
    this.x = point.x();
    this.y = point.y();
    this.z = point.z();
  }

  void add(TriangleMesh mesh, int triangle) {
    int i = mesh.corner(triangle, 0);
    int j = mesh.corner(triangle, 1);
    int k = mesh.corner(triangle, 2);
    double ax = mesh.x(i) - x;
    double ay = mesh.y(i) - y;
    double az = mesh.z(i) - z;
    double bx = mesh.x(j) - x;
    double by = mesh.y(j) - y;
    double bz = mesh.z(j) - z;
    double cx = mesh.x(k) - x;
    double cy = mesh.y(k) - y;
    double cz = mesh.z(k) - z;
    double a = Math.sqrt(ax * ax + ay * ay + az * az);
    double b = Math.sqrt(bx * bx + by * by + bz * bz);
    double c = Math.sqrt(cx * cx + cy * cy + cz * cz);
    double above = ax * (by * cz - bz * cy) + ay * (bz * cx - bx * cz) + az * (bx * cy - by * cx);
    double below =
        a * b * c
            + (ax * bx + ay * by + az * bz) * c
            + (bx * cx + by * cy + bz * cz) * a
            + (cx * ax + cy * ay + cz * az) * b;
    double rounding = ROUNDINGS * a * b * c;
    enter(above, below, rounding);
  }

  private void enter(double above, double below, double rounding) {
    count++;
    double length = Math.hypot(above, below);
    boolean within = below <= rounding && Math.abs(above) <= rounding;
    if (within || length <= 4 * rounding) {
      // The point is in the triangle, or cannot be told from one that is.
      error += ANY;
      return;
    }
    double angle = 2 * Math.atan2(above, below);
    sum += angle;
    magnitude += Math.abs(angle);
    error += Math.min(ANY, 4 * rounding / length);
  }

  /** ΣΩ, in steradians. */
  double sum() {
    return sum;
  }

  /** A bound on what rounding did to the sum. */
  double error() {
    return error + count * Math.ulp(1.0) * magnitude;
  }
}
