package org.hullsum.geometry;

import java.util.List;
import org.hullsum.numeric.Vector3;

/**
 * A stretch of a surface's boundary as a polyline, run through with the surface on its left seen
 * against the construction normal, as Stokes' theorem has it.
 *
 * @param points in order; the first is not repeated at the end of a closed curve
 * @param closed whether the last point joins the first
 * @param chart index of the chart in which the curve starts
 */
public record BoundaryCurve(List<Vector3> points, boolean closed, int chart) {
  public BoundaryCurve {
    points = List.copyOf(points);
    if (points.size() < 2) {
      throw new IllegalArgumentException("a curve of " + points.size() + " points");
    }
  }

  /** Sum of the lengths of the straight pieces. */
  public double length() {
    double length = 0;
    for (int i = 1; i < points.size(); i++) {
      length += points.get(i).minus(points.get(i - 1)).norm();
    }
    return closed ? length + points.get(0).minus(points.get(points.size() - 1)).norm() : length;
  }

  /** ½ ∮ r × dr: this curve's part of the vector area that the whole boundary encloses. */
  public Vector3 vectorArea() {
    Vector3 origin = points.get(0);
    Vector3 sum = Vector3.ZERO;
    for (int i = 2; i < points.size(); i++) {
      Vector3 before = points.get(i - 1).minus(origin);
      sum = sum.plus(before.cross(points.get(i).minus(origin)));
    }
    Vector3 open =
        closed ? Vector3.ZERO : origin.cross(points.get(points.size() - 1).minus(origin));
    return sum.plus(open).times(0.5);
  }
}
