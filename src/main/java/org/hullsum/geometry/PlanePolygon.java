package org.hullsum.geometry;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * A simple polygon in a plane, its corners counted counter-clockwise; convex or not.
 *
 * <p>Triangulated by clipping ears (G. H. Meisters, "Polygons have ears", American Mathematical
 * Monthly 82 (1975) 648–651): O(n³) in the number of corners at worst, O(n²) as a rule.
 */
final class PlanePolygon {
  /** Three corners, by index, counter-clockwise. */
  record Triangle(int a, int b, int c) {}

  private final List<PlanePoint> corners;

  /** Least doubled area of an ear; less is rounding. */
  private final double leastArea;

  private PlanePolygon(List<PlanePoint> corners) {
    this.corners = corners;
    double size = 0;
    for (PlanePoint corner : corners) {
      size = Math.max(size, corner.minus(corners.get(0)).norm());
    }
    this.leastArea = Tolerance.ROUNDING * size * size;
  }

  /**
   * Checks the corners.
   *
   * @throws SurfaceFault where two neighbours coincide, edges cross or touch, no area is enclosed,
   *     or the corners run clockwise
   */
  static PlanePolygon of(String key, List<PlanePoint> corners) throws SurfaceFault {
    PlanePolygon polygon = new PlanePolygon(List.copyOf(corners));
    if (corners.size() < 3) {
      throw new SurfaceFault(
          key, "a polygon has at least three points, here are " + corners.size());
    }
    polygon.checkEdges(key);
    if (Math.abs(doubledArea(corners)) <= polygon.leastArea) {
      throw new SurfaceFault(key, "the points lie on one line and enclose no area");
    }
    polygon.checkCrossings(key);
    if (doubledArea(corners) < 0) {
      throw new IllegalArgumentException("the corners run clockwise");
    }
    return polygon;
  }

  static double doubledArea(List<PlanePoint> corners) {
    double area = 0;
    PlanePoint origin = corners.get(0);
    for (int i = 1; i + 1 < corners.size(); i++) {
      area += PlanePoint.turn(origin, corners.get(i), corners.get(i + 1));
    }
    return area;
  }

  private void checkEdges(String key) throws SurfaceFault {
    int n = corners.size();
    for (int i = 0; i < n; i++) {
      if (corners.get(i).equals(corners.get((i + 1) % n))) {
        throw new SurfaceFault(
            key,
            "points "
                + (i + 1)
                + " and "
                + ((i + 1) % n + 1)
                + " coincide; a polygon closes itself, so state every point once");
      }
    }
  }

  private void checkCrossings(String key) throws SurfaceFault {
    int n = corners.size();
    for (int i = 0; i < n; i++) {
      for (int j = i + 1; j < n; j++) {
        boolean follows = j == i + 1 || (i == 0 && j == n - 1);
        if (follows ? foldsBack(i, j) : meet(i, j)) {
          throw new SurfaceFault(
              key,
              "edge "
                  + (i + 1)
                  + " and edge "
                  + (j + 1)
                  + " (edge k starts at point k) cross or touch; a polygon must not meet itself");
        }
      }
    }
  }

  private PlanePoint end(int edge) {
    return corners.get((edge + 1) % corners.size());
  }

  /** Whether two neighbouring edges run back along one another. */
  private boolean foldsBack(int i, int j) {
    int first = j == i + 1 ? i : j;
    int second = first == i ? j : i;
    PlanePoint a = corners.get(first);
    PlanePoint b = end(first);
    PlanePoint c = end(second);
    PlanePoint back = a.minus(b);
    PlanePoint on = c.minus(b);
    return Math.abs(PlanePoint.turn(a, b, c)) <= leastArea
        && back.x() * on.x() + back.y() * on.y() > 0;
  }

  private boolean meet(int i, int j) {
    PlanePoint a = corners.get(i);
    PlanePoint b = end(i);
    PlanePoint c = corners.get(j);
    PlanePoint d = end(j);
    double abc = PlanePoint.turn(a, b, c);
    double abd = PlanePoint.turn(a, b, d);
    double cda = PlanePoint.turn(c, d, a);
    double cdb = PlanePoint.turn(c, d, b);
    if (abc * abd < 0 && cda * cdb < 0) {
      return true;
    }
    return (abc == 0 && between(a, b, c))
        || (abd == 0 && between(a, b, d))
        || (cda == 0 && between(c, d, a))
        || (cdb == 0 && between(c, d, b));
  }

  /** Whether a point on the line through two others lies between them. */
  private static boolean between(PlanePoint a, PlanePoint b, PlanePoint point) {
    return Math.min(a.x(), b.x()) <= point.x()
        && point.x() <= Math.max(a.x(), b.x())
        && Math.min(a.y(), b.y()) <= point.y()
        && point.y() <= Math.max(a.y(), b.y());
  }

  /**
   * Triangles that cover the polygon, none without area.
   *
   * @throws SurfaceFault where the polygon is thinner than rounding allows
   */
  List<Triangle> triangles(String key) throws SurfaceFault {
    List<Integer> left = new ArrayList<>();
    for (int i = 0; i < corners.size(); i++) {
      left.add(i);
    }
    List<Triangle> triangles = new ArrayList<>();
    while (left.size() >= 3) {
      Optional<Integer> ear = ear(left);
      if (ear.isEmpty()) {
        throw new SurfaceFault(
            key, "the polygon is too thin somewhere to be told from a line; leave points out");
      }
      triangles.add(at(left, ear.get()));
      left.remove(ear.get().intValue());
    }
    return triangles;
  }

  private static Triangle at(List<Integer> left, int tip) {
    int n = left.size();
    return new Triangle(left.get((tip + n - 1) % n), left.get(tip), left.get((tip + 1) % n));
  }

  private double doubledArea(Triangle t) {
    return PlanePoint.turn(corners.get(t.a()), corners.get(t.b()), corners.get(t.c()));
  }

  /** The position in the list of the first tip that can be cut off. */
  private Optional<Integer> ear(List<Integer> left) {
    for (int tip = 0; tip < left.size(); tip++) {
      Triangle triangle = at(left, tip);
      if (doubledArea(triangle) > leastArea
          && left.stream().noneMatch(corner -> blocks(triangle, corner))) {
        return Optional.of(tip);
      }
    }
    return Optional.empty();
  }

  /** Whether a corner lies in a triangle of others, its sides included. */
  private boolean blocks(Triangle t, int corner) {
    if (corner == t.a() || corner == t.b() || corner == t.c()) {
      return false;
    }
    PlanePoint p = corners.get(corner);
    PlanePoint a = corners.get(t.a());
    PlanePoint b = corners.get(t.b());
    PlanePoint c = corners.get(t.c());
    return PlanePoint.turn(a, b, p) >= 0
        && PlanePoint.turn(b, c, p) >= 0
        && PlanePoint.turn(c, a, p) >= 0;
  }
}
