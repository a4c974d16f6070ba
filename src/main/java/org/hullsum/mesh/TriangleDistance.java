package org.hullsum.mesh;

import org.hullsum.numeric.Vector3;

/** How far a point is from a triangle. */
final class TriangleDistance {
  private TriangleDistance() {}

  /** From the plane where the foot is in the triangle, else from the nearest side. */
  static double of(TriangleMesh mesh, int triangle, Vector3 point) {
    Vector3 a = mesh.vertex(mesh.corner(triangle, 0)).minus(point);
    Vector3 b = mesh.vertex(mesh.corner(triangle, 1)).minus(point);
    Vector3 c = mesh.vertex(mesh.corner(triangle, 2)).minus(point);
    Vector3 n = b.minus(a).cross(c.minus(a));
    boolean within =
        n.dot(b.minus(a).cross(a)) <= 0
            && n.dot(c.minus(b).cross(b)) <= 0
            && n.dot(a.minus(c).cross(c)) <= 0;
    double length = n.norm();
    if (within && length > 0) {
      return Math.abs(a.dot(n)) / length;
    }
    return Math.min(fromSegment(a, b), Math.min(fromSegment(b, c), fromSegment(c, a)));
  }

  /** The distance of the origin from a segment. */
  private static double fromSegment(Vector3 a, Vector3 b) {
    Vector3 ab = b.minus(a);
    double square = ab.dot(ab);
    double along = square > 0 ? Math.max(0, Math.min(1, -a.dot(ab) / square)) : 0;
    return a.plus(ab.times(along)).norm();
  }
}
