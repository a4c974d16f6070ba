package org.hullsum.geometry;

/** A point of a plane, or a vector in it. */
record PlanePoint(double x, double y) {
  PlanePoint minus(PlanePoint other) {
    return new PlanePoint(x - other.x, y - other.y);
  }

  /** Twice the signed area of the triangle from the origin. */
  double cross(PlanePoint other) {
    return x * other.y - y * other.x;
  }

  double norm() {
    return Math.hypot(x, y);
  }

  /** Twice the signed area of the triangle of three points; positive if they turn left. */
  static double turn(PlanePoint a, PlanePoint b, PlanePoint c) {
    return b.minus(a).cross(c.minus(a));
  }
}
