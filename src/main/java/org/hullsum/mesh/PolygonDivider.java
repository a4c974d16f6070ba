package org.hullsum.mesh;

import java.util.Arrays;

/**
 * Divides a polygon in space into triangles between its corners, turning the same way around.
 *
 * <p>The polygon is looked at along its normal (M. E. Newell's, in I. E. Sutherland, R. F. Sproull,
 * R. A. Schumacker, A characterization of ten hidden-surface algorithms, 1974). Where it is
 * strictly convex so, a fan from its first corner divides it; else ears are cut off (G. H.
 * Meisters, Polygons have ears, American Mathematical Monthly 82, 1975), which takes O(n²) time
 * where ears are plenty. A polygon that crosses itself is refused. Every edge of the polygon is an
 * edge of exactly one triangle, so what fitted to its neighbours still does.
 */
final class PolygonDivider {
  /** Tells the triangles, by the numbers that the caller gave the corners. */
  interface Triangles {
    void triangle(int a, int b, int c);
  }

  /** Larger polygons are divided only when convex, since cutting ears takes too long. */
  static final int MOST_CORNERS = 2048;

  /** No polygon may have more: such a list of corners is a damaged count. */
  static final int MOST_CORNERS_CONVEX = 1 << 16;

  /** Twice the area, of a polygon scaled to size 1, under which a corner counts as straight. */
  private static final double STRAIGHT = 1e-12;

  private final Triangles sink;
  private double[] u = new double[16];
  private double[] v = new double[16];
  private int[] next = new int[16];
  private int[] previous = new int[16];
  private int[] corners = new int[0];
  private int count;

  private final double[] normal = new double[3];

  /** Twice the area of the polygon laid into the plane: the length of the normal. */
  private double area;

  /** The largest part of any corner's area as seen from the first; 0 where all are on one line. */
  private double widest;

  PolygonDivider(Triangles sink) {
    this.sink = sink;
  }

  /**
   * @param coordinates x, y, z of each point in turn
   * @param polygon the points at the corners; only the first {@code size} are of the polygon
   * @param size at least 3
   */
  void divide(double[] coordinates, int[] polygon, int size, FaultPlace place) throws MeshFault {
    if (size == 3) {
      sink.triangle(polygon[0], polygon[1], polygon[2]);
      return;
    }
    if (size > MOST_CORNERS_CONVEX) {
      throw place.fault("a polygon of " + size + " corners is not read");
    }
    corners = polygon;
    count = size;
    project(coordinates);
    if (!(widest > STRAIGHT) || isConvex(STRAIGHT)) {
      fan();
    } else if (area <= STRAIGHT) {
      throw place.fault("a polygon of " + count + " corners encloses no area");
    } else if (count > MOST_CORNERS) {
      divideLarge(place);
    } else if (crossesItself()) {
      throw place.fault("a polygon of " + count + " corners crosses itself");
    } else {
      cutEars(place);
    }
  }

  private void divideLarge(FaultPlace place) throws MeshFault {
    if (!isConvex(-STRAIGHT)) {
      throw place.fault(
          "a polygon of "
              + count
              + " corners is not convex; more than "
              + MOST_CORNERS
              + " corners are divided only where it is");
    }
    fan();
  }

  private void fan() {
    for (int k = 2; k < count; k++) {
      sink.triangle(corners[0], corners[k - 1], corners[k]);
    }
  }

  /** Lays the polygon into the plane across its normal, scaled to size 1, turning to the left. */
  private void project(double[] xyz) {
    if (u.length < count) {
      int room = count + (count >> 1);
      u = new double[room];
      v = new double[room];
      next = new int[room];
      previous = new int[room];
    }
    double scale = scale(xyz);
    setNormal(xyz, scale);
    double[] across = crossed(axis(shortest()), normal);
    double length = length(across);
    double[] up = crossed(normal, across);
    int first = 3 * corners[0];
    for (int k = 0; k < count; k++) {
      int a = 3 * corners[k];
      double x = (xyz[a] - xyz[first]) * scale;
      double y = (xyz[a + 1] - xyz[first + 1]) * scale;
      double z = (xyz[a + 2] - xyz[first + 2]) * scale;
      u[k] = (x * across[0] + y * across[1] + z * across[2]) / length;
      v[k] = (x * up[0] + y * up[1] + z * up[2]) / (length * area);
    }
  }

  /** Sets the normal, whose length is twice the area, and how far the corners are off one line. */
  private void setNormal(double[] xyz, double scale) {
    Arrays.fill(normal, 0);
    widest = 0;
    int first = 3 * corners[0];
    for (int k = 0; k < count; k++) {
      int a = 3 * corners[k];
      int b = 3 * corners[k + 1 == count ? 0 : k + 1];
      for (int axis = 0; axis < 3; axis++) {
        int p = (axis + 1) % 3;
        int q = (axis + 2) % 3;
        double cross =
            ((xyz[a + p] - xyz[first + p]) * scale) * ((xyz[b + q] - xyz[first + q]) * scale)
                - ((xyz[a + q] - xyz[first + q]) * scale) * ((xyz[b + p] - xyz[first + p]) * scale);
        normal[axis] += cross;
        widest = Math.max(widest, Math.abs(cross));
      }
    }
    area = length(normal);
  }

