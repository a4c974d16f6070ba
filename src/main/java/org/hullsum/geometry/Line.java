package org.hullsum.geometry;

import org.hullsum.numeric.Vector3;

/**
 * A straight line with two directions square to it, so that a point is on it where both products
 * with its offset from the origin vanish.
 *
 * @param origin where t = 0
 * @param direction of any length but zero
 * @param a of length one, square to the direction
 * @param b direction × a, of length one
 * @param reach how near counts as touching
 */
record Line(Vector3 origin, Vector3 direction, Vector3 a, Vector3 b, double reach) {
  static Line of(Vector3 origin, Vector3 direction, double reach) {
    Vector3 unit = direction.unit();
    double x = Math.abs(unit.x());
    double y = Math.abs(unit.y());
    double z = Math.abs(unit.z());
    Vector3 other = x <= y && x <= z ? Vector3.X : y <= z ? Vector3.Y : Vector3.Z;
    Vector3 a = unit.cross(other).unit();
    return new Line(origin, direction, a, unit.cross(a), reach);
  }

  double parameter(Vector3 point) {
    return point.minus(origin).dot(direction) / direction.dot(direction);
  }
}
