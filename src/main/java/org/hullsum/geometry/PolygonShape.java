package org.hullsum.geometry;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.hullsum.expression.VectorExpression;
import org.hullsum.numeric.Vector3;

/**
 * A flat polygon, convex or not, normal by the right-hand rule along its points.
 *
 * @param points the corners, each once
 */
public record PolygonShape(List<VectorExpression> points) implements Shape {
  private static final String KEY = "points";

  public PolygonShape {
    points = List.copyOf(points);
  }

  @Override
  public Surface surface(Map<String, Double> parameters) throws SurfaceFault {
    Figures figures = new Figures(parameters);
    List<Vector3> corners = new ArrayList<>();
    for (VectorExpression point : points) {
      corners.add(figures.value(KEY, point));
    }
    List<Chart> charts = new ArrayList<>();
    for (PlanePolygon.Triangle t : PlanePolygon.of(KEY, flattened(corners)).triangles(KEY)) {
      VectorExpression a = points.get(t.a());
      VectorExpression b = points.get(t.b());
      VectorExpression c = points.get(t.c());
      VectorExpression position =
          new VectorExpression(
              TriangleChart.at(a.x(), b.x(), c.x()),
              TriangleChart.at(a.y(), b.y(), c.y()),
              TriangleChart.at(a.z(), b.z(), c.z()));
      charts.add(
          new Chart(position.simplified(), false, false, TriangleChart.rim(t, points.size())));
    }
    return new Surface("polygon", charts, Optional.empty());
  }

  /** The corners in the coordinates of their plane, counter-clockwise. */
  private static List<PlanePoint> flattened(List<Vector3> corners) throws SurfaceFault {
    if (corners.size() < 3) {
      throw new SurfaceFault(
          KEY, "a polygon has at least three points, here are " + corners.size());
    }
    Vector3 origin = corners.get(0);
    Vector3 area = Vector3.ZERO;
    double size = 0;
    for (int i = 1; i < corners.size(); i++) {
      Vector3 next = corners.get((i + 1) % corners.size());
      area = area.plus(corners.get(i).minus(origin).cross(next.minus(origin)));
      size = Math.max(size, corners.get(i).minus(origin).norm());
    }
    if (area.norm() <= Tolerance.ROUNDING * size * size) {
      throw new SurfaceFault(
          KEY, "the points lie on one line, or the polygon crosses itself; it encloses no area");
    }
    Vector3 normal = area.unit();
    Vector3 first = square(normal);
    Vector3 second = normal.cross(first);
    List<PlanePoint> flat = new ArrayList<>();
    for (int i = 0; i < corners.size(); i++) {
      Vector3 offset = corners.get(i).minus(origin);
      double height = Math.abs(offset.dot(normal));
      if (height > Tolerance.POSITION * size) {
        throw new SurfaceFault(
            KEY,
            "point "
                + (i + 1)
                + " is off the plane of the others by "
                + height
                + "; a polygon must be flat: move the point or split the polygon");
      }
      flat.add(new PlanePoint(offset.dot(first), offset.dot(second)));
    }
    return flat;
  }

  /** A unit vector square to a unit vector. */
  private static Vector3 square(Vector3 normal) {
    double x = Math.abs(normal.x());
    double y = Math.abs(normal.y());
    double z = Math.abs(normal.z());
    Vector3 other = x <= y && x <= z ? Vector3.X : y <= z ? Vector3.Y : Vector3.Z;
    return normal.cross(other).unit();
  }
}