  /** One over the largest distance along an axis from the first corner. */
  private double scale(double[] xyz) {
    int first = 3 * corners[0];
    double size = Double.MIN_NORMAL;
    for (int k = 1; k < count; k++) {
      for (int axis = 0; axis < 3; axis++) {
        size = Math.max(size, Math.abs(xyz[3 * corners[k] + axis] - xyz[first + axis]));
      }
    }
    return 1 / size;
  }

  /** The axis along which the normal is shortest, and so one that is well away from it. */
  private int shortest() {
    int axis = Math.abs(normal[1]) < Math.abs(normal[0]) ? 1 : 0;
    return Math.abs(normal[2]) < Math.abs(normal[axis]) ? 2 : axis;
  }

  private static double[] axis(int axis) {
    double[] unit = new double[3];
    unit[axis] = 1;
    return unit;
  }

  private static double[] crossed(double[] a, double[] b) {
    return new double[] {
      a[1] * b[2] - a[2] * b[1], a[2] * b[0] - a[0] * b[2], a[0] * b[1] - a[1] * b[0]
    };
  }

  private static double length(double[] a) {
    return Math.sqrt(a[0] * a[0] + a[1] * a[1] + a[2] * a[2]);
  }

  /** Twice the area of a triangle, positive where it turns to the left. */
  private double cross(int a, int b, int c) {
    return (u[b] - u[a]) * (v[c] - v[a]) - (v[b] - v[a]) * (u[c] - u[a]);
  }

  /**
   * Whether every corner turns to the left by more than a slack, and all of them once around: going
   * around, u turns back at most twice.
   */
  private boolean isConvex(double slack) {
    int turns = 0;
    double last = 0;
    double first = 0;
    for (int k = 0; k < count; k++) {
      int after = k + 1 == count ? 0 : k + 1;
      int afterNext = after + 1 == count ? 0 : after + 1;
      if (!(cross(k, after, afterNext) > slack)) {
        return false;
      }
      double step = u[after] - u[k];
      if (step != 0) {
        turns += last * step < 0 ? 1 : 0;
        first = first == 0 ? Math.signum(step) : first;
        last = Math.signum(step);
      }
    }
    return turns + (last * first < 0 ? 1 : 0) <= 2;
  }

  private boolean crossesItself() {
    for (int k = 0; k < count; k++) {
      int after = k + 1 == count ? 0 : k + 1;
      for (int other = k + 2; other < count; other++) {
        if (crosses(k, after, other, other + 1 == count ? 0 : other + 1)) {
          return true;
        }
      }
    }
    return false;
  }

  /** Whether the inside of the stretch from a to b passes through the inside of c to d. */
  private boolean crosses(int a, int b, int c, int d) {
    double abc = cross(a, b, c);
    double abd = cross(a, b, d);
    if (!(abc > STRAIGHT && abd < -STRAIGHT) && !(abc < -STRAIGHT && abd > STRAIGHT)) {
      return false;
    }
    double cda = cross(c, d, a);
    double cdb = cross(c, d, b);
    return (cda > STRAIGHT && cdb < -STRAIGHT) || (cda < -STRAIGHT && cdb > STRAIGHT);
  }

  private void cutEars(FaultPlace place) throws MeshFault {
    for (int k = 0; k < count; k++) {
      next[k] = k + 1 == count ? 0 : k + 1;
      previous[k] = k == 0 ? count - 1 : k - 1;
    }
    int left = count;
    int at = 0;
    int misses = 0;
    boolean flatToo = false;
    while (left > 3) {
      if (isEar(at, flatToo)) {
        sink.triangle(corners[previous[at]], corners[at], corners[next[at]]);
        next[previous[at]] = next[at];
        previous[next[at]] = previous[at];
        left--;
        misses = 0;
        flatToo = false;
        // Beside an ear that is gone is the likeliest place for the next.
        at = previous[at];
        continue;
      }
      misses++;
      if (misses == left) {
        if (flatToo) {
          throw place.fault("a polygon of " + count + " corners touches or crosses itself");
        }
        flatToo = true;
        misses = 0;
      }
      at = next[at];
    }
    sink.triangle(corners[previous[at]], corners[at], corners[next[at]]);
  }

  /** Whether cutting off a corner leaves a polygon; with an area, unless flat ones will do. */
  private boolean isEar(int ear, boolean flatToo) {
    int a = previous[ear];
    int c = next[ear];
    double slack = flatToo ? -STRAIGHT : STRAIGHT;
    if (!(cross(a, ear, c) > slack)) {
      return false;
    }
    for (int k = next[c]; k != a; k = next[k]) {
      if (crosses(a, c, k, next[k]) || crosses(a, c, previous[k], k)) {
        return false;
      }
      boolean elsewhere = !coincide(k, a) && !coincide(k, ear) && !coincide(k, c);
      if (elsewhere
          && cross(a, ear, k) >= -slack
          && cross(ear, c, k) >= -slack
          && cross(c, a, k) >= -slack) {
        return false;
      }
    }
    return true;
  }

  private boolean coincide(int a, int b) {
    return u[a] == u[b] && v[a] == v[b];
  }
}
