package org.hullsum.geometry;

import java.util.List;
import org.hullsum.numeric.Vector3;

/**
 * A short stretch of boundary with the surface on its left.
 *
 * @param points in order, at least two
 * @param chart index of its chart
 */
record BoundaryPiece(List<Vector3> points, int chart) {
  BoundaryPiece {
    points = List.copyOf(points);
  }

  Vector3 start() {
    return points.get(0);
  }

  Vector3 end() {
    return points.get(points.size() - 1);
  }
}
